'use client'

import { type Dispatch, useEffect, useReducer, useRef } from 'react'
import { changedDraft, type DraftChange, type ReachDraft } from './reach-draft'
import { draftInUnit, draftQuery, queryDraft } from './reach-query'
import type { Reading } from './read-field'

const restMs = 250

/**
 * The draft, kept in the address bar so that it can be shared and read again. Another query, from a link of an item or
 * of a colleague, replaces it; another unit writes the same figures anew.
 */
export function useDraftInAddress(query: string, reading: Reading): [ReachDraft, Dispatch<DraftChange>] {
  const [draft, change] = useReducer(changedDraft, null, () => queryDraft(query, reading))
  const written = useRef(query)
  const lastReading = useRef(reading)

  useEffect(() => {
    if (lastReading.current === reading) return
    change({ type: 'replace', draft: draftInUnit(draft, lastReading.current, reading) })
    lastReading.current = reading
  }, [draft, reading])

  useEffect(() => {
    if (isSameQuery(query, written.current)) return
    written.current = query
    change({ type: 'replace', draft: queryDraft(query, reading) })
  }, [query, reading])

  useEffect(() => {
    const timer = setTimeout(() => {
      if (lastReading.current !== reading) return
      const next = draftQuery(draft, reading)
      if (isSameQuery(next, written.current)) return
      written.current = next
      window.history.replaceState(null, '', next === '' ? '/reach' : `/reach?${next}`)
    }, restMs)
    return () => clearTimeout(timer)
  }, [draft, reading])

  return [draft, change]
}

/** Two ways of writing one query. */
function isSameQuery(one: string, other: string): boolean {
  return new URLSearchParams(one).toString() === new URLSearchParams(other).toString()
}
