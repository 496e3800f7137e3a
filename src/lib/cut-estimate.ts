import { CoreInputError } from '@/core/core-input-error'
import {
  type CutAnswer,
  type CuttingSettings,
  cutAnswer,
  type SpindleOfMachine,
} from '@/core/cutting/cut-answer'
import type { WorkMaterial } from '@/core/cutting/work-materials'
import type { CutterGeometry } from '@/core/tooling'

/** What a cut is asked of: a cutter mounted in something, with the stiffness that was worked out for it. */
export interface CutAssembly {
  cutter: CutterGeometry & { maximumRpm?: number | null }
  holderMaximumRpm?: number | null
  complianceUmPerN: number
  stickOutToDiameter: number
}

/** A cut as it was typed, read. */
export interface CutInput {
  material: WorkMaterial
  cuttingSpeedMPerMin: number
  /** A feed a tooth, of a drill a revolution. */
  feedMm: number
  depthOfCutMm: number | null
  stepoverMm: number | null
  /** Stands in where the cutter's own is not entered. */
  fluteCount: number | null
  spindle: SpindleOfMachine | null
}

export type CutEstimate = { answer: CutAnswer; sentence: null } | { answer: null; sentence: string }

/** What the cut asks of one assembly, or the sentence of what keeps it from being estimated. */
export function cutEstimate(assembly: CutAssembly, input: CutInput, settings: CuttingSettings): CutEstimate {
  try {
    const { spindle, fluteCount, ...cut } = input
    const answer = cutAnswer({
      ...cut,
      spindle,
      cutter: { ...assembly.cutter, fluteCount: assembly.cutter.fluteCount ?? fluteCount },
      limitsRpm: [assembly.cutter.maximumRpm, assembly.holderMaximumRpm],
      complianceUmPerN: assembly.complianceUmPerN,
      stickOutToDiameter: assembly.stickOutToDiameter,
      settings,
    })
    return { answer, sentence: null }
  } catch (error) {
    if (error instanceof CoreInputError) return { answer: null, sentence: error.message }
    throw error
  }
}
