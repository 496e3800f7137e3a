import type { Feature, ReachRequest, ReachSettings } from '../reach/types'
import type { AssemblyTools, KeptCheck, OffsetName } from './types'

/**
 * Gauge line to tip of an assembly at a stick-out: holder's A, extension's E and the stick-out.
 *
 * Units      Millimetres.
 * Source     reach.md, section 1: A + E + S.
 *
 * @example
 * assemblyGaugeLengthMm({ holder: { gaugeLengthMm: 100 }, extension: null }, 39.5) // => 139.5
 */
export function assemblyGaugeLengthMm(
  tools: {
    holder: Pick<AssemblyTools['holder'], 'gaugeLengthMm'>
    extension: { projectionMm: number } | null
  },
  stickOutMm: number,
): number {
  return tools.holder.gaugeLengthMm + (tools.extension?.projectionMm ?? 0) + stickOutMm
}

/**
 * The stick-out an assembly really has, from the gauge length measured on it.
 *
 * Units      Millimetres.
 * Result     Not above 0 where the length is that of holder and extension alone, or less: nothing would stand out.
 *
 * @example
 * measuredStickOutMm({ holder: { gaugeLengthMm: 100 }, extension: { projectionMm: 80 } }, 219) // => 39
 */
export function measuredStickOutMm(
  tools: Parameters<typeof assemblyGaugeLengthMm>[0],
  gaugeLengthMm: number,
): number {
  return gaugeLengthMm - assemblyGaugeLengthMm(tools, 0)
}

/**
 * The reach request a kept check stands for, with these sizes.
 *
 * Assumes the spindle's width is not known, the cautious reading, whatever machine the assembly stands in.
 *
 * Shapes     A stick-out of null asks for the one that is required; clearances of null are the shop's own.
 * Units      Millimetres.
 */
export function reachRequestOf(
  tools: AssemblyTools,
  check: { feature: Feature; clearances: KeptCheck['clearances'] },
  stickOutMm: number | null,
  settings: ReachSettings,
): ReachRequest {
  const { cutter, holder, collet, extension } = tools
  return {
    ...{ cutter, holder, collet, extension },
    feature: check.feature,
    bore: (extension ?? holder).bore,
    stickOutMm,
    clearances: {
      shankMm: check.clearances?.shankMm ?? settings.shankClearanceMm,
      holderMm: check.clearances?.holderMm ?? settings.holderClearanceMm,
    },
    settings,
  }
}

/**
 * What a control holds of an assembly: its length, its diameter and the radius of its corner.
 *
 * Units      Millimetres; a ball's corner radius is half its diameter, a square end's 0.
 */
export function offsetsOf(tools: AssemblyTools, stickOutMm: number): Record<OffsetName, number> {
  const { cutter } = tools
  return {
    gaugeLength: assemblyGaugeLengthMm(tools, stickOutMm),
    diameter: cutter.cuttingDiameterMm,
    cornerRadius: cutter.cornerRadiusMm ?? (cutter.form === 'ball' ? cutter.cuttingDiameterMm / 2 : 0),
  }
}

/**
 * Whether a measured figure differs from the calculated one by more than the shop allows.
 *
 * Units      Millimetres.
 * Tolerance  1e-9 mm beyond the allowed difference is still within it.
 *
 * @example
 * isOverTolerance(139.55, 139.5, 0.05) // => false
 * isOverTolerance(139.56, 139.5, 0.05) // => true
 */
export function isOverTolerance(measuredMm: number, calculatedMm: number, toleranceMm: number): boolean {
  return Math.abs(measuredMm - calculatedMm) > toleranceMm + 1e-9
}
