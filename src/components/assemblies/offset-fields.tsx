'use client'

import { parseCount } from '@/core/units/parse-count'
import type { AssemblyRow } from '@/schemas/assembly'
import { TextField } from '../ui/text-field'

const fields = [
  ['toolNumber', 'Tool number'],
  ['lengthOffsetNumber', 'Length offset'],
  ['diameterOffsetNumber', 'Diameter offset'],
] as const
export type OffsetTexts = Record<(typeof fields)[number][0], string>
export const noOffsetTexts: OffsetTexts = {
  toolNumber: '',
  lengthOffsetNumber: '',
  diameterOffsetNumber: '',
}

export function offsetTexts(assembly: Pick<AssemblyRow, keyof OffsetTexts>): OffsetTexts {
  return {
    toolNumber: assembly.toolNumber?.toString() ?? '',
    lengthOffsetNumber: assembly.lengthOffsetNumber?.toString() ?? '',
    diameterOffsetNumber: assembly.diameterOffsetNumber?.toString() ?? '',
  }
}

/** The numbers a control knows the assembly by; blank where it knows none. */
export function OffsetFields({
  texts,
  errors,
  onChange,
}: {
  texts: OffsetTexts
  errors: Readonly<Record<string, string>>
  onChange: (texts: OffsetTexts) => void
}) {
  return (
    <div className="grid grid-cols-3 items-end gap-3 max-sm:grid-cols-2">
      {fields.map(([name, label]) => (
        <TextField
          key={name}
          label={label}
          inputMode="numeric"
          autoComplete="off"
          value={texts[name]}
          onChange={(event) => onChange({ ...texts, [name]: event.target.value })}
          error={errors[name]}
        />
      ))}
    </div>
  )
}

export function readOffsets(
  texts: OffsetTexts,
):
  | { ok: true; value: Record<keyof OffsetTexts, number | null> }
  | { ok: false; errors: Record<string, string> } {
  const value = { toolNumber: null, lengthOffsetNumber: null, diameterOffsetNumber: null } as Record<
    keyof OffsetTexts,
    number | null
  >
  const errors: Record<string, string> = {}
  for (const [name] of fields) {
    if (texts[name].trim() === '') continue
    const read = parseCount(texts[name])
    if (read.ok) value[name] = read.count
    else errors[name] = read.message
  }
  return Object.keys(errors).length > 0 ? { ok: false, errors } : { ok: true, value }
}
