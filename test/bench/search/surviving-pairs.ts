import { cutterDimensions } from '@/core/outline/cutter-dimensions'
import { overlapToleranceMm } from '@/core/outline/types'
import { checkPartsOfDimensions } from '@/core/reach/check-parts'
import { checkedDemand, featureFor, formRefusal } from '@/core/reach/checked-feature'
import { leastTouch } from '@/core/reach/first-touches'
import { fitMessages } from '@/core/reach/fit-messages'
import { placement, type WallPlacement } from '@/core/reach/placement'
import { fullShankBound } from '@/core/reach/stick-out-bounds'
import type { WallFeature } from '@/core/reach/types'
import type { SearchTables } from '@/core/search/search-tables'

/** A cutter the feature and its own figures do not exclude, on a wall without tilt or obstacles. */
export interface Survivor {
  standOffMm: number
  overallMm: number
  fullShankMm: number
  shankClass: number
}

/**
 * What survives the sorting-out, found by the reach check's own functions one cutter at a time.
 */
export function survivorsOf(tables: SearchTables, feature: WallFeature): Survivor[] {
  const { settings, cutters } = tables
  const demand = checkedDemand(feature)
  const clearances = { shankMm: settings.shankClearanceMm, holderMm: settings.holderClearanceMm }
  return Array.from(cutters.index).flatMap((index, row) => {
    const cutter = cutterDimensions(tables.tooling.cutters[index]!.geometry)
    if (formRefusal(demand, cutter)) return []
    const asked = featureFor(demand, cutter)
    const at = placement(asked, cutter) as WallPlacement
    if (fitMessages(asked, cutter, at, settings).length > 0) return []
    const touch = leastTouch(at, checkPartsOfDimensions(cutter), 0, clearances)
    if (touch.tipDepthMm < at.tipDepthMm - overlapToleranceMm) return []
    return [
      {
        standOffMm: at.standOffMm,
        overallMm: cutter.overallLengthMm,
        fullShankMm: fullShankBound(cutter, settings).mm,
        shankClass: cutters.shankClass[row]!,
      },
    ]
  })
}
