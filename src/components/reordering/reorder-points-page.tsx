'use client'

import dynamic from 'next/dynamic'
import { useRef, useState } from 'react'
import { useCribs } from '@/hooks/use-cribs'
import { useSuppliers } from '@/hooks/use-suppliers'
import type { PartsListHandle } from '../grid/parts-list-grid'
import { PageHeading } from '../layout/page-heading'
import { useCan } from '../layout/shop-context'
import { Button, ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { StateSentence } from '../ui/state-sentence'
import { TextField } from '../ui/text-field'
import { AddReorderPointDialog } from './add-reorder-point-dialog'
import { ChangeSelectedDialog } from './change-selected-dialog'
import { SupplierDialog } from './supplier-dialog'
import { useReorderPointEditing } from './use-reorder-point-editing'

const ReorderPointsGrid = dynamic(() => import('./reorder-points-grid'), {
  ssr: false,
  loading: () => <StateSentence sentence="Reading the reorder points …" />,
})

/** When each item of each crib is low, edited in place. */
export function ReorderPointsPage() {
  const [cribId, setCribId] = useState('')
  const [q, setQ] = useState('')
  const [open, setOpen] = useState<'add' | 'change' | 'supplier' | null>(null)
  const grid = useRef<PartsListHandle | null>(null)
  const canKeep = useCan('keepCrib')
  const editing = useReorderPointEditing(grid)
  const { data: cribs } = useCribs()
  const { data: suppliers, refresh: refreshSuppliers } = useSuppliers()
  const rows = suppliers?.rows ?? []
  return (
    <>
      <PageHeading
        title="Reorder points"
        note={
          canKeep
            ? 'A double click, F2 or typing changes a cell; Enter keeps it, Esc leaves it. Space selects a row.'
            : 'At or below its reorder point an item is low.'
        }
      >
        <ButtonLink href="/alerts">Low stock</ButtonLink>
        {canKeep ? (
          <>
            <Button variant="primary" onClick={() => setOpen('add')}>
              Add a reorder point
            </Button>
            <Button onClick={() => setOpen('supplier')}>Add a supplier</Button>
            <Button disabled={editing.selected.length === 0} onClick={() => setOpen('change')}>
              Change{' '}
              {editing.selected.length === 0 ? 'the rows selected' : `${editing.selected.length} selected`}
            </Button>
          </>
        ) : null}
      </PageHeading>
      <div className="flex flex-wrap items-end gap-3 px-4 pb-3 lg:px-6">
        <TextField
          label="Search"
          defaultValue=""
          placeholder="Code, maker, description"
          onChange={(event) => setQ(event.target.value.trim().slice(0, 200))}
        />
        <SelectField
          label="Crib"
          value={cribId}
          onChange={(event) => setCribId(event.target.value)}
          options={[
            { value: '', label: 'All cribs' },
            ...(cribs?.rows ?? []).map((crib) => ({ value: crib.id, label: `${crib.code} · ${crib.name}` })),
          ]}
        />
      </div>
      {editing.refusals.map((refusal) => (
        <div key={`${refusal.row.id} ${refusal.field.field}`} className="px-4 pb-2 lg:px-6">
          <Notice kind="collision" isAnnounced>
            <strong>
              {refusal.row.itemCode} in {refusal.row.cribCode}, {refusal.field.label}
            </strong>{' '}
            was not changed to “{refusal.text}”. {refusal.message}{' '}
            <Button
              size="compact"
              onClick={() => grid.current?.editCell(refusal.row.id, refusal.field.field)}
            >
              Correct it
            </Button>{' '}
            <Button
              size="compact"
              variant="quiet"
              onClick={() => editing.takeBack(refusal.row, refusal.field.field, null)}
            >
              Leave it as it was
            </Button>
          </Notice>
        </div>
      ))}
      <div className="relative h-[calc(100dvh-16rem)] min-h-96 shrink-0">
        <ReorderPointsGrid
          key={rows.length}
          filters={{ cribId, q }}
          suppliers={rows}
          editing={canKeep ? editing : undefined}
          handleRef={grid}
        />
      </div>
      {open === 'change' ? (
        <ChangeSelectedDialog
          rows={editing.selected}
          suppliers={rows}
          onChange={editing.changeSelected}
          onClose={() => setOpen(null)}
        />
      ) : null}
      {open === 'add' ? (
        <AddReorderPointDialog
          onClose={() => setOpen(null)}
          onSaved={() => {
            setOpen(null)
            grid.current?.reload()
          }}
        />
      ) : null}
      {open === 'supplier' ? (
        <SupplierDialog
          onClose={() => setOpen(null)}
          onSaved={() => {
            setOpen(null)
            void refreshSuppliers()
          }}
        />
      ) : null}
    </>
  )
}
