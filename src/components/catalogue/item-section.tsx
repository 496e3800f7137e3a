import type { ReactNode } from 'react'

export interface ItemSectionProps {
  title: string
  /** Beside the title, at the end of the line. */
  aside?: ReactNode
  children: ReactNode
}

/** A part of an item's page under its heavy rule. */
export function ItemSection({ title, aside, children }: ItemSectionProps) {
  return (
    <section aria-label={title} className="min-w-0 break-inside-avoid">
      <div className="border-ink flex flex-wrap items-end justify-between gap-x-4 gap-y-1 border-b-2 pb-1">
        <h2 className="text-lg">{title}</h2>
        {aside}
      </div>
      {children}
    </section>
  )
}

export const cellClass = 'px-2 py-1.5 first:pl-0 last:pr-0'
export const headingCellClass = `${cellClass} text-ink-soft text-left text-sm font-normal`
