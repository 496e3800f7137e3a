'use client'

import dynamic from 'next/dynamic'
import { useState } from 'react'
import { atFirstHand } from './at-first-hand'
import type { DialogProps } from './dialog-window'

const loadWindow = () => import('./dialog-window').then((module) => module.DialogWindow)
// Should it not come then, it is asked for again when a dialog opens.
atFirstHand(() => loadWindow().catch(() => undefined))

const DialogWindow = dynamic(loadWindow, { ssr: false })

/** A dialog, whose code a page does not wait for: it comes at the first hand, or with the dialog that stands open. */
export function Dialog(props: DialogProps) {
  const [wasOpened, setWasOpened] = useState(props.isOpen)
  if (props.isOpen && !wasOpened) setWasOpened(true)
  return wasOpened || props.isOpen ? <DialogWindow {...props} /> : null
}
