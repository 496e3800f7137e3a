'use client'

import { useState } from 'react'
import { toast } from '@/components/ui/toast'
import { mergeItems, useMergePreview } from '@/hooks/use-duplicates'
import { faultSentence } from '@/lib/field-faults'
import { newIdempotencyKey } from '@/lib/new-idempotency-key'
import type { DuplicateItem } from '@/schemas/duplicate'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { useAttempt } from '../ui/use-attempt'
import { MergePreview } from './merge-preview'

export interface MergePair {
  kept: DuplicateItem
  merged: DuplicateItem
}

export interface MergeDialogProps {
  pair: MergePair
  onClose: () => void
  onMerged: () => void
}

/** Says what a merge does before it does it. One opened dialog is one merge, however often it is sent. */
export function MergeDialog({ pair: { kept, merged }, onClose, onMerged }: MergeDialogProps) {
  const [idempotencyKey] = useState(newIdempotencyKey)
  const { fault, isBusy, attempt } = useAttempt()
  const request = { keptItemId: kept.id, mergedItemId: merged.id }
  const { preview, error, refresh } = useMergePreview(request)
  const codes = { kept: kept.code, merged: merged.code }

  function handleMerge() {
    void attempt(async () => {
      const { moved } = await mergeItems(request, idempotencyKey)
      const pieces = moved.reduce((sum, { quantity }) => sum + quantity, 0)
      toast.success(
        `${merged.code} is merged into ${kept.code}; ${pieces} ${pieces === 1 ? 'piece' : 'pieces'} went over.`,
      )
      onMerged()
    })
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title={`Merge ${merged.code} into ${kept.code}?`}>
      <div className="flex flex-col gap-4">
        {error ? (
          <Notice kind="collision" isAnnounced>
            <p>What it would do could not be read. {faultSentence(error)}</p>
            <Button size="compact" className="mt-2" onClick={() => void refresh()}>
              Try again
            </Button>
          </Notice>
        ) : null}
        {!preview && !error ? <p role="status">Looking at what it would do …</p> : null}
        {preview?.refusal ? (
          <Notice kind="caution" isAnnounced>
            <p className="font-semibold">It cannot be made.</p>
            <p>{preview.refusal}</p>
          </Notice>
        ) : null}
        {preview && !preview.refusal ? <MergePreview preview={preview} codes={codes} /> : null}
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        <div className="flex flex-wrap gap-2">
          {preview && !preview.refusal ? (
            <Button variant="danger" disabled={isBusy} onClick={handleMerge}>
              {isBusy ? 'Merging …' : 'Merge them'}
            </Button>
          ) : null}
          <Button variant="quiet" onClick={onClose}>
            Leave both
          </Button>
        </div>
      </div>
    </Dialog>
  )
}
