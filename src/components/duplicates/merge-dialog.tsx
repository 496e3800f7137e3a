'use client'

import { useState } from 'react'
import { toast } from 'sonner'
import { mergeItems } from '@/hooks/use-duplicates'
import { faultSentence } from '@/lib/field-faults'
import { newIdempotencyKey } from '@/lib/new-idempotency-key'
import type { DuplicateItem } from '@/schemas/duplicate'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { useAttempt } from '../ui/use-attempt'

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

  function handleMerge() {
    void attempt(async () => {
      const request = { keptItemId: kept.id, mergedItemId: merged.id }
      const { moved } = await mergeItems(request, idempotencyKey)
      const pieces = moved.reduce((sum, { quantity }) => sum + quantity, 0)
      toast.success(`${merged.code} is merged into ${kept.code}; ${pieces} pieces went over.`)
      onMerged()
    })
  }

  return (
    <Dialog isOpen onOpenChange={onClose} title={`Merge ${merged.code} into ${kept.code}?`}>
      <div className="flex flex-col gap-3">
        <ul className="flex list-disc flex-col gap-1 pl-5">
          <li>
            Every piece of {merged.code} in a bin counts as {kept.code} from now on, in the same bin and
            condition.
          </li>
          <li>{merged.code} is archived; its movements stay under its code.</li>
          <li>
            Whoever searches for {merged.code} finds {kept.code}.
          </li>
        </ul>
        <p>
          {kept.code} keeps its own maker, number, description and cost. Its reorder points stay; where a crib
          has none, that of {merged.code} is taken over.
        </p>
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        <div className="flex flex-wrap gap-2">
          <Button variant="danger" disabled={isBusy} onClick={handleMerge}>
            {isBusy ? 'Merging …' : 'Merge them'}
          </Button>
          <Button variant="quiet" onClick={onClose}>
            Leave both
          </Button>
        </div>
      </div>
    </Dialog>
  )
}
