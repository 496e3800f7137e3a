'use client'

import { type FormEvent, useId, useState } from 'react'
import { toast } from '@/components/ui/toast'
import { isoGroupNames, isoGroups } from '@/core/speeds/iso-groups'
import { substrates } from '@/core/tooling'
import { parseSpeed } from '@/core/units/parse-speed'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { speedInputText, speedUnitNames } from '@/lib/format-speed'
import type { StartingSpeed } from '@/schemas/starting-speed'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextAreaField, TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

export interface SpeedEditRowProps {
  /** Null adds one. */
  row: StartingSpeed | null
  onDone: () => void
  onCancel: () => void
}

/** A row of the table while it is changed; a speed left as it stood keeps its exact figure. */
export function SpeedEditRow({ row, onDone, onCancel }: SpeedEditRowProps) {
  const { unit, decimalComma } = useShop()
  const { fault, isBusy, attempt } = useAttempt()
  const [unread, setUnread] = useState<Record<string, string>>({})
  const titleId = useId()
  const faults: Record<string, string | undefined> = { ...fieldFaults(fault), ...unread }
  const first = {
    low: row ? speedInputText(row.lowMPerMin, unit, { decimalComma }) : '',
    high: row ? speedInputText(row.highMPerMin, unit, { decimalComma }) : '',
  }

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    const low = readSpeed(String(values.get('low')), first.low, row?.lowMPerMin)
    const high = readSpeed(String(values.get('high')), first.high, row?.highMPerMin)
    setUnread({
      ...(typeof low === 'number' ? {} : { lowMPerMin: low.message }),
      ...(typeof high === 'number' ? {} : { highMPerMin: high.message }),
    })
    if (typeof low !== 'number' || typeof high !== 'number') return
    const body = {
      isoGroup: values.get('isoGroup'),
      material: values.get('material'),
      substrate: values.get('substrate'),
      sourceNote: values.get('sourceNote'),
      lowMPerMin: low,
      highMPerMin: high,
    }
    void attempt(async () => {
      if (row) {
        await callApi('PUT', `/api/starting-speeds/${row.id}`, { body: { ...body, version: row.version } })
      } else {
        await callApi('POST', '/api/starting-speeds', { body })
      }
      toast.success('Saved. Every page offers it from now on.')
      onDone()
    })
  }

  function readSpeed(text: string, firstText: string, kept: number | undefined) {
    if (kept !== undefined && text === firstText) return kept
    const read = parseSpeed(text, { unit, decimalComma })
    return read.ok ? read.mPerMin : read
  }

  function handleRemove() {
    if (!row) return
    void attempt(async () => {
      await callApi('DELETE', `/api/starting-speeds/${row.id}`)
      toast.success(`${row.material} is out of the table.`)
      onDone()
    })
  }

  return (
    <tr className="border-accent bg-well border-y-2">
      <td colSpan={5} className="px-3 py-3">
        <form
          onSubmit={handleSubmit}
          noValidate
          aria-labelledby={titleId}
          className="grid items-start gap-3 sm:grid-cols-2 lg:grid-cols-4"
        >
          <p id={titleId} className="font-semibold sm:col-span-2 lg:col-span-4">
            {row ? `Change ${row.material}` : 'Add a material'}
          </p>
          {fault ? (
            <Notice kind="collision" isAnnounced className="sm:col-span-2 lg:col-span-4">
              {faultSentence(fault)}
            </Notice>
          ) : null}
          <SelectField
            label="Group"
            name="isoGroup"
            defaultValue={row?.isoGroup ?? 'P'}
            error={faults.isoGroup ?? null}
            options={isoGroups.map((group) => ({
              value: group,
              label: `${group} · ${isoGroupNames[group]}`,
            }))}
          />
          <TextField
            label="Material"
            name="material"
            defaultValue={row?.material}
            error={faults.material ?? null}
            autoComplete="off"
            autoFocus
            isRequired
            className="lg:col-span-2"
          />
          <SelectField
            label="Cutter of"
            name="substrate"
            defaultValue={row?.substrate ?? 'carbide'}
            error={faults.substrate ?? null}
            options={substrates.map((substrate) => ({
              value: substrate,
              label: substrate === 'hss' ? 'High-speed steel' : 'Carbide',
            }))}
          />
          <TextField
            label="Low end"
            symbol={speedUnitNames[unit]}
            name="low"
            defaultValue={first.low}
            error={faults.lowMPerMin ?? null}
            inputMode="decimal"
            autoComplete="off"
            isRequired
          />
          <TextField
            label="High end"
            symbol={speedUnitNames[unit]}
            name="high"
            defaultValue={first.high}
            error={faults.highMPerMin ?? null}
            inputMode="decimal"
            autoComplete="off"
            isRequired
          />
          <TextAreaField
            label="Source and doubts"
            name="sourceNote"
            defaultValue={row?.sourceNote}
            error={faults.sourceNote ?? null}
            className="sm:col-span-2"
          />
          <div className="flex flex-wrap gap-2 sm:col-span-2 lg:col-span-4">
            <Button type="submit" variant="primary" disabled={isBusy}>
              Save
            </Button>
            <Button onClick={onCancel} disabled={isBusy}>
              Leave it
            </Button>
            {row ? (
              <Button variant="danger" onClick={handleRemove} disabled={isBusy} className="ml-auto">
                Remove
              </Button>
            ) : null}
          </div>
        </form>
      </td>
    </tr>
  )
}
