'use client'

import { useEffect } from 'react'
import { isBlock } from './pasted-block'

/** A block of cells pasted over the list, where nothing is being typed and no dialog stands over it. */
export function useBlockPaste(isOn: boolean, onPaste: (text: string) => void): void {
  useEffect(() => {
    if (!isOn) return
    const handle = (event: ClipboardEvent) => {
      const target = event.target
      const isTyping =
        target instanceof Element &&
        target.closest('input:not([type=checkbox]), textarea, select, [role="dialog"]')
      const text = event.clipboardData?.getData('text/plain') ?? ''
      if (isTyping || !isBlock(text)) return
      event.preventDefault()
      onPaste(text)
    }
    window.addEventListener('paste', handle)
    return () => window.removeEventListener('paste', handle)
  }, [isOn, onPaste])
}
