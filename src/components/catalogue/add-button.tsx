'use client'

import { Plus } from 'lucide-react'
import { useCan } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'

/** The one thing that is done most with a list by whoever keeps it. */
export function AddButton({
  one,
  isQuiet,
  onAdd,
}: {
  one: string
  /** Something else is the page's own act just now. */
  isQuiet?: boolean
  onAdd: () => void
}) {
  if (!useCan('keepCrib')) return null
  return (
    <Button variant={isQuiet ? 'secondary' : 'primary'} size="compact" onClick={onAdd}>
      <Plus aria-hidden="true" className="size-4.5" />
      Add
      <span className="sr-only"> a {one}</span>
    </Button>
  )
}
