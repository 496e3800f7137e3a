import { CoreInputError } from '@/core/core-input-error'
import { finiteOr, notNegative, positive, positiveOrNull } from '@/core/outline/checked-number'
import { overlapToleranceMm } from '@/core/outline/types'
import { type RotaryStock, sweptRadiusMm } from './rotary-stock'

/** Heights are above the table. */
export interface MachineWindowRequest {
  /** Gauge line to table with the spindle at the top of its travel. */
  gaugeLineToTableMm: number
  zTravelMm: number
  /** The highest thing a tool is carried over: part, jaws, clamps. */
  highestMm: number
  /** The lowest place a tip is driven to: the feature's floor, less point and break-through. */
  lowestTipMm: number
  /** What a retracted tip keeps from the highest thing, and what turns keeps from the table. */
  retractClearanceMm: number
  /** The longest tool the changer takes. */
  longestToolMm?: number | null
  rotaryStock?: RotaryStock | null
}

export interface GaugeLengthWindow {
  shortest: number
  longest: number
}

export interface MachineWindow {
  gaugeLengthMm: GaugeLengthWindow
  /** What sets the longest: the retract over the highest thing, or the changer. */
  longestBoundBy: 'retract' | 'changer'
  /** Null, like the table clearance, without a rotary stock. */
  sweptRadiusMm: number | null
  /** The highest thing, the swept circle among them. */
  highestMm: number
  tableClearanceMm: number | null
  /** By how much the longest falls short of the shortest; 0 where it does not. */
  shortfallMm: number
  /** By how much what turns comes nearer to the table than the clearance; 0 where it does not. */
  tableStrikeMm: number
  possible: boolean
}

/**
 * Gauge lengths a set-up on a machine can take: long enough to get down, short enough to get over what stands there.
 *
 * longest = min(Ztop − highest − retract clearance, the changer's), shortest = Ztop − travel − lowest tip. What turns
 * in a rotary axis is as high as the circle its corners sweep, not as the part that comes of it, and has to keep the
 * clearance from the table too. A window of no width is still one; nothing here says how far a tool reaches.
 *
 * Shapes     Vertical spindle over a table, or any spindle with heights measured along it.
 * Units      Millimetres.
 * Result     Lengths may be negative: a shortest below 0 asks nothing, a longest below 0 takes no tool.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`, `negative`, `lowest-above-highest` at the field.
 * Source     test/reference/machine/machine-window.md.
 * Tolerance  1e-9 mm, which also is no overlap.
 *
 * @example
 * machineWindow({ gaugeLineToTableMm: 600, zTravelMm: 450, highestMm: 220, lowestTipMm: 60, retractClearanceMm: 25 }).gaugeLengthMm // => { shortest: 90, longest: 355 }
 */
export function machineWindow(request: MachineWindowRequest): MachineWindow {
  const topMm = positive(request.gaugeLineToTableMm, 'gaugeLineToTableMm', 'The gauge line to table')
  const travelMm = positive(request.zTravelMm, 'zTravelMm', 'The Z travel')
  const lowestTipMm = notNegative(request.lowestTipMm, 'lowestTipMm', 'The lowest tip position')
  const clearanceMm = notNegative(request.retractClearanceMm, 'retractClearanceMm', 'The retract clearance')
  const changerMm = positiveOrNull(request.longestToolMm, 'longestToolMm', 'The longest tool')
  const stood = standing(request)
  if (lowestTipMm > stood.highestMm + overlapToleranceMm) {
    throw new CoreInputError(
      'lowest-above-highest',
      'lowestTipMm',
      'The lowest tip position is above the highest thing in the set-up.',
    )
  }
  const overTopMm = topMm - stood.highestMm - clearanceMm
  const longest = changerMm === null ? overTopMm : Math.min(overTopMm, changerMm)
  const shortest = topMm - travelMm - lowestTipMm
  const shortfallMm = beyond(Math.max(shortest, 0) - longest)
  const tableStrikeMm = stood.tableClearanceMm === null ? 0 : beyond(clearanceMm - stood.tableClearanceMm)
  return {
    gaugeLengthMm: { shortest, longest },
    longestBoundBy: longest < overTopMm ? 'changer' : 'retract',
    ...stood,
    shortfallMm,
    tableStrikeMm,
    possible: shortfallMm === 0 && tableStrikeMm === 0 && longest > 0,
  }
}

type Standing = Pick<MachineWindow, 'sweptRadiusMm' | 'highestMm' | 'tableClearanceMm'>

function standing({ highestMm, rotaryStock }: MachineWindowRequest): Standing {
  const namedMm = notNegative(highestMm, 'highestMm', 'The highest thing')
  if (!rotaryStock) return { sweptRadiusMm: null, highestMm: namedMm, tableClearanceMm: null }
  const axisMm = positive(rotaryStock.axisHeightMm, 'rotaryStock.axisHeightMm', 'The axis height')
  const radiusMm = sweptRadiusMm(rotaryStock)
  return {
    sweptRadiusMm: radiusMm,
    highestMm: Math.max(namedMm, axisMm + radiusMm),
    tableClearanceMm: axisMm - radiusMm,
  }
}

export type GaugeLengthVerdict = 'fits' | 'tooLong' | 'tooShort'

export interface GaugeLengthFit {
  verdict: GaugeLengthVerdict
  /** By how much it is outside the window; 0 where it fits. */
  byMm: number
}

/**
 * Whether an assembly of a gauge length works in a window, and by how much it does not.
 *
 * Where the window is crossed and both ends refuse it, too long is answered: that one strikes.
 *
 * Units      Millimetres.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`.
 * Source     machineWindow; test/reference/machine/machine-window.md, case 4.
 * Tolerance  1e-9 mm.
 *
 * @example
 * gaugeLengthFit({ shortest: 90, longest: 355 }, 80) // => { verdict: 'tooShort', byMm: 10 }
 */
export function gaugeLengthFit(window: GaugeLengthWindow, gaugeLengthMm: number): GaugeLengthFit {
  const lengthMm = positive(gaugeLengthMm, 'gaugeLengthMm', 'The gauge length')
  const longMm = beyond(lengthMm - finiteOr(window.longest, 0, 'longest', 'The longest gauge length'))
  const shortMm = beyond(finiteOr(window.shortest, 0, 'shortest', 'The shortest gauge length') - lengthMm)
  if (longMm > 0) return { verdict: 'tooLong', byMm: longMm }
  if (shortMm > 0) return { verdict: 'tooShort', byMm: shortMm }
  return { verdict: 'fits', byMm: 0 }
}

function beyond(amountMm: number): number {
  return amountMm > overlapToleranceMm ? amountMm : 0
}
