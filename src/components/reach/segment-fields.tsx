'use client'

import { Plus, X } from 'lucide-react'
import type { HolderSegmentPart } from '@/core/tooling'
import { formatLength } from '@/lib/format-length'
import { Button } from '../ui/button'
import { LengthField } from '../ui/length-field'
import { SelectField } from '../ui/select-field'
import { newRowKey, type SegmentDraft } from './reach-draft'
import type { InputsProps } from './reach-inputs'
import { fieldText } from './read-field'

export interface SegmentFieldsProps extends InputsProps {
  owner: 'holder' | 'extension'
  /** null: the catalogue's. */
  segments: readonly SegmentDraft[] | null
}

const partOptions = [
  { value: 'nut', label: 'Nut' },
  { value: 'holder', label: 'Body' },
]

const blank: SegmentDraft = { key: 0, part: 'holder', length: '', nose: '', spindle: '' }

/** The outline from the nose face up: the catalogue's as it is, or one typed segment by segment. */
export function SegmentFields(props: SegmentFieldsProps) {
  const { owner, segments, rows, reading, errors, onChange } = props
  const row = rows[owner]
  const replace = (next: readonly SegmentDraft[] | null) =>
    onChange({ type: 'segments', owner, segments: next })
  if (segments === null && row) {
    const copy = row.segments.map((segment, key) => ({
      key,
      part: 'part' in segment ? segment.part : ('holder' as const),
      length: fieldText('length', segment.lengthMm, reading),
      nose: fieldText('length', segment.noseDiameterMm, reading),
      spindle: fieldText('length', segment.spindleDiameterMm, reading),
    }))
    return <CatalogueSegments {...props} onCopy={() => replace(copy)} />
  }
  const typed = segments ?? [{ ...blank, part: owner === 'holder' ? 'nut' : 'holder' }]
  const change = (index: number, part: Partial<SegmentDraft>) =>
    replace(typed.map((segment, at) => (at === index ? { ...segment, ...part } : segment)))
  return (
    <fieldset className="col-span-full flex flex-col gap-2">
      <legend className="text-[0.9375rem] font-semibold">Outline, from the nose face up</legend>
      {typed.map((segment, index) => (
        <div key={segment.key} className="border-hairline grid grid-cols-[1fr_auto] gap-2 border-l-2 pl-2">
          <div className="grid grid-cols-2 gap-2">
            {owner === 'holder' ? (
              <SelectField
                label="Part"
                options={partOptions}
                value={segment.part}
                onChange={(event) => change(index, { part: event.target.value as HolderSegmentPart })}
              />
            ) : null}
            <SegmentLength
              {...props}
              index={index}
              name="lengthMm"
              label="Length"
              value={segment.length}
              onTextChange={(length) => change(index, { length })}
            />
            <SegmentLength
              {...props}
              index={index}
              name="noseDiameterMm"
              label="Ø at the nose"
              value={segment.nose}
              onTextChange={(nose) => change(index, { nose })}
            />
            <SegmentLength
              {...props}
              index={index}
              name="spindleDiameterMm"
              label="Ø at the spindle"
              value={segment.spindle}
              onTextChange={(spindle) => change(index, { spindle })}
            />
          </div>
          <button
            type="button"
            className="hover:bg-accent-wash grid size-9 place-items-center rounded-[3px] pointer-coarse:size-11"
            aria-label={`Remove segment ${index + 1} of the ${owner}`}
            onClick={() => replace(typed.length === 1 ? null : typed.filter((_, at) => at !== index))}
          >
            <X aria-hidden="true" className="size-4.5" />
          </button>
        </div>
      ))}
      {errors[`${owner}.segments`] ? (
        <p className="text-collision text-sm font-semibold">{errors[`${owner}.segments`]}</p>
      ) : null}
      <div className="flex flex-wrap gap-2">
        <Button
          variant="quiet"
          size="compact"
          onClick={() => replace([...typed, { ...blank, key: newRowKey(typed) }])}
        >
          <Plus aria-hidden="true" className="size-4.5" />
          Add a segment
        </Button>
        {row ? (
          <Button variant="quiet" size="compact" onClick={() => replace(null)}>
            Back to the catalogue’s outline
          </Button>
        ) : null}
      </div>
    </fieldset>
  )
}

function SegmentLength(
  props: SegmentFieldsProps & {
    index: number
    name: string
    label: string
    value: string
    onTextChange: (text: string) => void
  },
) {
  const { owner, index, name, label, value, onTextChange, reading, errors } = props
  return (
    <LengthField
      {...reading}
      label={label}
      value={value}
      error={errors[`${owner}.segments.${index}.${name}`] ?? null}
      onTextChange={onTextChange}
    />
  )
}

function CatalogueSegments({ owner, rows, reading, onCopy }: SegmentFieldsProps & { onCopy: () => void }) {
  const said = (mm: number) => formatLength(mm, reading.unit, { withUnit: false })
  const segments = rows[owner]?.segments ?? []
  return (
    <div className="col-span-full flex flex-col items-start gap-1">
      <p className="text-[0.9375rem] font-semibold">Outline, from the nose face up</p>
      <ol className="text-sm">
        {withHeights(segments).map(([segment, fromMm]) => (
          <li key={fromMm}>
            {'part' in segment && segment.part === 'nut' ? 'Nut' : 'Body'} {said(segment.lengthMm)} long, Ø
            {said(segment.noseDiameterMm)}
            {segment.spindleDiameterMm === segment.noseDiameterMm
              ? ''
              : ` to ${said(segment.spindleDiameterMm)}`}
          </li>
        ))}
      </ol>
      <Button variant="quiet" size="compact" onClick={onCopy}>
        Change the outline
      </Button>
    </div>
  )
}

/** Each segment with the height it begins at. */
function withHeights<Segment extends { lengthMm: number }>(
  segments: readonly Segment[],
): [Segment, number][] {
  let fromMm = 0
  return segments.map((segment) => {
    const entry: [Segment, number] = [segment, fromMm]
    fromMm += segment.lengthMm
    return entry
  })
}
