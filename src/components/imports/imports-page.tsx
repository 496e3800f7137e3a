'use client'

import Link from 'next/link'
import { useImports } from '@/hooks/use-imports'
import { faultSentence } from '@/lib/field-faults'
import { formatInstant } from '@/lib/format-instant'
import type { ImportListRow } from '@/schemas/import'
import { importKindLabels } from '@/schemas/import-fields'
import { PageHeading } from '../layout/page-heading'
import { Button, ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { StateSentence } from '../ui/state-sentence'
import { countText, stateWords } from './import-words'

/** Files that were brought, newest first. */
export function ImportsPage({ initialRows }: { initialRows: ImportListRow[] }) {
  const { rows, error, refresh } = useImports(initialRows)
  return (
    <>
      <PageHeading title="Imports" note="Catalogue and opening stock from CSV files.">
        <ButtonLink href="/imports/new" variant="primary">
          Import a file
        </ButtonLink>
      </PageHeading>
      {error ? (
        <Notice kind="collision" className="mx-4 mb-3 lg:mx-6">
          {faultSentence(error)}{' '}
          <Button size="compact" variant="quiet" onClick={() => void refresh()}>
            Try again
          </Button>
        </Notice>
      ) : null}
      {rows.length === 0 ? <NoImports /> : <ImportsTable rows={rows} />}
    </>
  )
}

function NoImports() {
  return (
    <div className="border-ink bg-sheet border-t">
      <StateSentence sentence="No file was imported yet. Bring the list you keep your tools in: any headings will do.">
        <ButtonLink href="/imports/new">Import a file</ButtonLink>
      </StateSentence>
    </div>
  )
}

function ImportsTable({ rows }: { rows: ImportListRow[] }) {
  return (
    <div className="border-ink bg-sheet border-t">
      <table className="w-full text-left text-[0.9375rem]">
        <thead className="border-ink border-b max-md:hidden">
          <tr className="[&>th]:px-4 [&>th]:py-2 lg:[&>th]:px-6">
            <th scope="col">File</th>
            <th scope="col">Holds</th>
            <th scope="col">State</th>
            <th scope="col" className="text-right">
              Added
            </th>
            <th scope="col" className="text-right">
              Changed
            </th>
            <th scope="col" className="text-right">
              Rejected
            </th>
            <th scope="col">Brought by</th>
            <th scope="col">When</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <ImportsTableRow key={row.id} row={row} />
          ))}
        </tbody>
      </table>
    </div>
  )
}

function ImportsTableRow({ row }: { row: ImportListRow }) {
  return (
    <tr className="border-hairline hover:bg-accent-wash border-b max-md:grid max-md:grid-cols-2 max-md:gap-x-4 max-md:px-4 max-md:py-2 md:[&>td]:px-4 md:[&>td]:py-1.5 lg:[&>td]:px-6">
      <td className="max-md:col-span-2">
        <Link
          href={`/imports/${row.id}`}
          className="text-accent inline-flex min-h-9 items-center font-semibold break-all hover:underline pointer-coarse:min-h-11"
        >
          {row.fileName}
        </Link>
      </td>
      <td>{importKindLabels[row.kind]}</td>
      <td className={row.state === 'failed' ? 'text-collision' : ''}>{stateText(row)}</td>
      <Count label="added" value={row.added} />
      <Count label="changed" value={row.changed} />
      <Count label="rejected" value={row.rejectedCount} />
      <td className="text-ink-soft">{row.createdByName}</td>
      <td className="text-ink-soft whitespace-nowrap max-md:col-span-2">{formatInstant(row.createdAt)}</td>
    </tr>
  )
}

/** A check that found nothing to take waits for nobody. */
function stateText({ state, added, changed, unchanged, rejectedCount }: ImportListRow): string {
  if (state !== 'checked' || added + changed > 0) return stateWords[state]
  return rejectedCount > 0 || unchanged === 0
    ? 'Checked, nothing can be taken'
    : 'Checked, nothing would change'
}

function Count({ label, value }: { label: string; value: number }) {
  return (
    <td className={`md:text-right ${value === 0 ? 'text-ink-soft max-md:hidden' : ''}`}>
      {value === 0 ? '–' : countText(value)}
      <span className="md:sr-only"> {label}</span>
    </td>
  )
}
