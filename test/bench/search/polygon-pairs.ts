import polygonClipping, { type Polygon, type Ring } from 'polygon-clipping'
import type { SearchTables } from '@/core/search/search-tables'
import type { BareCrib } from './bare-loop'
import { processorSeconds } from './processor-seconds'
import type { Survivor } from './surviving-pairs'

/** A wall and a holder's outline this far out stand for those without end. */
const farMm = 2000

export interface LibraryTime {
  pairs: number
  meeting: number
  seconds: number
}

/**
 * The same question put to a general geometry library: the holder's widened outline at the longest stick-out its grip
 * leaves, cut with the wall as polygons. One cut a pair, the polygons' making left out of the time.
 */
export function libraryTime(
  tables: SearchTables,
  crib: BareCrib,
  survivors: readonly Survivor[],
  depthMm: number,
  tanDraft: number,
  pairs: number,
): LibraryTime {
  const wall: Polygon = [
    [
      [0, 0],
      [farMm, 0],
      [farMm, depthMm],
      [depthMm * tanDraft, depthMm],
    ],
  ]
  const holders: Polygon[] = []
  for (let at = 0; holders.length < pairs; at++) {
    const survivor = survivors[(at * 7919) % survivors.length]!
    const clamps = tables.inHolders[survivor.shankClass]!
    if (clamps.count === 0) continue
    const clamp = (at * 104_729) % clamps.count
    const noseMm = survivor.overallMm - clamps.leastInMm[clamp]!
    holders.push([outlineRing(crib, clamps.outline[clamp]!, noseMm, survivor.standOffMm)])
  }
  let meeting = 0
  const seconds = processorSeconds(() => {
    for (const holder of holders) if (polygonClipping.intersection(holder, wall).length > 0) meeting++
  })
  return { pairs, meeting, seconds }
}

/** The side towards the wall, closed along the axis. */
function outlineRing({ holders }: BareCrib, outline: number, noseMm: number, standOffMm: number): Ring {
  const ring: Ring = []
  const end = holders.lineStart[outline + 1]!
  for (let line = holders.lineStart[outline]!; line < end; line++)
    ring.push(
      [Math.min(holders.r0[line]!, farMm) - standOffMm, noseMm + holders.a0[line]!],
      [Math.min(holders.r1[line]!, farMm) - standOffMm, noseMm + holders.a1[line]!],
    )
  const topMm = noseMm + holders.a1[end - 1]! + 100
  const [lastU = 0] = ring.at(-1) ?? []
  return [...ring, [lastU, topMm], [-standOffMm, topMm]]
}
