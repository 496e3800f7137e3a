import type { Feature } from '@/core/reach/types'
import { KeepAssemblyButton, type KeptOption } from '../assemblies/keep-assembly-button'
import type { CompiledCheck } from './compile-check'
import type { ReachDraft } from './reach-draft'
import { toolSlots } from './reach-fields'

export interface KeepCheckProps {
  draft: ReachDraft
  compiled: CompiledCheck
  stickOutMm: number
}

/** A check that reaches, kept as an assembly: only of what lies in the crib as the catalogue has it. */
export function KeepCheck({ draft, compiled, stickOutMm }: KeepCheckProps) {
  const option = compiled.feature ? keptOption(draft, compiled, compiled.feature, stickOutMm) : null
  return (
    <div className="border-hairline flex flex-wrap items-center gap-x-3 border-b px-3 py-1.5 print:hidden">
      {option ? (
        <KeepAssemblyButton option={option} />
      ) : (
        <p className="text-ink-soft text-[0.9375rem]">
          To keep this as an assembly, pick cutter and holder from the crib as they are there.
        </p>
      )}
    </div>
  )
}

function keptOption(
  draft: ReachDraft,
  { clearances }: CompiledCheck,
  feature: Feature,
  stickOutMm: number,
): KeptOption | null {
  const { cutter, holder, collet, extension } = draft.picks
  if (cutter === null || holder === null || isTypedOver(draft)) return null
  const { shankMm, holderMm } = clearances
  return {
    feature,
    cutter: { id: cutter },
    holder: { id: holder },
    collet: collet === null ? null : { id: collet },
    extension: extension === null ? null : { id: extension },
    stickOutMm,
    clearances:
      shankMm === null && holderMm === null
        ? null
        : { ...(shankMm === null ? {} : { shankMm }), ...(holderMm === null ? {} : { holderMm }) },
  }
}

/** A figure typed over the catalogue's is of a tool that nobody could fetch. */
function isTypedOver({ texts, segments }: ReachDraft): boolean {
  const isTyped = toolSlots.some((slot) => Object.values(texts[slot]).some((text) => text.trim() !== ''))
  return isTyped || segments.holder !== null || segments.extension !== null
}
