'use client'

import { type RefObject, useCallback, useEffect, useLayoutEffect, useRef, useState } from 'react'

/** Long enough to cross from what is named to its name. */
const leaveMs = 250
const gapPx = 6
const edgePx = 8

export interface NameBubbleState {
  isShown: boolean
  show: () => void
  hide: () => void
  /** Unless the pointer comes back, or goes on to the name itself. */
  hideSoon: () => void
}

/** Whether a name is shown: until it is left, or sent away by Escape, which then closes nothing else. */
export function useNameBubble(): NameBubbleState {
  const [isShown, setIsShown] = useState(false)
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
  const show = useCallback(() => {
    clearTimeout(timer.current)
    setIsShown(true)
  }, [])
  const hide = useCallback(() => {
    clearTimeout(timer.current)
    setIsShown(false)
  }, [])
  const hideSoon = useCallback(() => {
    clearTimeout(timer.current)
    timer.current = setTimeout(() => setIsShown(false), leaveMs)
  }, [])
  useEffect(() => () => clearTimeout(timer.current), [])
  useEffect(() => {
    if (!isShown) return
    const handle = (event: KeyboardEvent) => {
      if (event.key !== 'Escape') return
      event.stopPropagation()
      hide()
    }
    // Before a dialog hears it.
    window.addEventListener('keydown', handle, { capture: true })
    return () => window.removeEventListener('keydown', handle, { capture: true })
  }, [isShown, hide])
  return { isShown, show, hide, hideSoon }
}

export interface NameBubbleProps {
  id?: string
  text: string
  bubble: NameBubbleState
  /** What it names, and stands over. */
  anchor: RefObject<Element | null>
  /** Where the name is heard already. */
  isSilent?: boolean
}

/** A name over what it names, above everything else on the page; it can be pointed at and stays until it is left. */
export function NameBubble({ id, text, bubble, anchor, isSilent }: NameBubbleProps) {
  const ref = useRef<HTMLSpanElement>(null)
  const { isShown, show, hideSoon } = bubble
  useLayoutEffect(() => {
    const element = ref.current
    if (!element || !isShown) return
    element.showPopover()
    const place = () => placeOver(element, anchor.current)
    place()
    window.addEventListener('scroll', place, { capture: true, passive: true })
    window.addEventListener('resize', place)
    return () => {
      window.removeEventListener('scroll', place, { capture: true })
      window.removeEventListener('resize', place)
      if (element.isConnected) element.hidePopover()
    }
  }, [isShown, anchor])
  return (
    <span
      ref={ref}
      id={id}
      role={isSilent ? undefined : 'tooltip'}
      aria-hidden={isSilent ? true : undefined}
      popover="manual"
      className="bg-ink text-sheet pointer-events-auto inset-auto m-0 max-w-[min(20rem,calc(100vw-1rem))] border-0 px-2.5 py-1.5 text-left text-sm font-normal tracking-normal whitespace-normal print:hidden"
      onPointerEnter={show}
      onPointerLeave={hideSoon}
    >
      {text}
    </span>
  )
}

function placeOver(element: HTMLElement, anchor: Element | null): void {
  if (!anchor) return
  const over = anchor.getBoundingClientRect()
  const { width, height } = element.getBoundingClientRect()
  const left = over.left + over.width / 2 - width / 2
  const top = over.top - height - gapPx
  element.style.left = `${Math.max(edgePx, Math.min(left, window.innerWidth - width - edgePx))}px`
  element.style.top = `${top < edgePx ? over.bottom + gapPx : top}px`
}
