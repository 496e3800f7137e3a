import { holderCheckParts } from '@/core/reach/check-parts'
import { placementOf } from '@/core/reach/placement'
import { clearanceLowerBounds } from '@/core/reach/stick-out-bounds'
import type { ReachRequest } from '@/core/reach/types'

/**
 * The closed form's stick-out for the feature's depth, for comparison with solids that can't go through the floor.
 */
export function clearStickOutMm(request: ReachRequest): number {
  const at = placementOf(request.feature, request.cutter)
  const { clearances, settings } = request
  const bounds = clearanceLowerBounds(at, holderCheckParts(request.holder, request.extension), {
    shankMm: clearances?.shankMm ?? settings.shankClearanceMm,
    holderMm: clearances?.holderMm ?? settings.holderClearanceMm,
  })
  // Solids stand on the floor at the latest.
  const standingMm = clearances?.holderMm ?? settings.holderClearanceMm
  return Math.max(standingMm, ...bounds.map(({ mm }) => mm))
}
