'use client'

import { useCallback, useEffect, useState } from 'react'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { ItemForm } from './item-form'
import { MakerList } from './maker-list'

export interface ItemFormDialogProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  row: Row | null
  isOpen: boolean
  onClose: () => void
  onSaved: (row: Row) => void
}

/** The form beside what it changes. Closing it with unsaved changes asks first. */
export function ItemFormDialog<Row extends CatalogueRow>(props: ItemFormDialogProps<Row>) {
  const { definition, row, isOpen, onClose, onSaved } = props
  const [isDirty, setIsDirty] = useState(false)
  const [isAsking, setIsAsking] = useState(false)
  useLeaveWarning(isOpen && isDirty)

  const handleClose = useCallback(() => {
    if (isDirty) setIsAsking(true)
    else onClose()
  }, [isDirty, onClose])

  function handleDiscard() {
    setIsAsking(false)
    setIsDirty(false)
    onClose()
  }

  return (
    <>
      <Dialog
        isOpen={isOpen}
        onOpenChange={(open) => (open ? undefined : handleClose())}
        title={row ? `Edit ${row.code}` : `Add a ${definition.one}`}
        description="Write dimensions as you would: 1/8, 3.175 mm, #7."
        shape="side"
      >
        <MakerList kind={definition.kind} />
        <ItemForm
          definition={definition}
          row={row}
          onDirtyChange={setIsDirty}
          onCancel={handleClose}
          onSaved={(saved) => {
            setIsDirty(false)
            onSaved(saved)
          }}
        />
      </Dialog>
      <Dialog isOpen={isAsking} onOpenChange={setIsAsking} title="Leave without saving?">
        <p>What you typed is not saved and would be lost.</p>
        <div className="mt-4 flex flex-wrap gap-2">
          <Button variant="primary" onClick={() => setIsAsking(false)}>
            Go on editing
          </Button>
          <Button variant="danger" onClick={handleDiscard}>
            Leave without saving
          </Button>
        </div>
      </Dialog>
    </>
  )
}

/** The browser asks too, before the tab is closed or another address is opened. */
function useLeaveWarning(isActive: boolean): void {
  useEffect(() => {
    if (!isActive) return
    const handle = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', handle)
    return () => window.removeEventListener('beforeunload', handle)
  }, [isActive])
}
