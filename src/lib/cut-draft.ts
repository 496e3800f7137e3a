import type { SpindleOfMachine } from '@/core/cutting/cut-answer'
import { findWorkMaterial } from '@/core/cutting/work-materials'
import type { LengthUnit } from '@/core/units/length-unit'
import { parseCount } from '@/core/units/parse-count'
import { parseLength } from '@/core/units/parse-length'
import { parseSpeed } from '@/core/units/parse-speed'
import type { MachineResponse } from '@/schemas/machine'
import type { CutInput } from './cut-estimate'

/** A cut as it is typed; blank where nothing was. */
export interface CutDraft {
  materialNumber: string
  speed: string
  feed: string
  depthOfCut: string
  stepover: string
  flutes: string
  machineId: string
}

export const blankCut: CutDraft = {
  materialNumber: '',
  speed: '',
  feed: '',
  depthOfCut: '',
  stepover: '',
  flutes: '',
  machineId: '',
}

export interface CutReading {
  /** Null until material, speed and feed are there and all that was typed could be read. */
  input: CutInput | null
  faults: Partial<Record<keyof CutDraft, string>>
}

/** Reads a cut once, at the edge; depth and stepover may be blank, as a drill has neither. */
export function readCutDraft(
  draft: CutDraft,
  manner: { unit: LengthUnit; decimalComma: boolean },
  machines: readonly MachineResponse[],
): CutReading {
  const faults: CutReading['faults'] = {}
  const length = (name: 'feed' | 'depthOfCut' | 'stepover'): number | null => {
    if (draft[name].trim() === '') return null
    const read = parseLength(draft[name], { ...manner, drillSizes: false })
    if (read.ok) return read.mm
    faults[name] = read.message
    return null
  }
  const speed = draft.speed.trim() === '' ? null : parseSpeed(draft.speed, manner)
  if (speed && !speed.ok) faults.speed = speed.message
  const flutes = draft.flutes.trim() === '' ? null : parseCount(draft.flutes)
  if (flutes && !flutes.ok) faults.flutes = flutes.message
  const [feedMm, depthOfCutMm, stepoverMm] = [length('feed'), length('depthOfCut'), length('stepover')]
  const material = findWorkMaterial(Number(draft.materialNumber))
  const isReady = material && speed?.ok && feedMm !== null && Object.keys(faults).length === 0
  return {
    input: isReady
      ? {
          material,
          cuttingSpeedMPerMin: speed.mPerMin,
          feedMm,
          depthOfCutMm,
          stepoverMm,
          fluteCount: flutes?.ok ? flutes.count : null,
          spindle: spindleOf(machines.find(({ id }) => id === draft.machineId)),
        }
      : null,
    faults,
  }
}

/** A machine's spindle as a cut asks it. */
export function spindleOf(machine: MachineResponse | undefined): SpindleOfMachine | null {
  if (!machine) return null
  return {
    points: machine.spindlePoints,
    minimumRpm: machine.minimumRpm,
    maximumRpm: machine.maximumRpm,
    efficiency: machine.efficiency,
  }
}
