'use client'

import { useEffect, useId, useRef } from 'react'
import { symbolTitle } from '@/lib/symbol-names'
import { classNames } from './class-names'
import { NameBubble, useNameBubble } from './name-bubble'

export interface SymbolNameProps {
  /** A symbol, or one with its unit: `LU · mm`. */
  text: string
  className?: string
}

/** A symbol that tells its ISO 13399 name: under the pointer, by keyboard and at a tap. Without a name it is plain text. */
export function SymbolName({ text, className }: SymbolNameProps) {
  const title = symbolTitle(text)
  return title ? <NamedSymbol {...{ text, title, className }} /> : <span className={className}>{text}</span>
}

function NamedSymbol({ text, title, className }: SymbolNameProps & { title: string }) {
  const id = useId()
  const button = useRef<HTMLButtonElement>(null)
  const bubble = useNameBubble()
  const { isShown, show, hide, hideSoon } = bubble
  useTapElsewhere(isShown, button, hide)
  return (
    <>
      <button
        ref={button}
        type="button"
        aria-describedby={id}
        className={classNames(namedSymbolClass, className)}
        onPointerEnter={(event) => event.pointerType === 'mouse' && show()}
        onPointerLeave={(event) => event.pointerType === 'mouse' && hideSoon()}
        onFocus={(event) => event.currentTarget.matches(':focus-visible') && show()}
        onBlur={hide}
        onClick={show}
      >
        {text}
      </button>
      <NameBubble id={id} text={title} bubble={bubble} anchor={button} />
    </>
  )
}

/** Dotted where there is a name to be had. */
export const namedSymbolClass =
  'cursor-help underline decoration-dotted decoration-1 underline-offset-3 print:no-underline'

/** A finger leaves nothing: what a tap opened, a tap beside it closes. */
export function useTapElsewhere(
  isShown: boolean,
  inside: { current: Element | null },
  onTap: () => void,
): void {
  useEffect(() => {
    if (!isShown) return
    const handle = (event: PointerEvent) => {
      const target = event.target
      if (target instanceof Node && inside.current?.contains(target)) return
      if (target instanceof Element && target.closest('[popover]')) return
      onTap()
    }
    window.addEventListener('pointerdown', handle, { capture: true })
    return () => window.removeEventListener('pointerdown', handle, { capture: true })
  }, [isShown, inside, onTap])
}
