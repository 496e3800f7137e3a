'use client'

import { parseCount } from '@/core/units/parse-count'
import { useMachines } from '@/hooks/use-machines'
import { formatLength } from '@/lib/format-length'
import { useShop } from '../layout/shop-context'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'

export interface MachineSpotText {
  machineId: string
  pocket: string
}

export interface MachineFieldsProps {
  spot: MachineSpotText
  gaugeLengthMm: number
  errors: Readonly<Record<string, string>>
  onChange: (spot: MachineSpotText) => void
}

/** Where it goes: into one's hands, or to a machine and a pocket of it. */
export function MachineFields({ spot, gaugeLengthMm, errors, onChange }: MachineFieldsProps) {
  const { unit } = useShop()
  const { rows: machines } = useMachines()
  const chosen = machines.find(({ id }) => id === spot.machineId)
  const longestMm = chosen?.longestToolMm ?? null
  return (
    <>
      <SelectField
        label="Where it goes"
        value={spot.machineId}
        onChange={(event) => onChange({ machineId: event.target.value, pocket: '' })}
        options={[
          { value: '', label: 'My hands' },
          ...machines.map(({ id, code, name }) => ({ value: id, label: `${code} · ${name}` })),
        ]}
        error={errors.machineId}
      />
      {chosen ? (
        <TextField
          label="Pocket"
          inputMode="numeric"
          autoComplete="off"
          value={spot.pocket}
          onChange={(event) => onChange({ ...spot, pocket: event.target.value })}
          hint={
            chosen.pocketCount === null
              ? 'Blank: in the spindle'
              : `1 to ${chosen.pocketCount}; blank: in the spindle`
          }
          error={errors.pocket}
        />
      ) : null}
      {chosen && longestMm !== null && gaugeLengthMm > longestMm ? (
        <Notice kind="caution">
          Its gauge length of {formatLength(gaugeLengthMm, unit)} is more than the{' '}
          {formatLength(longestMm, unit)} the changer of {chosen.code} takes.
        </Notice>
      ) : null}
    </>
  )
}

/** The spot as a request has it, or what is wrong with what was typed. */
export function readSpot(
  spot: MachineSpotText,
): { ok: true; value: { machineId: string | null; pocket: number | null } } | { ok: false; pocket: string } {
  const machineId = spot.machineId === '' ? null : spot.machineId
  if (machineId === null || spot.pocket.trim() === '') return { ok: true, value: { machineId, pocket: null } }
  const count = parseCount(spot.pocket)
  return count.ok
    ? { ok: true, value: { machineId, pocket: count.count } }
    : { ok: false, pocket: count.message }
}
