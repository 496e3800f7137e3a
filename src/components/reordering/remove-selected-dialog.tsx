'use client'

import { useState } from 'react'
import { removeReorderPoint } from '@/hooks/use-reorder-points'
import { faultSentence } from '@/lib/field-faults'
import type { ReorderPointRow } from '@/schemas/reordering'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'

export interface RemoveSelectedDialogProps {
  rows: readonly ReorderPointRow[]
  onClose: () => void
  /** Some or all of them are gone. */
  onRemoved: () => void
}

/** Watches items no longer; asked once more, since an alert that is open closes with it. */
export function RemoveSelectedDialog({ rows, onClose, onRemoved }: RemoveSelectedDialogProps) {
  const [isBusy, setIsBusy] = useState(false)
  const [fault, setFault] = useState<string>()
  const [first] = rows
  const what =
    rows.length === 1
      ? `the reorder point of ${first?.itemCode} in ${first?.cribCode}`
      : `${rows.length} reorder points`

  async function handleRemove() {
    setIsBusy(true)
    let done = 0
    try {
      for (const row of rows) {
        await removeReorderPoint(row)
        done += 1
      }
      onRemoved()
    } catch (error) {
      setFault(`${done} of ${rows.length} were taken away; the rest stays. ${faultSentence(error)}`)
    }
    setIsBusy(false)
  }

  return (
    <Dialog isOpen onOpenChange={fault ? onRemoved : onClose} title={`Take away ${what}?`}>
      <div className="flex flex-col gap-4">
        <p>
          Nobody is told any more when {rows.length === 1 ? 'it is' : 'they are'} low, and an alert that is
          open closes. The items and their stock stay as they are.
        </p>
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {fault}
          </Notice>
        ) : null}
        <div className="flex flex-wrap gap-3">
          <Button
            variant="danger"
            disabled={isBusy || fault !== undefined}
            onClick={() => void handleRemove()}
          >
            {isBusy ? 'Taking away …' : rows.length === 1 ? 'Take it away' : 'Take them away'}
          </Button>
          <Button onClick={fault ? onRemoved : onClose}>{fault ? 'Close' : 'Cancel'}</Button>
        </div>
      </div>
    </Dialog>
  )
}
