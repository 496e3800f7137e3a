'use client'

import { memo } from 'react'
import { formatLength } from '@/lib/format-length'
import { catalogueValue } from './catalogue-values'
import type { CompiledCheck } from './compile-check'
import { FeatureSection } from './feature-section'
import { FieldsFold } from './fields-fold'
import { isSlotUsed, type ReachDraft, type ToolDraft } from './reach-draft'
import { ReachFieldInput } from './reach-field-input'
import { hasFaultIn, type InputsProps } from './reach-inputs'
import { ColletSection, CutterSection, ExtensionSection, HolderSection } from './tool-sections'
import type { ReachCheck } from './use-reach-check'
import { useToolDraft } from './use-reach-check'

export interface ReachInputsColumnProps extends InputsProps {
  draft: ReachDraft
  loadErrors: ReachCheck['loadErrors']
  compiled: CompiledCheck
  settings: { shankClearanceMm: number; holderClearanceMm: number }
}

/** Everything that can be typed or picked, in the order of the set-up: what is cut, with what, held by what. */
export function ReachInputsColumn(props: ReachInputsColumnProps) {
  const { draft, loadErrors, compiled, rows, reading, errors, onChange } = props
  const tools = useToolDraft(draft)
  const common = { rows, reading, errors, onChange }
  return (
    <>
      <FeatureSection
        {...common}
        kind={draft.featureKind}
        texts={draft.texts.feature}
        obstacles={draft.obstacles}
      />
      <CutterSection {...common} draft={tools} loadError={loadErrors.cutter} />
      <HolderSection {...common} draft={tools} loadError={loadErrors.holder} />
      <ColletSection
        {...common}
        draft={tools}
        loadError={loadErrors.collet}
        shankMm={compiled.cutter?.shankDiameterMm ?? null}
        series={chuckSeries(tools, rows)}
      />
      <ExtensionSection {...common} draft={tools} loadError={loadErrors.extension} />
      <CheckFields {...common} texts={draft.texts.check} settings={props.settings} />
    </>
  )
}

/** The series the chuck takes: the extension's where there is one. */
function chuckSeries(tools: ToolDraft, rows: InputsProps['rows']): string | null {
  const owner = isSlotUsed(tools, 'extension') ? 'extension' : 'holder'
  const typed = tools.texts[owner].boreSeries
  const series = typed ?? catalogueValue(rows, owner, 'boreSeries')
  return typeof series === 'string' && series.trim() !== '' ? series.trim() : null
}

interface CheckFieldsProps extends InputsProps {
  texts: ReachDraft['texts']['check']
  settings: ReachInputsColumnProps['settings']
}

const CheckFields = memo(function CheckFields({ texts, settings, errors, ...rest }: CheckFieldsProps) {
  const { reading } = rest
  const fields = { ...rest, errors, texts, group: 'check' as const }
  return (
    <section aria-labelledby="reach-check" className="border-hairline border-t px-4 py-3">
      <h2 id="reach-check" className="text-lg">
        Given besides
      </h2>
      <FieldsFold
        summary="Clearances and side load"
        isOpenAtFirst={Object.keys(texts).some((name) => name !== 'stickOutMm')}
        hasFault={hasFaultIn(errors, 'clearances') || hasFaultIn(errors, 'sideLoadN')}
        className="grid grid-cols-2 gap-3"
      >
        <ReachFieldInput
          {...fields}
          name="clearanceShankMm"
          hint={`Blank: ${formatLength(settings.shankClearanceMm, reading.unit)}, the shop’s`}
        />
        <ReachFieldInput
          {...fields}
          name="clearanceHolderMm"
          hint={`Blank: ${formatLength(settings.holderClearanceMm, reading.unit)}, the shop’s`}
        />
        <ReachFieldInput {...fields} name="sideLoadN" />
      </FieldsFold>
    </section>
  )
})
