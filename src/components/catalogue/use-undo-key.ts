'use client'

import { useEffect, useRef } from 'react'

/** Ctrl+Z, and Ctrl+Y or Ctrl+Shift+Z the other way, wherever no text of its own is being written. */
export function useUndoKey(isOn: boolean, onUndo: () => void, onRedo?: () => void): void {
  const latest = useRef({ onUndo, onRedo })
  useEffect(() => {
    latest.current = { onUndo, onRedo }
  })
  useEffect(() => {
    if (!isOn) return
    const handle = (event: KeyboardEvent) => {
      const key = event.ctrlKey || event.metaKey ? event.key.toLowerCase() : ''
      const isRedo = key === 'y' || (key === 'z' && event.shiftKey)
      const target = event.target
      const isTyping =
        target instanceof Element && target.closest('input:not([type=checkbox]), textarea, select')
      if ((key !== 'z' && !isRedo) || isTyping) return
      event.preventDefault()
      if (isRedo) latest.current.onRedo?.()
      else latest.current.onUndo()
    }
    window.addEventListener('keydown', handle)
    return () => window.removeEventListener('keydown', handle)
  }, [isOn])
}
