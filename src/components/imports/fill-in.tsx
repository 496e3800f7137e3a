'use client'

import { useState } from 'react'
import { type CutterForm, cutterForms } from '@/core/tooling'
import { useCribs } from '@/hooks/use-cribs'
import type { ImportResponse, RecheckImportRequest } from '@/schemas/import'
import { defaultableFields } from '@/schemas/import-fields'
import { Button } from '../ui/button'
import { SelectField } from '../ui/select-field'

export interface FillInProps {
  found: ImportResponse
  isBusy: boolean
  onRecheck: (change: RecheckImportRequest) => void
}

const labels = { form: 'Form', crib: 'Crib' } as const

/** What a file has no column for and every row needs: said once for all of them, and checked again. */
export function FillIn({ found, isBusy, onRecheck }: FillInProps) {
  if (found.state !== 'checked') return null
  const given = new Set(found.columns.map((column) => column.field))
  const missing = defaultableFields[found.kind].filter((field) => !given.has(field))
  return missing.map((field) => <FillInField key={field} {...{ field, found, isBusy, onRecheck }} />)
}

function FillInField({ field, found, isBusy, onRecheck }: FillInProps & { field: 'form' | 'crib' }) {
  const kept = found.defaults[field] ?? ''
  const [value, setValue] = useState(kept)
  const cribs = useCribOptions(field === 'crib')
  const options = field === 'form' ? formOptions : cribs
  const { [field]: _, ...others } = found.defaults
  return (
    <div className="border-hairline flex flex-wrap items-end gap-3 border-y py-3">
      <SelectField
        label={`${labels[field]} for all rows`}
        hint={
          field === 'form'
            ? 'No column gives it. Items that are in the catalogue already keep theirs.'
            : 'No column gives it.'
        }
        value={value}
        onChange={(event) => setValue(event.target.value)}
        options={[{ value: '', label: 'Not said' }, ...options]}
        className="w-full max-w-md"
      />
      <Button
        variant={kept === '' && value !== '' ? 'primary' : 'secondary'}
        disabled={isBusy || value === kept}
        onClick={() => onRecheck({ defaults: value === '' ? others : { ...others, [field]: value } })}
      >
        {isBusy ? 'Starting …' : 'Check again with it'}
      </Button>
    </div>
  )
}

const formOptions = cutterForms.map((form) => ({ value: form, label: formWords(form) }))

/** `cornerRadius` as it is written in a cell: `corner radius`. */
function formWords(form: CutterForm): string {
  return form.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)
}

function useCribOptions(isAsked: boolean): { value: string; label: string }[] {
  const { data } = useCribs()
  return isAsked
    ? (data?.rows ?? []).map(({ code, name }) => ({ value: code, label: `${code}, ${name}` }))
    : []
}
