'use client'

import { type RefObject, useEffect, useRef } from 'react'
import { symbolTitle } from '@/lib/symbol-names'
import { classNames } from './class-names'
import { NameBubble, useNameBubble } from './name-bubble'
import { namedSymbolClass, useTapElsewhere } from './symbol-name'

export interface FieldSymbolProps {
  /** Of the words, which are part of the control's name. */
  id: string
  /** Of the symbol's name, which describes the control. */
  nameId: string
  text: string
  /** The whole field: while the keyboard is in it, the name is shown. */
  field: RefObject<HTMLElement | null>
}

/**
 * The symbol beside a field's label. Its name is shown under the pointer, at a tap, and while the keyboard is in the
 * field itself: a stop of its own beside every field would double the way through a form.
 */
export function FieldSymbol({ id, nameId, text, field }: FieldSymbolProps) {
  const title = symbolTitle(text)
  const symbol = useRef<HTMLSpanElement>(null)
  const bubble = useNameBubble()
  const { isShown, show, hide, hideSoon } = bubble
  useTapElsewhere(isShown, symbol, hide)
  useKeyboardWithin(field, title !== undefined, show, hide)
  const look = 'text-ink-soft text-xs tracking-wide'
  if (!title)
    return (
      <span id={id} className={look}>
        {text}
      </span>
    )
  return (
    <>
      <span
        ref={symbol}
        id={id}
        className={classNames(namedSymbolClass, look)}
        onPointerEnter={show}
        onPointerLeave={(event) => event.pointerType === 'mouse' && hideSoon()}
      >
        {text}
      </span>
      <NameBubble id={nameId} text={title} bubble={bubble} anchor={symbol} />
    </>
  )
}

function useKeyboardWithin(
  field: RefObject<HTMLElement | null>,
  isOn: boolean,
  onEnter: () => void,
  onLeave: () => void,
): void {
  useEffect(() => {
    const element = field.current
    if (!element || !isOn) return
    // Text fields match :focus-visible however they are entered, so the last thing done decides.
    const enter = () => {
      if (lastWasTab) onEnter()
    }
    element.addEventListener('focusin', enter)
    element.addEventListener('focusout', onLeave)
    watchTab()
    return () => {
      element.removeEventListener('focusin', enter)
      element.removeEventListener('focusout', onLeave)
    }
  }, [field, isOn, onEnter, onLeave])
}

let lastWasTab = false
let isWatching = false

function watchTab(): void {
  if (isWatching) return
  isWatching = true
  window.addEventListener(
    'keydown',
    (event) => {
      lastWasTab = event.key === 'Tab'
    },
    { capture: true },
  )
  window.addEventListener(
    'pointerdown',
    () => {
      lastWasTab = false
    },
    { capture: true },
  )
}
