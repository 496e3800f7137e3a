import type { Bore, ColletGeometry } from '@/core/tooling'

/** A fixed bore takes a shank this much off its size: 6 mm never takes 1/4 in. */
export const fixedBoreToleranceMm = 0.03

const roundingMm = 1e-9

export interface ColletHold {
  holds: boolean
  /** Where in the collet's range the shank sits: 0 at the small end, which grips worst, 1 at the large. */
  positionRatio: number
}

/**
 * Whether a collet takes a shank, and where in its range the shank sits.
 *
 * Units      Millimetres.
 * Result     The position is 1 in a collet of a single size; outside 0 to 1 for a shank it does not hold.
 * Tolerance  1e-9 mm: a shank of exactly the least or largest size is held.
 *
 * @example
 * colletHolds({ series: 'ER20', minimumMm: 6, maximumMm: 7 }, 6.35).holds // => true
 */
export function colletHolds(collet: ColletGeometry, shankMm: number): ColletHold {
  const { minimumMm, maximumMm } = collet
  const rangeMm = maximumMm - minimumMm
  return {
    holds: shankMm >= minimumMm - roundingMm && shankMm <= maximumMm + roundingMm,
    positionRatio: rangeMm > roundingMm ? (shankMm - minimumMm) / rangeMm : 1,
  }
}

/**
 * Whether a fixed bore (shrink, hydraulic, side-lock) takes a shank.
 *
 * Units      Millimetres, diameters.
 * Tolerance  0.03 mm either way, and 1e-9 for rounding.
 *
 * @example
 * fixedBoreHolds(6, 6.35) // => false
 */
export function fixedBoreHolds(boreMm: number, shankMm: number): boolean {
  return Math.abs(shankMm - boreMm) <= fixedBoreToleranceMm + roundingMm
}

/**
 * Whether a bore takes collets of a series. Capitals, spaces and hyphens do not count.
 *
 * @example
 * colletFitsBore({ kind: 'collet', series: 'ER20' }, 'er 20') // => true
 */
export function colletFitsBore(bore: Bore, series: string): boolean {
  return bore.kind === 'collet' && plainSeries(bore.series) === plainSeries(series)
}

function plainSeries(series: string): string {
  return series.replace(/[\s-]/g, '').toUpperCase()
}
