'use client'

import { useEffect, useRef } from 'react'

/** A command that runs when nothing more was asked for a while; `now` runs what waits at once. */
export function useDelayed<Value>(
  run: (value: Value) => void,
  delayMs: number,
): { later: (value: Value) => void; now: () => void } {
  const latest = useRef(run)
  const waiting = useRef<{ timer: ReturnType<typeof setTimeout>; value: Value } | null>(null)
  useEffect(() => {
    latest.current = run
  })
  useEffect(() => () => clearTimeout(waiting.current?.timer), [])
  const now = () => {
    const pending = waiting.current
    if (!pending) return
    clearTimeout(pending.timer)
    waiting.current = null
    latest.current(pending.value)
  }
  const later = (value: Value) => {
    clearTimeout(waiting.current?.timer)
    waiting.current = { value, timer: setTimeout(now, delayMs) }
  }
  return { later, now }
}
