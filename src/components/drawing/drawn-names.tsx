'use client'

import { type PointerEvent, type ReactNode, useRef, useState } from 'react'
import { NameBubble, useNameBubble } from '../ui/name-bubble'
import { useTapElsewhere } from '../ui/symbol-name'

/**
 * Tells the names of the symbols in a drawing under the pointer and at a tap. A drawing is one picture to a keyboard
 * and to a screen reader; the same symbols stand as text in the table of the geometry.
 */
export function DrawnNames({ children }: { children: ReactNode }) {
  const bubble = useNameBubble()
  const { isShown, show, hide, hideSoon } = bubble
  const symbol = useRef<Element | null>(null)
  const [text, setText] = useState('')
  useTapElsewhere(isShown, symbol, hide)

  function handleOver({ target }: PointerEvent) {
    const found = target instanceof Element ? target.closest('[data-name]') : null
    const name = found?.getAttribute('data-name')
    if (!found || !name) return
    symbol.current = found
    setText(name)
    show()
  }

  return (
    <div
      onPointerOver={handleOver}
      onPointerOut={(event) => event.pointerType === 'mouse' && isShown && hideSoon()}
    >
      {children}
      <NameBubble text={text} bubble={bubble} anchor={symbol} isSilent />
    </div>
  )
}
