'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { toast } from '@/components/ui/toast'
import { useReverseMovement } from '@/hooks/use-move-stock'
import { newIdempotencyKey } from '@/lib/new-idempotency-key'
import type { MovementResponse } from '@/schemas/movement'
import { movementNames } from './stock-words'

/** A movement is never edited: it is posted back, once. */
export function ReverseDialog({ movement, onClose }: { movement: MovementResponse; onClose: () => void }) {
  const reverseMovement = useReverseMovement()
  const [key] = useState(newIdempotencyKey)
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)

  async function handleReverse() {
    setIsBusy(true)
    setFailure(null)
    try {
      await reverseMovement(movement, key)
      toast.success('The movement is reversed.')
      onClose()
    } catch (error) {
      setFailure(error instanceof Error ? error.message : 'Reversing failed.')
      setIsBusy(false)
    }
  }

  const pieces = movement.quantity === 1 ? '1 piece goes' : `${movement.quantity} pieces go`
  return (
    <Dialog isOpen onOpenChange={(isOpen) => (isOpen ? undefined : onClose())} title="Reverse this movement?">
      <p>
        {movementNames[movement.kind]} of {movement.itemCode}: {pieces} back from {placeWords(movement.to)} to{' '}
        {placeWords(movement.from)}. Both movements stay in the books.
      </p>
      {failure ? (
        <Notice kind="collision" isAnnounced className="mt-3">
          {failure}
        </Notice>
      ) : null}
      <div className="mt-4 flex flex-wrap gap-2">
        <Button variant="primary" disabled={isBusy} onClick={handleReverse}>
          {isBusy ? 'Reversing …' : 'Reverse it'}
        </Button>
        <Button variant="quiet" onClick={onClose}>
          Leave it
        </Button>
      </div>
    </Dialog>
  )
}

function placeWords(end: MovementResponse['from']): string {
  return end.cribCode !== null && end.code !== null ? end.code : end.name
}
