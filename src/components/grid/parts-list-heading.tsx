'use client'

import type { CustomInnerHeaderProps } from 'ag-grid-react'
import { useEffect, useRef } from 'react'
import { symbolTitle } from '@/lib/symbol-names'
import { NameBubble, type NameBubbleState, useNameBubble } from '../ui/name-bubble'
import { useTapElsewhere } from '../ui/symbol-name'

export interface PartsListHeadingProps extends CustomInnerHeaderProps {
  /** The unit under the heading, softer; empty where there is none. */
  unitText: string
  word?: string | undefined
  fullName: string
}

/**
 * Over a column: the symbol, its unit under it, and its name for those who hear the table. Whoever points at the heading,
 * comes to it by keyboard or taps it sees the name as well.
 */
export function PartsListHeading({ displayName, unitText, word, fullName }: PartsListHeadingProps) {
  const heading = useRef<HTMLSpanElement>(null)
  const bubble = useNameBubble()
  const isNamed = displayName !== fullName
  useHeadingCell(heading, isNamed, bubble)
  useTapElsewhere(bubble.isShown, heading, bubble.hide)
  return (
    <span ref={heading} className="leading-tight">
      {isNamed ? (
        <>
          <span aria-hidden="true">{displayName}</span>
          <span className="sr-only">{fullName}</span>
          {word ? (
            <span className="text-ink-soft text-xs font-normal">
              {' '}
              {unitText}
              <span aria-hidden="true" className="block">
                {word}
              </span>
            </span>
          ) : null}
          <NameBubble text={headingName(displayName, fullName)} anchor={heading} isSilent {...{ bubble }} />
        </>
      ) : (
        <span>{displayName}</span>
      )}
      {unitText && !word ? <span className="text-ink-soft block text-xs font-normal">{unitText}</span> : null}
    </span>
  )
}

/** `Reach length. LU: usable length (ISO 13399)`. */
function headingName(symbol: string, fullName: string): string {
  const title = symbolTitle(symbol)
  return title ? `${fullName.replace(` (${symbol})`, '')}. ${title}` : fullName
}

/** The grid owns the heading's cell: it is what is pointed at, and what has the keyboard. */
function useHeadingCell(
  heading: { current: HTMLElement | null },
  isOn: boolean,
  { show, hide, hideSoon }: NameBubbleState,
): void {
  useEffect(() => {
    const cell = heading.current?.closest<HTMLElement>('.ag-header-cell')
    if (!cell || !isOn) return
    const leave = (event: PointerEvent) => event.pointerType === 'mouse' && hideSoon()
    const focus = () => cell.matches(':focus-visible') && show()
    cell.addEventListener('pointerenter', show)
    cell.addEventListener('pointerleave', leave)
    cell.addEventListener('focus', focus)
    cell.addEventListener('blur', hide)
    return () => {
      cell.removeEventListener('pointerenter', show)
      cell.removeEventListener('pointerleave', leave)
      cell.removeEventListener('focus', focus)
      cell.removeEventListener('blur', hide)
    }
  }, [heading, isOn, show, hide, hideSoon])
}
