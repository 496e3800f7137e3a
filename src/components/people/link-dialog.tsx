'use client'

import { toast } from '@/components/ui/toast'
import type { PersonLink } from '@/schemas/person'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { TextField } from '../ui/text-field'

/** The one-time address, shown this once: it is handed over by whoever added the person. */
export function LinkDialog({ link, onClose }: { link: PersonLink; onClose: () => void }) {
  async function handleCopy() {
    try {
      await navigator.clipboard.writeText(link.link)
      toast.success('Copied.')
    } catch {
      toast.error('The browser did not let it be copied; mark the address and copy it by hand.')
    }
  }
  return (
    <Dialog
      isOpen
      onOpenChange={onClose}
      title={`For ${link.person.name}`}
      description="It works once, within seven days, and is not shown again."
    >
      <div className="flex flex-col gap-4">
        <TextField
          label="One-time address to set a password"
          value={link.link}
          readOnly
          onFocus={(event) => event.target.select()}
        />
        <div className="flex gap-2">
          <Button variant="primary" onClick={handleCopy}>
            Copy
          </Button>
          <Button onClick={onClose}>Done</Button>
        </div>
      </div>
    </Dialog>
  )
}
