import { CoreInputError } from '@/core/core-input-error'
import { gaugeLengthFit, type MachineWindow } from '@/core/machine/machine-window'
import { assemblyOutline } from '@/core/outline/assembly-outline'
import type { CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'
import type { DaylightTool } from './daylight-layout'

export interface TriedParts {
  cutter: CutterGeometry | null
  holder: HolderGeometry | null
  extension: ExtensionGeometry | null
  stickOutMm: number | null
}

/** A cutter that was not picked is drawn as a pin of this diameter, in mm. */
const pinMm = 6

/**
 * What hangs from the spindle, to be drawn, with whether it fits; null until a holder and a stick-out are there, a
 * sentence where they cannot be.
 */
export function triedTool(parts: TriedParts, window: MachineWindow): DaylightTool | string | null {
  const { cutter, holder, extension, stickOutMm } = parts
  if (!holder || stickOutMm === null) return null
  if (cutter && stickOutMm > cutter.overallLengthMm) return 'The stick-out is longer than the cutter itself.'
  try {
    const gaugeLengthMm = holder.gaugeLengthMm + (extension?.projectionMm ?? 0) + stickOutMm
    const outline = assemblyOutline(cutter ?? pin(stickOutMm), holder, extension, stickOutMm)
    return {
      parts: outline.filter(({ part }) => part !== 'spindle'),
      gaugeLengthMm,
      fit: gaugeLengthFit(window.gaugeLengthMm, gaugeLengthMm),
    }
  } catch (error) {
    if (error instanceof CoreInputError) return error.message
    throw error
  }
}

function pin(lengthMm: number): CutterGeometry {
  return {
    form: 'square',
    cuttingDiameterMm: pinMm,
    lengthOfCutMm: lengthMm,
    fluteLengthMm: lengthMm,
    shankDiameterMm: pinMm,
    overallLengthMm: lengthMm * 2,
  }
}
