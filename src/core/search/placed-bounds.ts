import type { Placement } from '@/core/reach/placement'
import type { AskedSearch } from './asked-search'
import { boundsAt } from './body-table'
import { tipPlacements } from './cutter-shortfalls'
import type { SearchTables } from './search-tables'

/** The stick-out that every outline asks for, with one tip in the feature. */
export interface PlacedBounds {
  holders: Float64Array
  extensions: Float64Array
}

/** Placements of every tip, and the bounds they ask; worked out when they are needed. */
export interface TipBounds {
  placements: Placement[]
  /** Tips that stand alike get the very same bounds. */
  of: (tip: number) => PlacedBounds
}

/** Standing places that differ by less are the same: a sum of the same figures. */
const alikeMm = 1e-12

/** Bounds of this many placements are kept; the search goes through the tips in order, then comes back to a few. */
const keptPlacements = 256

/**
 * The bounds at every tip's placement.
 *
 * Units      Millimetres.
 *
 * @example
 * tipBounds(searchTables({ cutters: [], holders: [], collets: [], extensions: [] }, defaultReachSettings), { demand: checkedDemand({ kind: 'wall', depthMm: 5 }) }).placements // => []
 */
export function tipBounds(tables: SearchTables, asked: AskedSearch): TipBounds {
  const placements = tipPlacements(tables, asked)
  const firstAlike = firstsAlike(placements)
  const kept = new Map<number, PlacedBounds>()
  const of = (tip: number): PlacedBounds => {
    const first = firstAlike[tip]!
    const known = kept.get(first)
    if (known) return known
    const bounds = boundsOf(tables, asked, placements[first]!, roomFor(tables, kept))
    kept.set(first, bounds)
    return bounds
  }
  return { placements, of }
}

/** Columns to fill: new ones, or those of the bounds kept longest, which are given up. */
function roomFor({ holders, extensions }: SearchTables, kept: Map<number, PlacedBounds>): PlacedBounds {
  const oldest = kept.entries().next()
  if (kept.size < keptPlacements || oldest.done)
    return {
      holders: new Float64Array(holders.outlineCount),
      extensions: new Float64Array(extensions.outlineCount),
    }
  const [first, { holders: ofHolders, extensions: ofExtensions }] = oldest.value
  kept.delete(first)
  return { holders: ofHolders, extensions: ofExtensions }
}

function boundsOf(
  { holders, extensions }: SearchTables,
  { clearances: { holderMm }, spindleRadiusMm }: AskedSearch,
  at: Placement,
  room: PlacedBounds,
): PlacedBounds {
  boundsAt(holders, at, holderMm, spindleRadiusMm, room.holders)
  boundsAt(extensions, at, holderMm, null, room.extensions)
  return room
}

/** For every tip the first of the run of tips before it that stand as it does. */
function firstsAlike(placements: readonly Placement[]): Int32Array {
  const firsts = new Int32Array(placements.length)
  for (let tip = 1; tip < placements.length; tip++) {
    const first = firsts[tip - 1]!
    firsts[tip] = standAlike(placements[first]!, placements[tip]!) ? first : tip
  }
  return firsts
}

/** Whether what is behind the nose is asked the same: upright only the distance from the wall counts. */
function standAlike(one: Placement, other: Placement): boolean {
  if (one.kind === 'hole' || other.kind === 'hole')
    return one.kind === other.kind && Math.abs(one.tipDepthMm - other.tipDepthMm) <= alikeMm
  if (one.tiltDeg > 0) return Math.abs(one.pivotMm - other.pivotMm) <= alikeMm
  return Math.abs(one.standOffMm - other.standOffMm) <= alikeMm
}
