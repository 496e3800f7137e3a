'use client'

import { SelectField } from '@/components/ui/select-field'

export interface SortSelectProps {
  columns: readonly { id: string; name: string; isSortable: boolean }[]
  value: string
  onChange: (sort: string) => void
}

/** Sorting where there are no headings to tap. */
export function SortSelect({ columns, value, onChange }: SortSelectProps) {
  const options = columns
    .filter((column) => column.isSortable)
    .flatMap(({ id, name }) => [
      { value: id, label: `${name}, rising` },
      { value: `-${id}`, label: `${name}, falling` },
    ])
  const isListed = value === '' || options.some((option) => option.value === value)
  return (
    <SelectField
      label="Sorted by"
      value={value}
      onChange={(event) => onChange(event.target.value)}
      options={[
        { value: '', label: 'As the shop lists it' },
        ...(isListed ? [] : [{ value, label: 'Several columns' }]),
        ...options,
      ]}
    />
  )
}
