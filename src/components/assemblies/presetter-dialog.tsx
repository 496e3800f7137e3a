'use client'

import { type FormEvent, useState } from 'react'
import { toast } from '@/components/ui/toast'
import type { LengthUnit } from '@/core/units/length-unit'
import { useImportMeasurements } from '@/hooks/use-assemblies'
import { faultSentence } from '@/lib/field-faults'
import { formatLength } from '@/lib/format-length'
import type { ImportMeasurementsResponse } from '@/schemas/assembly'
import { useShop } from '../layout/shop-context'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { difference } from './assembly-words'
import { DialogFoot, gloveFormClass } from './dialog-foot'

const columnLabels = [
  ['number', 'Assembly number'],
  ['gaugeLength', 'Gauge length'],
  ['diameter', 'Diameter'],
] as const
type Column = (typeof columnLabels)[number][0]

/** A presetter's file: read and shown against the calculated first, then taken over whole. */
export function PresetterDialog({ onClose, onTaken }: { onClose: () => void; onTaken: () => void }) {
  const shop = useShop()
  const importMeasurements = useImportMeasurements()
  const [text, setText] = useState<string | null>(null)
  const [unit, setUnit] = useState<LengthUnit>(shop.unit)
  const [columns, setColumns] = useState<Partial<Record<Column, string>>>({})
  const [shown, setShown] = useState<ImportMeasurementsResponse | null>(null)
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)

  async function look(given: { text?: string; unit?: LengthUnit; columns?: typeof columns }) {
    const next = { text: given.text ?? text, unit: given.unit ?? unit, columns: given.columns ?? columns }
    setText(next.text)
    setUnit(next.unit)
    setColumns(next.columns)
    if (next.text === null) return
    setFailure(null)
    try {
      setShown(await importMeasurements(next))
    } catch (error) {
      setShown(null)
      setFailure(faultSentence(error))
    }
  }

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    setIsBusy(true)
    setFailure(null)
    try {
      const { rows } = await importMeasurements({ text, unit, columns, commit: true })
      toast.success(`${rows.length} ${rows.length === 1 ? 'measurement' : 'measurements'} taken over.`)
      onTaken()
      onClose()
    } catch (error) {
      setFailure(faultSentence(error))
      setIsBusy(false)
    }
  }

  const isWhole = shown !== null && shown.rows.length > 0 && shown.rejected.length === 0
  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title="Take over a presetter’s file"
      description="CSV with the headings Assembly, Gauge length and, where measured, Diameter."
      shape="side"
    >
      <form noValidate onSubmit={handleSubmit} className={gloveFormClass}>
        <label className="flex flex-col gap-1 font-semibold">
          File
          <input
            type="file"
            accept=".csv,.txt,text/csv,text/plain"
            className="border-ink-soft/60 min-h-16 rounded-[3px] border p-3 font-normal"
            onChange={async (event) => {
              const file = event.target.files?.[0]
              if (file) await look({ text: await file.text(), columns: {} })
            }}
          />
        </label>
        <SelectField
          label="Lengths without a unit are in"
          value={unit}
          onChange={(event) => void look({ unit: event.target.value === 'in' ? 'in' : 'mm' })}
          options={[
            { value: 'mm', label: 'Millimetres' },
            { value: 'in', label: 'Inches' },
          ]}
        />
        {shown ? (
          <>
            <div className="grid gap-3 sm:grid-cols-3">
              {columnLabels.map(([column, label]) => (
                <SelectField
                  key={column}
                  label={label}
                  value={shown.columns[column] ?? ''}
                  onChange={(event) =>
                    void look({ columns: { ...columns, [column]: event.target.value || undefined } })
                  }
                  options={[
                    { value: '', label: column === 'diameter' ? 'Not in the file' : 'Choose a column' },
                    ...shown.headings.map((heading) => ({ value: heading, label: heading })),
                  ]}
                />
              ))}
            </div>
            <ShownRows shown={shown} />
          </>
        ) : null}
        <DialogFoot
          label="Take it over"
          busyLabel="Taking over …"
          isBusy={isBusy}
          isDisabled={!isWhole}
          failure={failure}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}

function ShownRows({ shown }: { shown: ImportMeasurementsResponse }) {
  const { unit, measuringToleranceMm } = useShop()
  const said = (mm: number) => formatLength(mm, unit)
  return (
    <>
      {shown.rejected.length > 0 ? (
        <Notice kind="collision" isAnnounced>
          <p className="font-semibold">Nothing is taken over while a line can’t be:</p>
          <ul>
            {shown.rejected.slice(0, 50).map(({ line, column, message }) => (
              <li key={`${line} ${column} ${message}`}>
                Line {line}
                {column ? `, ${column}` : ''}: {message}
              </li>
            ))}
          </ul>
        </Notice>
      ) : null}
      {shown.rows.length === 0 ? null : (
        <table className="w-full text-left">
          <thead>
            <tr className="border-ink text-ink-soft border-b text-sm">
              <th scope="col" className="py-1 font-normal">
                Assembly
              </th>
              <th scope="col" className="py-1 text-right font-normal">
                Gauge length
              </th>
              <th scope="col" className="py-1 text-right font-normal">
                To calculated
              </th>
            </tr>
          </thead>
          <tbody>
            {shown.rows.map((row) => {
              const off = difference(row.gaugeLengthMm, row.expectedGaugeLengthMm, measuringToleranceMm, unit)
              return (
                <tr key={row.line} className="border-hairline border-b">
                  <th scope="row" className="py-1 text-left">
                    {row.number}
                  </th>
                  <td className="py-1 text-right">{said(row.gaugeLengthMm)}</td>
                  <td className={`py-1 text-right ${off.isOver ? 'text-collision font-semibold' : ''}`}>
                    {off.text}
                    {off.isOver ? ' over' : ''}
                  </td>
                </tr>
              )
            })}
          </tbody>
        </table>
      )}
    </>
  )
}
