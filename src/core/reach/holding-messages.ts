import { colletFitsBore, colletHolds, fixedBoreHolds, fixedBoreToleranceMm } from '@/core/holding/holds'
import type { ReachMessage } from './message-codes'
import type { ReachRequest } from './types'

/** Whether the shank is held, as far as bore and collet are known, with what there is to say. */
export interface Holding {
  /** Why the shank can't be held; empty where it can. */
  refusals: ReachMessage[]
  notes: ReachMessage[]
}

/**
 * What bore and collet say about the shank.
 *
 * Assumes a bore that was not given takes anything.
 *
 * Units      Millimetres.
 *
 * @example
 * holdingOf(reachRequest({ bore: { kind: 'fixed', diameterMm: 3 } })).refusals[0].code // => 'bore-misses-shank'
 */
export function holdingOf({ bore, collet, cutter }: ReachRequest): Holding {
  const shankDiameterMm = cutter.shankDiameterMm
  const holding: Holding = { refusals: [], notes: [] }
  if (bore?.kind === 'fixed' && !collet && !fixedBoreHolds(bore.diameterMm, shankDiameterMm))
    holding.refusals.push({
      code: 'bore-misses-shank',
      values: { boreDiameterMm: bore.diameterMm, shankDiameterMm, toleranceMm: fixedBoreToleranceMm },
    })
  if (bore?.kind === 'collet' && !collet) holding.notes.push({ code: 'collet-not-given', values: {} })
  if (!collet) return holding
  if (bore && !colletFitsBore(bore, collet.series))
    holding.refusals.push({
      code: 'collet-of-other-series',
      values: { colletSeries: collet.series, boreSeries: bore.kind === 'collet' ? bore.series : null },
    })
  const { holds, positionRatio } = colletHolds(collet, shankDiameterMm)
  const range = { minimumMm: collet.minimumMm, maximumMm: collet.maximumMm, shankDiameterMm }
  if (holds) holding.notes.push({ code: 'collet-range-position', values: { ...range, positionRatio } })
  else holding.refusals.push({ code: 'collet-range-misses-shank', values: range })
  return holding
}
