'use client'

import { workMaterials } from '@/core/cutting/work-materials'
import { isoGroupNames, isoGroups } from '@/core/speeds/iso-groups'
import { controlClass, Field } from '../ui/field'

export interface WorkMaterialFieldProps {
  /** Its number in the table, as text; blank where none is chosen. */
  value: string
  error?: string | null
  className?: string
  onChoose: (number: string) => void
}

/** What is cut, by the table of specific cutting forces, in its groups. */
export function WorkMaterialField({ value, error = null, className = '', onChoose }: WorkMaterialFieldProps) {
  return (
    <Field label="Material cut" error={error} className={className}>
      {(wiring) => (
        <select
          {...wiring}
          className={controlClass}
          value={value}
          onChange={(event) => onChoose(event.target.value)}
        >
          <option value="">None chosen</option>
          {isoGroups.map((group) => (
            <optgroup key={group} label={`${group} · ${isoGroupNames[group]}`}>
              {workMaterials
                .filter(({ isoGroup }) => isoGroup === group)
                .map(({ number, name }) => (
                  <option key={number} value={number}>
                    {name}
                  </option>
                ))}
            </optgroup>
          ))}
        </select>
      )}
    </Field>
  )
}
