'use client'

import { type RefObject, useLayoutEffect, useRef, useState } from 'react'
import { flushSync } from 'react-dom'

/** What a sheet of A4 or Letter leaves between its margins, in px. */
const paperWidth = 700

/**
 * The width an element has now, in px: a drawing is laid out for the room it gets, so its figures stay readable. Also
 * on paper, where the element never hears of its new width in time.
 */
export function useElementWidth<Element extends HTMLElement>(
  initial: number,
): [RefObject<Element | null>, number] {
  const ref = useRef<Element>(null)
  const [width, setWidth] = useState(initial)
  useLayoutEffect(() => {
    const element = ref.current
    if (!element) return
    const measure = () => setWidth(element.clientWidth || initial)
    const layOutForPaper = () => flushSync(() => setWidth(paperWidth))
    measure()
    const observer = new ResizeObserver(measure)
    observer.observe(element)
    window.addEventListener('beforeprint', layOutForPaper)
    window.addEventListener('afterprint', measure)
    return () => {
      observer.disconnect()
      window.removeEventListener('beforeprint', layOutForPaper)
      window.removeEventListener('afterprint', measure)
    }
  }, [initial])
  return [ref, width]
}
