'use client'

import { useEffect, useRef } from 'react'

/** What stands under a list: while it is watched, its coming near is told, so that the list grows. */
export function useEndReached(isWatching: boolean, onReach: () => void) {
  const end = useRef<HTMLDivElement>(null)
  const latest = useRef(onReach)
  useEffect(() => {
    latest.current = onReach
  })
  useEffect(() => {
    const element = end.current
    if (!element || !isWatching) return
    const observer = new IntersectionObserver(
      (entries) => {
        if (entries.some((entry) => entry.isIntersecting)) latest.current()
      },
      { rootMargin: '600px' },
    )
    observer.observe(element)
    return () => observer.disconnect()
  }, [isWatching])
  return end
}
