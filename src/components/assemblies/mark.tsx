import { CircleCheck, CircleX, Hourglass } from 'lucide-react'
import type { AssemblyRow } from '@/schemas/assembly'

/** Whether an assembly still holds, in a mark and a word; nothing where it does. */
export function Mark({ isMarked, isBeingRechecked }: Pick<AssemblyRow, 'isMarked' | 'isBeingRechecked'>) {
  if (isMarked)
    return (
      <span className="text-collision inline-flex items-center gap-1 font-semibold whitespace-nowrap">
        <CircleX aria-hidden="true" className="size-4.5 shrink-0" />
        No longer holds
      </span>
    )
  if (isBeingRechecked)
    return (
      <span className="text-caution inline-flex items-center gap-1 font-semibold whitespace-nowrap">
        <Hourglass aria-hidden="true" className="size-4.5 shrink-0" />
        Being looked at
      </span>
    )
  return (
    <span className="text-holds inline-flex items-center gap-1 whitespace-nowrap">
      <CircleCheck aria-hidden="true" className="size-4.5 shrink-0" />
      Holds
    </span>
  )
}
