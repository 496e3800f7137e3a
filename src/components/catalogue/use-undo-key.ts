'use client'

import { useEffect, useRef } from 'react'

/** Ctrl+Z, wherever no text of its own is being written. */
export function useUndoKey(isOn: boolean, onUndo: () => void): void {
  const latest = useRef(onUndo)
  useEffect(() => {
    latest.current = onUndo
  })
  useEffect(() => {
    if (!isOn) return
    const handle = (event: KeyboardEvent) => {
      const isUndo = event.key.toLowerCase() === 'z' && (event.ctrlKey || event.metaKey) && !event.shiftKey
      const target = event.target
      const isTyping =
        target instanceof Element && target.closest('input:not([type=checkbox]), textarea, select')
      if (!isUndo || isTyping) return
      event.preventDefault()
      latest.current()
    }
    window.addEventListener('keydown', handle)
    return () => window.removeEventListener('keydown', handle)
  }, [isOn])
}
