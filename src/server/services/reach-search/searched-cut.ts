import type { CuttingSettings } from '@/core/cutting/cut-answer'
import { findWorkMaterial, type WorkMaterial } from '@/core/cutting/work-materials'
import type { Substrate } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { type CutAssembly, type CutEstimate, cutEstimate } from '@/lib/cut-estimate'
import { assumptionSentences, driveSentence } from '@/lib/cut-sentences'
import { sentenceLength } from '@/lib/reach-sentences'
import type { SearchCut } from '@/schemas/cut-estimate'
import { db } from '../../db/connection'
import { listStartingSpeeds } from '../../db/stores/starting-speed-store'
import type { MachineLimits } from './machine-limits'

/** The cut every assembly of a search is asked for, with what the shop's table says of its material. */
export interface SearchedCut extends Omit<SearchCut, 'materialNumber'> {
  material: WorkMaterial
  /** The slow end of the shop's starting speeds for this group, by what the cutter is made of. */
  shopSpeeds: ReadonlyMap<Substrate, number>
}

/** Null where no cut was asked for. */
export async function searchedCut(cut: SearchCut | null | undefined): Promise<SearchedCut | null> {
  const material = cut ? findWorkMaterial(cut.materialNumber) : null
  if (!cut || !material) return null
  const shopSpeeds = new Map<Substrate, number>()
  for (const { isoGroup, substrate, lowMPerMin } of await listStartingSpeeds(db())) {
    if (isoGroup !== material.isoGroup) continue
    shopSpeeds.set(substrate, Math.min(lowMPerMin, shopSpeeds.get(substrate) ?? lowMPerMin))
  }
  return { ...cut, material, shopSpeeds }
}

/**
 * What the cut asks of one assembly. Without a speed of its own it starts at the slow end of the shop's, which are for
 * milling: a drill is not estimated by them.
 */
export function estimatedCut(
  assembly: CutAssembly,
  { shopSpeeds, ...cut }: SearchedCut,
  { spindle }: Pick<MachineLimits, 'spindle'>,
  settings: CuttingSettings,
): CutEstimate {
  const { form, substrate } = assembly.cutter
  const isDrill = form === 'drill'
  const cuttingSpeedMPerMin =
    cut.cuttingSpeedMPerMin ?? (isDrill ? undefined : shopSpeeds.get(substrate ?? 'carbide'))
  if (cuttingSpeedMPerMin === undefined)
    return {
      answer: null,
      sentence: isDrill
        ? 'The shop’s starting speeds are for milling: give the drill’s cutting speed.'
        : 'The shop has no starting speed for such a tool in this group of materials: give a cutting speed.',
    }
  return cutEstimate(
    assembly,
    {
      material: cut.material,
      feedMm: cut.feedMm,
      depthOfCutMm: cut.depthOfCutMm ?? null,
      stepoverMm: cut.stepoverMm ?? null,
      cuttingSpeedMPerMin,
      fluteCount: null,
      spindle,
    },
    settings,
  )
}

/** What of an estimated cut a person has to be told before anything is fetched for it. */
export function cutCautions(
  { cutter }: Pick<CutAssembly, 'cutter'>,
  { answer }: CutEstimate,
  { depthOfCutMm }: Pick<SearchCut, 'depthOfCutMm'>,
  unit: LengthUnit,
): string[] {
  if (answer === null) return []
  const drive = answer.drive?.drives === false ? driveSentence(answer) : null
  const { lengthOfCutMm } = cutter
  const isDeeperThanItCuts =
    answer.kind === 'milling' && depthOfCutMm != null && lengthOfCutMm != null && depthOfCutMm > lengthOfCutMm
  return [
    ...(drive === null ? [] : [`Estimated: ${drive}`]),
    ...(isDeeperThanItCuts
      ? [`It cuts on ${sentenceLength(lengthOfCutMm, unit)} of its length: less than the depth of cut asked.`]
      : []),
    ...answer.assumptions
      .filter((code) => code === 'speed-below-spindle' || code === 'speed-off-curve')
      .map((code) => assumptionSentences[code]),
  ]
}
