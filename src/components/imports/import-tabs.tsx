'use client'

import { Tabs } from 'radix-ui'
import type { ReactNode } from 'react'
import type { ImportResponse, RowOutcome } from '@/schemas/import'
import { countText } from './import-words'

export type ImportView = RowOutcome | 'columns' | 'warnings'

interface ViewTab {
  view: ImportView
  label: string
  count: number
}

/** What there is to look at, what needs a person first; of an ended import only what was kept. */
export function viewsOf(found: ImportResponse): ViewTab[] {
  const rejected: ViewTab = { view: 'rejected', label: 'Rejected', count: found.rejectedCount }
  const columns: ViewTab = { view: 'columns', label: 'Columns', count: found.columns.length }
  if (found.state === 'committed') return [...(found.rejectedCount > 0 ? [rejected] : []), columns]
  if (found.state !== 'checked') return []
  const outcomes: ViewTab[] = [
    rejected,
    { view: 'added', label: 'Added', count: found.added },
    { view: 'changed', label: 'Changed', count: found.changed },
    { view: 'unchanged', label: 'Left alone', count: found.unchanged },
  ]
  const warnings: ViewTab = { view: 'warnings', label: 'Warnings', count: found.warningCount }
  const withRows = outcomes.filter(({ count }) => count > 0)
  const rest = found.warningCount > 0 ? [warnings] : []
  return hasItemKey(found) ? [...withRows, columns, ...rest] : [columns, ...withRows, ...rest]
}

/** Whether a column says which item a row means; until one does only the columns are worth a look. */
export function hasItemKey(found: ImportResponse): boolean {
  const fields = new Set(found.columns.map((column) => column.field))
  return fields.has('code') || (fields.has('maker') && fields.has('partNumber'))
}

export interface ImportTabsProps {
  views: readonly ViewTab[]
  shown: ImportView
  onShow: (view: ImportView) => void
  children: ReactNode
}

export function ImportTabs({ views, shown, onShow, children }: ImportTabsProps) {
  return (
    <Tabs.Root
      value={shown}
      onValueChange={(value) => {
        const chosen = views.find(({ view }) => view === value)
        if (chosen) onShow(chosen.view)
      }}
      className="flex flex-1 flex-col"
    >
      <Tabs.List
        aria-label="What the file holds"
        className="border-ink flex flex-wrap gap-x-1 border-b px-2 lg:px-4"
      >
        {views.map(({ view, label, count }) => (
          <Tabs.Trigger
            key={view}
            value={view}
            className="hover:bg-accent-wash data-[state=active]:border-accent data-[state=active]:text-ink text-ink-soft min-h-11 border-b-[3px] border-transparent px-3 pt-[3px] text-[0.9375rem] font-semibold whitespace-nowrap"
          >
            {label} <span className="text-ink-soft font-normal">{countText(count)}</span>
          </Tabs.Trigger>
        ))}
      </Tabs.List>
      <Tabs.Content value={shown} tabIndex={-1} className="outline-none">
        {children}
      </Tabs.Content>
    </Tabs.Root>
  )
}
