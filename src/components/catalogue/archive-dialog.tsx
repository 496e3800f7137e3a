'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { toast } from '@/components/ui/toast'
import { useArchiveItem } from '@/hooks/use-archive-item'
import type { CatalogueRow } from './catalogue-row'

/** An item is never deleted: it leaves the lists and stays in the books. Refused while a piece of it is in the shop. */
export function ArchiveDialog({ row, onClose }: { row: CatalogueRow; onClose: () => void }) {
  const archiveItem = useArchiveItem(row.kind)
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)

  async function handleArchive() {
    setIsBusy(true)
    setFailure(null)
    try {
      await archiveItem(row, true)
      toast.success(`${row.code} is archived.`)
      onClose()
    } catch (error) {
      setFailure(error instanceof Error ? error.message : 'Archiving failed.')
      setIsBusy(false)
    }
  }

  return (
    <Dialog isOpen onOpenChange={(isOpen) => (isOpen ? undefined : onClose())} title={`Archive ${row.code}?`}>
      <p>It leaves the lists and every search, and stays in the books. It can be brought back at any time.</p>
      {failure ? (
        <Notice kind="collision" isAnnounced className="mt-3">
          {failure}
        </Notice>
      ) : null}
      <div className="mt-4 flex flex-wrap gap-2">
        <Button variant="danger" disabled={isBusy} onClick={handleArchive}>
          {isBusy ? 'Archiving …' : 'Archive it'}
        </Button>
        <Button variant="quiet" onClick={onClose}>
          Leave it
        </Button>
      </div>
    </Dialog>
  )
}
