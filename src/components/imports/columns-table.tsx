'use client'

import { useId, useState } from 'react'
import type { ImportResponse, RecheckImportRequest } from '@/schemas/import'
import {
  hasDecimals,
  hasLengths,
  hasLengthUnit,
  type ImportKind,
  importField,
  importFields,
} from '@/schemas/import-fields'
import type { DecimalSign, ImportColumn } from '@/schemas/import-mapping'
import { Button } from '../ui/button'
import { controlClass } from '../ui/field'

type Target = { field: string; unit: '' | 'mm' | 'in' }

export interface ColumnsTableProps {
  found: ImportResponse
  isBusy: boolean
  /** Absent where the import has ended and nothing can be changed any more. */
  onRecheck?: (change: RecheckImportRequest) => void
}

function targetOf(column: ImportColumn): Target {
  return { field: column.field ?? '', unit: column.unit ?? '' }
}

/** Which column of the file is which field: known, kept from last time, or said here; a change is checked again. */
export function ColumnsTable({ found, isBusy, onRecheck }: ColumnsTableProps) {
  const [changed, setChanged] = useState<Record<string, Target>>({})
  const [unit, setUnit] = useState(found.unit)
  const [decimals, setDecimals] = useState(found.decimals)
  const targets = new Map(
    found.columns.map((column) => [column.heading, changed[column.heading] ?? targetOf(column)]),
  )
  const isDirty = Object.keys(changed).length > 0 || unit !== found.unit || decimals !== found.decimals

  function handleChange(heading: string, target: Target) {
    // A field is given by one column: the one that had it lets go.
    const losers = [...targets].filter(
      ([other, its]) => other !== heading && its.field !== '' && its.field === target.field,
    )
    setChanged((before) => ({
      ...before,
      ...Object.fromEntries(losers.map(([other, its]) => [other, { ...its, field: '' }])),
      [heading]: target,
    }))
  }

  return (
    <div>
      <div className="flex flex-wrap items-end justify-between gap-3 px-4 py-3 lg:px-6">
        <p className="text-ink-soft max-w-[70ch] text-[0.9375rem]">
          {onRecheck
            ? 'What you set here is kept by the shop when the import is committed, and known the next time.'
            : 'How the columns of this file were read.'}
        </p>
        {onRecheck ? (
          <div className="flex flex-wrap gap-x-6 gap-y-2">
            {hasDecimals(found.kind) && decimals ? (
              <FileDecimals
                decimals={decimals}
                note={decimals === found.decimals ? decimalsNote(found) : 'not checked yet'}
                onChange={setDecimals}
              />
            ) : null}
            {hasLengths(found.kind) ? <FileUnit unit={unit} onChange={setUnit} /> : null}
          </div>
        ) : null}
      </div>
      <table className="border-ink w-full border-t text-left text-[0.9375rem]">
        <thead className="border-ink border-b max-md:hidden">
          <tr className="[&>th]:px-4 [&>th]:py-2 lg:[&>th]:px-6">
            <th scope="col">Column of the file</th>
            <th scope="col">Samples</th>
            <th scope="col">Field</th>
            <th scope="col">Unit</th>
            <th scope="col">How it is known</th>
          </tr>
        </thead>
        <tbody>
          {found.columns.map((column) => (
            <ColumnRow
              key={column.heading}
              kind={found.kind}
              column={column}
              target={targets.get(column.heading) ?? targetOf(column)}
              isChanged={changed[column.heading] !== undefined}
              isFixed={!onRecheck}
              onChange={(target) => handleChange(column.heading, target)}
            />
          ))}
        </tbody>
      </table>
      {onRecheck && isDirty ? (
        <div className="bg-sheet border-ink sticky bottom-0 flex flex-wrap items-center gap-3 border-t px-4 py-3 lg:px-6">
          <Button
            variant="primary"
            disabled={isBusy}
            onClick={() =>
              onRecheck({
                unit,
                ...(decimals && decimals !== found.decimals ? { decimals } : {}),
                mapping: mappingOf(found.columns, changed),
              })
            }
          >
            {isBusy ? 'Starting …' : 'Check again'}
          </Button>
          <Button
            onClick={() => {
              setChanged({})
              setUnit(found.unit)
              setDecimals(found.decimals)
            }}
          >
            Undo
          </Button>
        </div>
      ) : null}
    </div>
  )
}

/** What was said before stays said; a guess that was left alone stays a guess. */
function mappingOf(
  columns: readonly ImportColumn[],
  changed: Record<string, Target>,
): NonNullable<RecheckImportRequest['mapping']> {
  return Object.fromEntries(
    columns
      .filter((column) => changed[column.heading] || column.origin === 'set')
      .map((column) => {
        const { field, unit } = changed[column.heading] ?? targetOf(column)
        return [column.heading, { field: field || null, unit: unit || null }]
      }),
  )
}

const decimalNotes = {
  set: 'set here',
  guessed: 'as its numbers tell',
  shop: 'as the shop writes them',
} as const

