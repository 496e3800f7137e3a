'use client'

import dynamic from 'next/dynamic'
import { useState } from 'react'
import { useCan } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { useItemReorderPoints } from '@/hooks/use-reorder-points'
import { useSuppliers } from '@/hooks/use-suppliers'
import type { ReorderPointRow } from '@/schemas/reordering'
import { cellClass, headingCellClass } from './item-section'
import { SectionState } from './section-state'

/** The form's code comes only when it is opened. */
const ReorderPointDialog = dynamic(
  () => import('../reordering/reorder-point-dialog').then((module) => module.ReorderPointDialog),
  { ssr: false },
)

export interface ItemReorderPointsProps {
  item: { id: string; code: string; archivedAt: string | null }
}

/** When the item is low, crib by crib; set and changed here by who keeps the crib. */
export function ItemReorderPoints({ item }: ItemReorderPointsProps) {
  const { rows, error, retry } = useItemReorderPoints(item.id)
  const mayKeep = useCan('keepCrib') && item.archivedAt === null
  const [edited, setEdited] = useState<ReorderPointRow | 'new' | null>(null)
  if (error) {
    return (
      <SectionState sentence={`The reorder points could not be loaded. ${error.message}`} onRetry={retry} />
    )
  }
  if (!rows) return <SectionState sentence="Loading the reorder points …" />
  return (
    <div className="mt-4">
      {rows.length > 0 ? (
        <PointTable rows={rows} onEdit={mayKeep ? setEdited : undefined} />
      ) : (
        <p>It has no reorder point, so nobody is told when it runs out.</p>
      )}
      {mayKeep ? (
        <Button size="compact" className="mt-2 print:hidden" onClick={() => setEdited('new')}>
          Add a reorder point
        </Button>
      ) : null}
      {edited ? <PointDialog item={item} edited={edited} onClose={() => setEdited(null)} /> : null}
    </div>
  )
}

interface PointDialogProps extends ItemReorderPointsProps {
  edited: ReorderPointRow | 'new'
  onClose: () => void
}

function PointDialog({ item, edited, onClose }: PointDialogProps) {
  const { data } = useSuppliers()
  return (
    <ReorderPointDialog
      row={edited === 'new' ? null : edited}
      item={item}
      suppliers={data?.rows ?? []}
      onClose={onClose}
      onSaved={onClose}
    />
  )
}

interface PointTableProps {
  rows: readonly ReorderPointRow[]
  onEdit: ((row: ReorderPointRow) => void) | undefined
}

function PointTable({ rows, onEdit }: PointTableProps) {
  const figureHeading = `${headingCellClass} text-right`
  return (
    <table className="w-full">
      <thead>
        <tr className="border-ink border-b">
          <th scope="col" className={headingCellClass}>
            Crib
          </th>
          <th scope="col" className={figureHeading}>
            Reorder point
          </th>
          <th scope="col" className={figureHeading}>
            Order up to
          </th>
          <th scope="col" className={figureHeading}>
            Available and coming
          </th>
          {onEdit ? (
            <th scope="col" className={`${headingCellClass} print:hidden`}>
              <span className="sr-only">Change</span>
            </th>
          ) : null}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id} className="border-hairline border-b">
            <th scope="row" className={`${cellClass} text-left font-normal`}>
              {row.cribCode}
            </th>
            <td className={`${cellClass} text-right`}>{row.reorderPoint}</td>
            <td className={`${cellClass} text-right`}>{row.orderUpTo}</td>
            <td className={`${cellClass} text-right`}>
              {row.position}
              {row.position <= row.reorderPoint ? (
                <span className="text-caution font-semibold">, low</span>
              ) : null}
            </td>
            {onEdit ? (
              <td className={`${cellClass} text-right print:hidden`}>
                <Button
                  variant="quiet"
                  size="compact"
                  aria-label={`Change the reorder point in ${row.cribCode}`}
                  onClick={() => onEdit(row)}
                >
                  Change
                </Button>
              </td>
            ) : null}
          </tr>
        ))}
      </tbody>
    </table>
  )
}
