'use client'

import { memo } from 'react'
import { type CutterForm, cutterForms } from '@/core/tooling'
import { formatLength } from '@/lib/format-length'
import { catalogueValue } from './catalogue-values'
import { isSlotUsed, type ToolDraft } from './reach-draft'
import { ReachFieldInput } from './reach-field-input'
import { formNames, isFieldOfForm, reachFields } from './reach-fields'
import type { InputsProps } from './reach-inputs'
import { type FieldValue, readField } from './read-field'
import { SegmentFields } from './segment-fields'
import { ToolSection } from './tool-section'

export interface SlotProps extends InputsProps {
  draft: ToolDraft
  loadError: Error | undefined
}

const formOptions = cutterForms.map((form) => ({ value: form, label: formNames[form] }))
const substrateOptions = [
  { value: '', label: 'Not said' },
  { value: 'carbide', label: 'Cemented carbide' },
  { value: 'hss', label: 'High-speed steel' },
]
const boreOptions = [
  { value: '', label: 'Not said' },
  { value: 'collet', label: 'Collets' },
  { value: 'fixed', label: 'A plain shank' },
]

/** What a field stands for now, typed or from the catalogue. */
function figureOf(props: SlotProps, group: 'cutter' | 'holder' | 'extension', name: string): FieldValue {
  const field = reachFields.find((known) => known.group === group && known.name === name)
  const text = props.draft.texts[group][name]
  if (text === undefined || !field) return catalogueValue(props.rows, group, name)
  const read = readField(field.kind, text, props.reading)
  return read.ok ? read.value : null
}

export const CutterSection = memo(function CutterSection(props: SlotProps) {
  const { draft } = props
  const form = (figureOf(props, 'cutter', 'form') ?? 'square') as CutterForm
  const names = reachFields
    .filter((field) => field.group === 'cutter' && isFieldOfForm(field.name, form))
    .map((field) => field.name)
  const options = { form: formOptions, substrate: substrateOptions }
  const required = ['cuttingDiameterMm', 'lengthOfCutMm', 'shankDiameterMm', 'overallLengthMm']
  return (
    <ToolSection
      {...props}
      slot="cutter"
      title="Cutter"
      pickedId={draft.picks.cutter}
      summary={draft.picks.cutter === null ? 'Or type its sizes' : 'Its sizes'}
      isOpen={draft.picks.cutter === null || hasTexts(draft, 'cutter')}
    >
      {names.map((name) => (
        <ReachFieldInput
          key={name}
          {...props}
          group="cutter"
          name={name}
          texts={draft.texts.cutter}
          isRequired={required.includes(name)}
          {...(name === 'form' ? { className: 'col-span-full' } : {})}
          {...(name === 'form' || name === 'substrate' ? { options: options[name] } : {})}
        />
      ))}
    </ToolSection>
  )
})

export const HolderSection = memo(function HolderSection(props: SlotProps) {
  const { draft } = props
  const holdsCutter = !isSlotUsed(draft, 'extension')
  return (
    <ToolSection
      {...props}
      slot="holder"
      title="Holder"
      pickedId={draft.picks.holder}
      summary={draft.picks.holder === null ? 'Or type its sizes' : 'Its sizes'}
      isOpen={draft.picks.holder === null || hasTexts(draft, 'holder')}
    >
      <ReachFieldInput {...props} group="holder" name="gaugeLengthMm" texts={draft.texts.holder} isRequired />
      <ReachFieldInput {...props} group="holder" name="spindleNoseDiameterMm" texts={draft.texts.holder} />
      <ClampingFields {...props} owner="holder" isHolding={holdsCutter} />
      <ReachFieldInput {...props} group="holder" name="sideLockInsertionMm" texts={draft.texts.holder} />
      <SegmentFields {...props} owner="holder" segments={draft.segments.holder} />
    </ToolSection>
  )
})

export const ExtensionSection = memo(function ExtensionSection(props: SlotProps) {
  const { draft } = props
  return (
    <ToolSection
      {...props}
      slot="extension"
      title="Extension, if any"
      pickedId={draft.picks.extension}
      summary={draft.picks.extension === null ? 'Or type its sizes' : 'Its sizes'}
      isOpen={hasTexts(draft, 'extension') || draft.segments.extension !== null}
    >
      <ReachFieldInput {...props} group="extension" name="projectionMm" texts={draft.texts.extension} />
      <ClampingFields {...props} owner="extension" isHolding />
      <SegmentFields {...props} owner="extension" segments={draft.segments.extension} />
    </ToolSection>
  )
})

export interface ColletSectionProps extends SlotProps {
  /** What the collet has to hold and fit, where it is known. */
  shankMm: number | null
  series: string | null
}

export const ColletSection = memo(function ColletSection(props: ColletSectionProps) {
  const { draft, shankMm, series, reading } = props
  const shank = shankMm === null ? null : String(shankMm)
  const filter = {
    ...(series ? { series } : {}),
    ...(shank ? { 'minimumMm.max': shank, 'maximumMm.min': shank } : {}),
  }
  const holds = shankMm === null ? null : `hold a shank of ${formatLength(shankMm, reading.unit)}`
  const fits = series ? `fit ${series}` : null
  const offered = [fits, holds].filter((part) => part !== null).join(' and ')
  const owner = isSlotUsed(draft, 'extension') ? 'extension' : 'holder'
  const takesPlainShank = figureOf(props, owner, 'boreKind') === 'fixed'
  return (
    <ToolSection
      {...props}
      slot="collet"
      title="Collet"
      pickedId={draft.picks.collet}
      filter={filter}
      filterNote={offered ? `Those that ${offered}:` : null}
      note={takesPlainShank ? `The ${owner} takes a plain shank: no collet.` : null}
      summary={draft.picks.collet === null ? 'Or type its sizes' : 'Its sizes'}
      isOpen={hasTexts(draft, 'collet')}
    >
      {reachFields
        .filter((field) => field.group === 'collet')
        .map((field) => (
          <ReachFieldInput
            key={field.name}
            {...props}
            group="collet"
            name={field.name}
            texts={draft.texts.collet}
          />
        ))}
    </ToolSection>
  )
})

function ClampingFields(props: SlotProps & { owner: 'holder' | 'extension'; isHolding: boolean }) {
  const { owner, draft, isHolding } = props
  const texts = draft.texts[owner]
  const kind = figureOf(props, owner, 'boreKind')
  return (
    <>
      <ReachFieldInput {...props} group={owner} name="boreKind" texts={texts} options={boreOptions} />
      {kind === 'collet' ? (
        <ReachFieldInput {...props} group={owner} name="boreSeries" texts={texts} />
      ) : null}
      {kind === 'fixed' ? (
        <ReachFieldInput {...props} group={owner} name="boreDiameterMm" texts={texts} />
      ) : null}
      <ReachFieldInput {...props} group={owner} name="boreDepthMm" texts={texts} isRequired={isHolding} />
      <ReachFieldInput
        {...props}
        group={owner}
        name="minimumGripMm"
        texts={texts}
        {...(kind === 'collet' ? { hint: 'The collet’s stands where this is blank' } : {})}
      />
      <ReachFieldInput {...props} group={owner} name="gripStartMm" texts={texts} />
    </>
  )
}

function hasTexts(draft: SlotProps['draft'], group: 'cutter' | 'holder' | 'collet' | 'extension'): boolean {
  return Object.keys(draft.texts[group]).length > 0
}
