'use client'

import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { cancelLabel } from './import-words'

export interface CancelDialogProps {
  isOpen: boolean
  onClose: () => void
  onCancelImport: () => void
}

export function CancelDialog({ isOpen, onClose, onCancelImport }: CancelDialogProps) {
  return (
    <Dialog
      isOpen={isOpen}
      onOpenChange={(open) => {
        if (!open) onClose()
      }}
      title="Cancel this import?"
    >
      <div className="flex flex-col gap-4 p-5">
        <p>The uploaded file and its check are dropped. The catalogue and the stock stay as they are.</p>
        <div className="flex flex-wrap gap-3">
          <Button variant="danger" onClick={onCancelImport}>
            {cancelLabel}
          </Button>
          <Button onClick={onClose}>Keep it</Button>
        </div>
      </div>
    </Dialog>
  )
}