function decimalsNote({ decimalsOrigin }: ImportResponse): string {
  return decimalsOrigin ? decimalNotes[decimalsOrigin] : ''
}

interface FileDecimalsProps {
  decimals: DecimalSign
  /** How it is known. */
  note: string
  onChange: (decimals: DecimalSign) => void
}

function FileDecimals({ decimals, note, onChange }: FileDecimalsProps) {
  const id = useId()
  return (
    <div className="flex items-center gap-x-2 text-[0.9375rem] max-sm:flex-wrap">
      <label htmlFor={id} className="font-semibold whitespace-nowrap">
        Decimals in this file
      </label>
      <select
        id={id}
        aria-describedby={`${id}-note`}
        className={controlClass}
        value={decimals}
        onChange={(event) => onChange(event.target.value === 'comma' ? 'comma' : 'point')}
      >
        <option value="point">point: 12.5</option>
        <option value="comma">comma: 12,5</option>
      </select>
      <span id={`${id}-note`} className="text-ink-soft whitespace-nowrap">
        {note}
      </span>
    </div>
  )
}

function FileUnit({ unit, onChange }: { unit: 'mm' | 'in'; onChange: (unit: 'mm' | 'in') => void }) {
  return (
    <label className="flex items-center gap-2 text-[0.9375rem] font-semibold">
      <span className="whitespace-nowrap">Bare numbers in</span>
      <select
        className={controlClass}
        value={unit}
        onChange={(event) => onChange(event.target.value === 'in' ? 'in' : 'mm')}
      >
        <option value="mm">millimetres</option>
        <option value="in">inches</option>
      </select>
    </label>
  )
}

interface ColumnRowProps {
  kind: ImportKind
  column: ImportColumn
  target: Target
  isChanged: boolean
  isFixed: boolean
  onChange: (target: Target) => void
}

function ColumnRow({ kind, column, target, isChanged, isFixed, onChange }: ColumnRowProps) {
  const id = useId()
  return (
    <tr className="border-hairline border-b align-middle max-md:grid max-md:grid-cols-[1fr_auto] max-md:gap-x-3 max-md:px-4 max-md:py-3 md:[&>td]:px-4 md:[&>td]:py-1 lg:[&>td]:px-6">
      <td id={id} className="font-semibold break-words max-md:col-span-2">
        {column.heading}
      </td>
      <td className="text-ink-soft max-w-72 truncate max-md:col-span-2">
        {column.samples.join(' · ') || 'empty'}
      </td>
      <td className="md:w-80">
        {isFixed ? (
          (importField(kind, target.field)?.label ?? <span className="text-ink-soft">left out</span>)
        ) : (
          <FieldSelect kind={kind} labelledBy={id} target={target} onChange={onChange} />
        )}
      </td>
      <td className="md:w-36">
        <UnitSelect kind={kind} column={column} target={target} isFixed={isFixed} onChange={onChange} />
      </td>
      <td className="text-sm max-md:col-span-2 md:w-56">
        <ColumnStanding column={column} target={target} isChanged={isChanged} />
      </td>
    </tr>
  )
}

function FieldSelect({
  kind,
  labelledBy,
  target,
  onChange,
}: Pick<ColumnRowProps, 'kind' | 'target' | 'onChange'> & { labelledBy: string }) {
  return (
    <select
      aria-labelledby={labelledBy}
      className={controlClass}
      value={target.field}
      onChange={(event) => onChange({ ...target, field: event.target.value })}
    >
      <option value="">Leave out</option>
      {importFields[kind].map((field) => (
        <option key={field.field} value={field.field}>
          {field.symbol ? `${field.label} [${field.symbol}]` : field.label}
        </option>
      ))}
    </select>
  )
}

/** Of bare numbers in the column; fields that are no length have none. */
function UnitSelect({ kind, column, target, isFixed, onChange }: Omit<ColumnRowProps, 'isChanged'>) {
  const type = importField(kind, target.field)?.type
  if (!type || !hasLengthUnit(type)) return null
  if (isFixed) return target.unit === '' ? 'file’s unit' : target.unit
  return (
    <select
      aria-label={`Unit of ${column.heading}`}
      className={controlClass}
      value={target.unit}
      onChange={(event) => onChange({ ...target, unit: event.target.value as Target['unit'] })}
    >
      <option value="">file’s</option>
      <option value="mm">mm</option>
      <option value="in">in</option>
    </select>
  )
}

const originWords = { set: 'set here', kept: 'kept from last time', known: 'known by its heading' } as const

function ColumnStanding({
  column,
  target,
  isChanged,
}: Pick<ColumnRowProps, 'column' | 'target' | 'isChanged'>) {
  if (isChanged) return <span className="text-caution">not checked yet</span>
  if (target.field !== '')
    return <span className="text-ink-soft">{column.origin && originWords[column.origin]}</span>
  return column.note ? (
    <span className="text-caution">{column.note}</span>
  ) : (
    <span className="text-ink-soft">{column.origin ? originWords[column.origin] : 'not known'}</span>
  )
}
