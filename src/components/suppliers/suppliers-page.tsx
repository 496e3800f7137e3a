'use client'

import Link from 'next/link'
import { useState } from 'react'
import { useSuppliers } from '@/hooks/use-suppliers'
import { faultSentence } from '@/lib/field-faults'
import type { SupplierResponse } from '@/schemas/supplier'
import { PageHeading } from '../layout/page-heading'
import { useCan } from '../layout/shop-context'
import { Button, ButtonLink } from '../ui/button'
import { StateSentence } from '../ui/state-sentence'
import { SupplierDialog } from './supplier-dialog'

/** Whom the shop buys from, and how to reach them. */
export function SuppliersPage() {
  const canKeep = useCan('keepCrib')
  const [withArchived, setWithArchived] = useState(false)
  const [edited, setEdited] = useState<SupplierResponse | 'new' | null>(null)
  const { data, error, refresh } = useSuppliers({ withArchived })
  const rows = (data?.rows ?? []).filter((row) => withArchived || !row.isArchived)
  return (
    <>
      <PageHeading title="Suppliers" note="Whom the shop buys from. A reorder point names one of them.">
        <label className="flex min-h-11 items-center gap-2.5">
          <input
            type="checkbox"
            className="accent-accent size-5"
            checked={withArchived}
            onChange={(event) => setWithArchived(event.target.checked)}
          />
          Archived too
        </label>
        <ButtonLink href="/reorder-points">Reorder points</ButtonLink>
        {canKeep ? (
          <Button variant="primary" onClick={() => setEdited('new')}>
            Add a supplier
          </Button>
        ) : null}
      </PageHeading>
      {error ? (
        <StateSentence sentence={`The suppliers could not be read. ${faultSentence(error)}`}>
          <Button onClick={() => void refresh()}>Try again</Button>
        </StateSentence>
      ) : !data ? (
        <StateSentence sentence="Reading the suppliers …" />
      ) : rows.length === 0 ? (
        <StateSentence
          sentence={
            canKeep
              ? 'No supplier is named yet. Add whom you buy from, so that an alert says whom to ask.'
              : 'No supplier is named yet. The crib manager adds them.'
          }
        />
      ) : (
        <SuppliersTable rows={rows} onOpen={canKeep ? setEdited : undefined} />
      )}
      {edited ? (
        <SupplierDialog
          supplier={edited === 'new' ? null : edited}
          onClose={() => setEdited(null)}
          onSaved={() => {
            setEdited(null)
            void refresh()
          }}
        />
      ) : null}
    </>
  )
}

const rowClass =
  'border-hairline hover:bg-accent-wash border-b align-top max-sm:block max-sm:px-4 max-sm:py-2 sm:[&>td]:px-3 sm:[&>td]:py-1.5 sm:[&>td:first-child]:pl-4 lg:[&>td:first-child]:pl-6 sm:[&>td:last-child]:pr-4 lg:[&>td:last-child]:pr-6 max-sm:[&>td]:block max-sm:[&>td:empty]:hidden'

function SuppliersTable({
  rows,
  onOpen,
}: {
  rows: SupplierResponse[]
  onOpen: ((row: SupplierResponse) => void) | undefined
}) {
  return (
    <div className="border-ink bg-sheet border-t">
      <table className="w-full text-left text-[0.9375rem]">
        <thead className="border-ink border-b max-sm:hidden">
          <tr className="[&>th]:px-3 [&>th]:py-2 [&>th:first-child]:pl-4 lg:[&>th:first-child]:pl-6 [&>th:last-child]:pr-4 lg:[&>th:last-child]:pr-6">
            <th scope="col">Supplier</th>
            <th scope="col">E-mail</th>
            <th scope="col">Telephone</th>
            <th scope="col">Whom to ask for</th>
            <th scope="col">Our number there</th>
            <th scope="col" className="text-right">
              Lead time
            </th>
            <th scope="col" className="text-right">
              Reorder points
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <SupplierRow key={row.id} row={row} onOpen={onOpen} />
          ))}
        </tbody>
      </table>
    </div>
  )
}

function SupplierRow({
  row,
  onOpen,
}: {
  row: SupplierResponse
  onOpen: ((row: SupplierResponse) => void) | undefined
}) {
  return (
    <tr className={rowClass}>
      <td>
        {onOpen ? (
          <button
            type="button"
            className="text-accent min-h-6 text-left font-semibold hover:underline pointer-coarse:min-h-11"
            onClick={() => onOpen(row)}
          >
            {row.name}
          </button>
        ) : (
          <span className="font-semibold">{row.name}</span>
        )}
        {row.isArchived ? <span className="text-ink-soft ml-2 text-sm">Archived</span> : null}
      </td>
      <td className="break-all">{row.email}</td>
      <td>{row.phone}</td>
      <td>{row.contactName}</td>
      <td>
        {row.accountNumber ? <span className="text-ink-soft sm:hidden">Our number there: </span> : null}
        {row.accountNumber}
      </td>
      <td className="sm:text-right">{row.leadTimeDays === null ? '' : `${row.leadTimeDays} days`}</td>
      <td className="sm:text-right">
        {row.reorderPoints > 0 ? (
          <Link
            href={`/reorder-points?supplierId=${row.id}`}
            prefetch={false}
            className="text-accent inline-flex min-h-6 items-center hover:underline pointer-coarse:min-h-11"
          >
            {row.reorderPoints}
            <span className="sm:sr-only">
              &nbsp;{row.reorderPoints === 1 ? 'reorder point' : 'reorder points'}
            </span>
          </Link>
        ) : (
          <span className="text-ink-soft max-sm:hidden">–</span>
        )}
      </td>
    </tr>
  )
}
