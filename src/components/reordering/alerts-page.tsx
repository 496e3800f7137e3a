'use client'

import Link from 'next/link'
import { useState } from 'react'
import { useOpenAlerts } from '@/hooks/use-alerts'
import { useCribs } from '@/hooks/use-cribs'
import { itemPagePath } from '@/lib/catalogue-paths'
import { faultSentence } from '@/lib/field-faults'
import { formatInstant } from '@/lib/format-instant'
import { sizeWords } from '@/lib/size-words'
import type { AlertResponse } from '@/schemas/reordering'
import { PageHeading } from '../layout/page-heading'
import { useCan, useShop } from '../layout/shop-context'
import { Button, ButtonLink } from '../ui/button'
import { SelectField } from '../ui/select-field'
import { StateSentence } from '../ui/state-sentence'
import { MembersNotice } from './members-notice'

/** What became of the mail about it. */
export function mailSentence(hasMailServer: boolean): string {
  return hasMailServer
    ? 'A mail goes to the crib’s members when it happens.'
    : 'No mail server is set, so nobody is mailed: look here.'
}

/** What fell to its reorder point and has not come back above it. */
export function AlertsPage({ hasMailServer }: { hasMailServer: boolean }) {
  const canKeep = useCan('keepCrib')
  const [cribId, setCribId] = useState('')
  const { data: cribs } = useCribs()
  const { data, error, refresh } = useOpenAlerts(cribId)
  return (
    <>
      <PageHeading
        title="Low stock"
        note={`Items whose pieces, available and coming, are at or below the reorder point of their crib. ${mailSentence(hasMailServer)}`}
      >
        <SelectField
          label="Crib"
          value={cribId}
          onChange={(event) => setCribId(event.target.value)}
          options={[
            { value: '', label: 'All cribs' },
            ...(cribs?.rows ?? []).map((crib) => ({ value: crib.id, label: `${crib.code} · ${crib.name}` })),
          ]}
        />
        <ButtonLink href="/reorder-points" className="self-end">
          Reorder points
        </ButtonLink>
        {canKeep ? (
          <ButtonLink href="/crib-members" className="self-end">
            Who gets the mail
          </ButtonLink>
        ) : null}
      </PageHeading>
      <MembersNotice cribId={cribId} />
      {error ? (
        <StateSentence sentence={faultSentence(error)}>
          <Button onClick={() => void refresh()}>Try again</Button>
        </StateSentence>
      ) : !data ? (
        <StateSentence sentence="Reading what is low …" />
      ) : data.rows.length === 0 ? (
        <StateSentence sentence="Nothing is low: every item with a reorder point is above it." />
      ) : (
        <>
          <AlertsTable rows={data.rows} />
          {data.total > data.rows.length ? (
            <p className="text-ink-soft px-4 py-3 lg:px-6">
              The newest {data.rows.length} of {data.total}. Choose a crib to see fewer.
            </p>
          ) : null}
        </>
      )}
    </>
  )
}

const phoneRow = 'max-sm:block max-sm:px-4 max-sm:py-3'
const phoneCell =
  'max-sm:flex max-sm:justify-between max-sm:gap-4 sm:px-3 sm:py-1.5 sm:first:pl-4 lg:first:pl-6'

function AlertsTable({ rows }: { rows: AlertResponse[] }) {
  return (
    <div className="border-ink bg-sheet border-t">
      <table className="w-full text-left text-[0.9375rem]">
        <thead className="border-ink border-b max-sm:hidden">
          <tr className="[&>th]:px-3 [&>th]:py-2 [&>th]:align-bottom [&>th:first-child]:pl-4 lg:[&>th:first-child]:pl-6">
            <th scope="col">Item</th>
            <th scope="col">Where</th>
            <th scope="col" className="text-right">
              On hand
            </th>
            <th scope="col" className="text-right">
              Available and coming
            </th>
            <th scope="col" className="text-right">
              Reorder point
            </th>
            <th scope="col" className="text-right">
              Order
            </th>
            <th scope="col">Supplier</th>
            <th scope="col">Since</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <AlertRow key={row.id} row={row} />
          ))}
        </tbody>
      </table>
    </div>
  )
}

function AlertRow({ row }: { row: AlertResponse }) {
  const { unit } = useShop()
  return (
    <tr className={`border-hairline hover:bg-accent-wash border-b align-top ${phoneRow}`}>
      <td className="max-sm:block max-sm:pb-1 sm:px-3 sm:py-1.5 sm:pl-4 lg:pl-6">
        {row.itemKind ? (
          <Link
            href={itemPagePath(row.itemKind, row.itemId)}
            className="text-accent inline-flex min-h-6 items-center font-semibold hover:underline pointer-coarse:min-h-11"
          >
            {row.itemCode}
          </Link>
        ) : (
          <span className="font-semibold">{row.itemCode}</span>
        )}
        <span className="text-ink-soft block">
          {row.description || (row.size ? sizeWords(row.size, unit) : '')}
        </span>
      </td>
      <Cell label="Where">
        {row.cribCode}
        {row.places.length > 0 ? ` · ${row.places.join(', ')}` : ''}
      </Cell>
      <Cell label="On hand" isFigure>
        {row.onHand === 0 ? <span className="text-collision font-semibold">0, out</span> : row.onHand}
      </Cell>
      <Cell label="Available and coming" isFigure>
        {row.position}
      </Cell>
      <Cell label="Reorder point" isFigure>
        {row.reorderPoint ?? '–'}
      </Cell>
      <Cell label="Order" isFigure>
        <span className="font-semibold">{row.suggestedQuantity ?? '–'}</span>
      </Cell>
      <Cell label="Supplier">{supplierText(row)}</Cell>
      <Cell label="Since">
        <time dateTime={row.openedAt} className="text-ink-soft whitespace-nowrap">
          {formatInstant(row.openedAt)}
        </time>
      </Cell>
    </tr>
  )
}

function Cell({
  label,
  isFigure = false,
  children,
}: {
  label: string
  isFigure?: boolean
  children: React.ReactNode
}) {
  return (
    <td className={`${phoneCell} ${isFigure ? 'sm:text-right' : ''}`}>
      <span className="text-ink-soft sm:hidden">{label}</span>
      <span>{children}</span>
    </td>
  )
}

function supplierText(row: AlertResponse): string {
  if (row.supplierName === null) return 'None named'
  const days = row.leadTimeDays === null ? '' : `, ${row.leadTimeDays} days`
  return `${row.supplierName}${days}`
}
