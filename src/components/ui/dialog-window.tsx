'use client'

import { X } from 'lucide-react'
import { Dialog as Primitive } from 'radix-ui'
import { type ReactNode, useRef } from 'react'
import { classNames } from './class-names'

export interface DialogProps {
  isOpen: boolean
  onOpenChange: (isOpen: boolean) => void
  title: string
  description?: string
  /** `wide` is for tables; `side` slides along the right edge, for forms that stand beside what they change. */
  shape?: 'centre' | 'wide' | 'side'
  children: ReactNode
}

const shapes = {
  centre:
    'top-1/2 left-1/2 max-h-[calc(100dvh-2rem)] w-[min(36rem,calc(100vw-2rem))] -translate-x-1/2 -translate-y-1/2',
  wide: 'top-1/2 left-1/2 max-h-[calc(100dvh-2rem)] w-[min(60rem,calc(100vw-2rem))] -translate-x-1/2 -translate-y-1/2',
  side: 'top-0 right-0 h-dvh w-[min(44rem,100vw)]',
} as const

/** What had the focus before: most dialogs are opened by state, so the primitive knows no trigger to go back to. */
function useOpener() {
  const opener = useRef<Element | null>(null)
  return {
    onOpenAutoFocus: () => {
      opener.current = document.activeElement
    },
    onCloseAutoFocus: (event: Event) => {
      event.preventDefault()
      // What opened it may be gone by then, as a row that was merged or archived is.
      const target = opener.current?.isConnected ? opener.current : document.getElementById('content')
      if (target instanceof HTMLElement) target.focus()
    },
  }
}

/** The dialog itself, which `Dialog` brings when one is first opened. */
export function DialogWindow({
  isOpen,
  onOpenChange,
  title,
  description,
  shape = 'centre',
  children,
}: DialogProps) {
  const opener = useOpener()
  return (
    <Primitive.Root open={isOpen} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-black/40" />
        <Primitive.Content
          className={classNames(
            'bg-sheet text-ink border-ink fixed z-50 flex flex-col overflow-y-auto border shadow-xl',
            shapes[shape],
          )}
          {...opener}
          {...(description ? {} : { 'aria-describedby': undefined })}
        >
          <header className="bg-sheet border-hairline sticky top-0 z-10 flex items-start justify-between gap-4 border-b px-5 py-3">
            <div>
              <Primitive.Title className="text-xl font-semibold">{title}</Primitive.Title>
              {description ? (
                <Primitive.Description className="text-ink-soft text-sm">{description}</Primitive.Description>
              ) : null}
            </div>
            <Primitive.Close
              className="hover:bg-accent-wash -mr-2 grid size-11 place-items-center rounded-[3px]"
              aria-label="Close"
            >
              <X aria-hidden="true" className="size-5" />
            </Primitive.Close>
          </header>
          <div className="px-5 py-4">{children}</div>
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  )
}
