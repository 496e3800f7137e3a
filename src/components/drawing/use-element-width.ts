'use client'

import { type RefObject, useLayoutEffect, useRef, useState } from 'react'

/** The width an element has now, in px: a drawing is laid out for the room it gets, so its figures stay readable. */
export function useElementWidth<Element extends HTMLElement>(
  initial: number,
): [RefObject<Element | null>, number] {
  const ref = useRef<Element>(null)
  const [width, setWidth] = useState(initial)
  useLayoutEffect(() => {
    const element = ref.current
    if (!element) return
    setWidth(element.clientWidth || initial)
    const observer = new ResizeObserver(() => setWidth(element.clientWidth || initial))
    observer.observe(element)
    return () => observer.disconnect()
  }, [initial])
  return [ref, width]
}
