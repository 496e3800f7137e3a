'use client'

import Link from 'next/link'
import { useImportRows } from '@/hooks/use-import-rows'
import { itemPagePath } from '@/lib/catalogue-paths'
import { faultSentence } from '@/lib/field-faults'
import type { ImportResponse, ImportRowResponse, RowOutcome } from '@/schemas/import'
import type { ImportKind } from '@/schemas/import-fields'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { StateSentence } from '../ui/state-sentence'
import { FaultGroups } from './fault-groups'
import { countText } from './import-words'
import { fieldLabel, type ValueLook, valueText } from './value-text'

export interface StagedRowsProps {
  found: ImportResponse
  outcome: RowOutcome
}

const emptySentences: Readonly<Record<RowOutcome, string>> = {
  added: 'No row adds anything.',
  changed: 'No row changes anything.',
  unchanged: 'No row is as the catalogue has it.',
  rejected: 'No row is rejected.',
}

/** The rows of one outcome in the order of the file, with what each would do or why it cannot. */
export function StagedRows({ found, outcome }: StagedRowsProps) {
  const { rows, hasMore, error, isLoading, isLoadingMore, more, retry } = useImportRows(
    found.id,
    outcome,
    found.checkedAt,
  )
  const { unit, currency } = useShop()
  const look: ValueLook = { kind: found.kind, unit, currency }
  if (error) {
    return (
      <StateSentence sentence={faultSentence(error)}>
        <Button onClick={retry}>Try again</Button>
      </StateSentence>
    )
  }
  if (isLoading) return <StateSentence sentence="Loading …" />
  if (rows.length === 0) return <StateSentence sentence={emptySentences[outcome]} />
  return (
    <>
      {outcome === 'rejected' ? (
        <RejectedTable rows={rows} isWhole={!hasMore} />
      ) : (
        <TakenTable rows={rows} look={look} />
      )}
      {hasMore ? (
        <div className="px-4 py-4 lg:px-6">
          <Button onClick={more} disabled={isLoadingMore}>
            {isLoadingMore ? 'Loading …' : `Show more after line ${countText(rows.at(-1)?.line ?? 0)}`}
          </Button>
        </div>
      ) : null}
    </>
  )
}

const rowClass =
  'border-hairline border-b align-top max-md:grid max-md:grid-cols-[auto_1fr] max-md:gap-x-3 max-md:px-4 max-md:py-2 md:[&>td]:px-4 md:[&>td]:py-1.5 lg:[&>td]:px-6'
const headClass = 'border-ink bg-sheet border-b max-md:hidden [&_th]:px-4 [&_th]:py-2 lg:[&_th]:px-6'

function RejectedTable({ rows, isWhole }: { rows: ImportRowResponse[]; isWhole: boolean }) {
  return (
    <>
      <FaultGroups rows={rows} isWhole={isWhole} />
      <table className="w-full text-left text-[0.9375rem]">
        <thead className={headClass}>
          <tr>
            <th scope="col">Line</th>
            <th scope="col">Column</th>
            <th scope="col">Value</th>
            <th scope="col">Why it is rejected</th>
          </tr>
        </thead>
        <tbody>
          {rows.flatMap((row) =>
            row.problems.map((problem, index) => (
              <tr
                key={`${row.line}-${problem.line}-${problem.column}-${problem.message}`}
                className={rowClass}
              >
                <td className="w-20 tabular-nums">
                  <span className="md:hidden">Line </span>
                  {index === 0 || problem.line !== row.line ? (
                    problem.line
                  ) : (
                    <span className="md:sr-only">{problem.line}</span>
                  )}
                </td>
                <td className="font-semibold md:w-52">{problem.column}</td>
                <td className="max-w-60 break-words max-md:col-span-2 max-md:empty:hidden">
                  {problem.value === '' ? <span className="text-ink-soft">blank</span> : problem.value}
                </td>
                <td className="max-md:col-span-2">{problem.message}</td>
              </tr>
            )),
          )}
        </tbody>
      </table>
    </>
  )
}

const itemKindOf = {
  cutters: 'cutter',
  holders: 'holder',
  collets: 'collet',
  extensions: 'extension',
} as const

export function isItemKind(kind: ImportKind): kind is keyof typeof itemKindOf {
  return Object.hasOwn(itemKindOf, kind)
}

function TakenTable({ rows, look }: { rows: ImportRowResponse[]; look: ValueLook }) {
  return (
    <table className="w-full text-left text-[0.9375rem]">
      <thead className={headClass}>
        <tr>
          <th scope="col">Line</th>
          <th scope="col">Code</th>
          <th scope="col">What it says</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.line} className={rowClass}>
            <td className="w-20">
              <span className="md:hidden">Line </span>
              {row.line}
            </td>
            <td className="font-semibold md:w-52">
              {row.itemId && isItemKind(look.kind) ? (
                <Link
                  className="text-accent hover:underline"
                  href={itemPagePath(itemKindOf[look.kind], row.itemId)}
                >
                  {row.code}
                </Link>
              ) : (
                row.code
              )}
            </td>
            <td className="max-md:col-span-2">
              {row.changes.length > 0 ? <Changes row={row} look={look} /> : (row.description ?? '')}
              {row.sizes.length > 0 ? <Sizes row={row} look={look} /> : null}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}

/** As they were read, so that a size that was meant otherwise is seen before it is brought in. */
function Sizes({ row, look }: { row: ImportRowResponse; look: ValueLook }) {
  return (
    <ul className="flex flex-wrap gap-x-4">
      {row.sizes.map(({ field, value }) => (
        <li key={field}>
          <span className="text-ink-soft">{fieldLabel(look.kind, field)} </span>
          {valueText(field, value, look)}
        </li>
      ))}
    </ul>
  )
}

function Changes({ row, look }: { row: ImportRowResponse; look: ValueLook }) {
  return (
    <ul>
      {row.changes.map(({ field, before, after }) => (
        <li key={field}>
          <span className="text-ink-soft">{fieldLabel(look.kind, field)}: </span>
          <del className="text-ink-soft">{valueText(field, before, look)}</del>
          <span aria-hidden="true"> → </span>
          <ins className="font-semibold no-underline">{valueText(field, after, look)}</ins>
        </li>
      ))}
    </ul>
  )
}
