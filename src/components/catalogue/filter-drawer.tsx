'use client'

import { ListFilter } from 'lucide-react'
import { type ReactNode, useState } from 'react'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'

/** Sorting and filtering of a list on a phone: out of the way until it is asked for. */
export function FilterDrawer({
  count,
  found,
  onClear,
  children,
}: {
  count: number
  /** How many pass as it is now; null while nobody knows. */
  found: number | null
  onClear: () => void
  children: ReactNode
}) {
  const [isOpen, setIsOpen] = useState(false)
  return (
    <>
      <Button className="min-h-11" onClick={() => setIsOpen(true)}>
        <ListFilter aria-hidden="true" className="size-5" />
        Filters{count > 0 ? ` (${count})` : ''}
      </Button>
      <Dialog isOpen={isOpen} onOpenChange={setIsOpen} title="Sort and filter" shape="side">
        <div className="flex flex-col gap-4">
          {children}
          <div className="bg-sheet border-hairline sticky bottom-0 -mx-5 -mb-4 flex flex-wrap gap-2 border-t px-5 py-3">
            <Button variant="primary" className="flex-1" onClick={() => setIsOpen(false)}>
              {found === null ? 'Show the list' : `Show ${found.toLocaleString('en')}`}
            </Button>
            <Button disabled={count === 0} onClick={onClear}>
              Clear all
            </Button>
          </div>
        </div>
      </Dialog>
    </>
  )
}
