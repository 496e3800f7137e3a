'use client'

import { speedUnitNames } from '@/lib/format-speed'
import { WorkMaterialField } from '../cutting/work-material-field'
import type { FieldErrors } from '../reach/compile-check'
import { FieldsFold } from '../reach/fields-fold'
import type { Reading } from '../reach/read-field'
import { LengthField } from '../ui/length-field'
import { TextField } from '../ui/text-field'
import {
  cutMaterialPath,
  cutTextNames,
  type SearchDraft,
  type SearchText,
  searchTexts,
} from './search-question'

export interface CutFieldsProps {
  draft: Pick<SearchDraft, 'texts' | 'cutMaterial'>
  reading: Reading
  errors: FieldErrors
  onMaterial: (number: number | null) => void
  onText: (name: SearchText, typed: string) => void
}

/** The cut every option is then estimated for; without one nothing is. */
export function CutFields({ draft, reading, errors, onMaterial, onText }: CutFieldsProps) {
  const { texts, cutMaterial } = draft
  const field = (name: SearchText) => ({
    label: searchTexts[name].label,
    value: texts[name],
    error: errors[searchTexts[name].path] ?? null,
  })
  const length = (name: SearchText) => ({
    ...reading,
    ...field(name),
    drillSizes: false,
    onTextChange: (typed: string) => onText(name, typed),
  })
  const isGiven = cutMaterial !== null || cutTextNames.some((name) => texts[name] !== '')
  return (
    <FieldsFold
      summary="Cut, to estimate load, speed and power"
      isOpenAtFirst={isGiven}
      hasFault={[cutMaterialPath, ...cutTextNames.map((name) => searchTexts[name].path)].some(
        (path) => errors[path] !== undefined,
      )}
      className="flex flex-col gap-3"
    >
      <WorkMaterialField
        value={cutMaterial === null ? '' : String(cutMaterial)}
        error={errors[cutMaterialPath] ?? null}
        onChoose={(number) => onMaterial(number === '' ? null : Number(number))}
      />
      <div className="grid grid-cols-2 items-start gap-3">
        <LengthField {...length('ap')} symbol="ap" />
        <LengthField {...length('ae')} symbol="ae" />
        <LengthField {...length('fz')} symbol="fz" hint="Of a drill, a revolution" />
        <TextField
          {...field('vc')}
          symbol={speedUnitNames[reading.unit]}
          inputMode="decimal"
          autoComplete="off"
          hint="Blank: the shop’s, its slow end"
          onChange={(event) => onText('vc', event.target.value)}
        />
      </div>
    </FieldsFold>
  )
}
