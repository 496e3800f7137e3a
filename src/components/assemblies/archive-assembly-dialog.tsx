'use client'

import { type FormEvent, useState } from 'react'
import { toast } from '@/components/ui/toast'
import { useArchiveAssembly } from '@/hooks/use-assemblies'
import { faultSentence } from '@/lib/field-faults'
import { Dialog } from '../ui/dialog'
import { DialogFoot } from './dialog-foot'
import type { AssemblyDialogProps } from './use-dialog-act'

/** Out of the lists; its number stays its own. */
export function ArchiveAssemblyDialog({ assembly, onClose, onChanged }: AssemblyDialogProps) {
  const archiveAssembly = useArchiveAssembly()
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    setIsBusy(true)
    setFailure(null)
    try {
      onChanged(await archiveAssembly(assembly))
      toast.success(`Assembly ${assembly.number} is archived.`)
      onClose()
    } catch (error) {
      setFailure(faultSentence(error))
      setIsBusy(false)
    }
  }

  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title={`Archive assembly ${assembly.number}?`}
    >
      <form onSubmit={handleSubmit} className="flex flex-col gap-4">
        <p>
          It leaves the lists and is no longer looked at when a part of it changes. Its number stays its own.
        </p>
        <DialogFoot
          label="Archive it"
          busyLabel="Archiving …"
          isBusy={isBusy}
          failure={failure}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
