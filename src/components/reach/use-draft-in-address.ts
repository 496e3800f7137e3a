'use client'

import { type Dispatch, useCallback, useEffect, useMemo, useRef, useState } from 'react'
import { changedDraft, type DraftChange, type ReachDraft } from './reach-draft'
import { draftInUnit, draftQuery, queryDraft } from './reach-query'
import type { Reading } from './read-field'

const restMs = 250

interface HeldDraft {
  draft: ReachDraft
  /** How its texts are meant. */
  reading: Reading
}

/** The draft in the reader's unit, before anything is worked out: a bare number never changes its meaning. */
function draftRead(held: HeldDraft, reading: Reading): ReachDraft {
  return held.reading === reading ? held.draft : draftInUnit(held.draft, held.reading, reading)
}

/**
 * The draft, kept in the address bar so that it can be shared and read again. Another query, from a link of an item or
 * of a colleague, replaces it; another unit writes the same figures anew.
 */
export function useDraftInAddress(query: string, reading: Reading): [ReachDraft, Dispatch<DraftChange>] {
  const [held, setHeld] = useState<HeldDraft>(() => ({ draft: queryDraft(query, reading), reading }))
  const written = useRef(query)
  const draft = useMemo(() => draftRead(held, reading), [held, reading])
  const change = useCallback(
    (made: DraftChange) =>
      setHeld((before) => ({ draft: changedDraft(draftRead(before, reading), made), reading })),
    [reading],
  )

  useEffect(() => {
    if (isSameQuery(query, written.current)) return
    written.current = query
    setHeld({ draft: queryDraft(query, reading), reading })
  }, [query, reading])

  useEffect(() => {
    function write() {
      const next = draftQuery(draft, reading)
      if (isSameQuery(next, written.current)) return
      written.current = next
      window.history.replaceState(null, '', next === '' ? '/reach' : `/reach?${next}`)
    }
    const timer = setTimeout(write, restMs)
    // Written while a page is already being left, it would call the reader back: it is written before that instead.
    function handleClick(event: MouseEvent) {
      if (!(event.target instanceof Element) || !event.target.closest('a[href]')) return
      clearTimeout(timer)
      write()
    }
    document.addEventListener('click', handleClick, { capture: true })
    return () => {
      clearTimeout(timer)
      document.removeEventListener('click', handleClick, { capture: true })
    }
  }, [draft, reading])

  return [draft, change]
}

/** Two ways of writing one query. */
function isSameQuery(one: string, other: string): boolean {
  return new URLSearchParams(one).toString() === new URLSearchParams(other).toString()
}
