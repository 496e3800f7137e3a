import type { CheckedClamping } from '@/core/reach/stick-out-bounds'
import { type BodyTable, type LeastCompliance, leastCompliance } from './body-table'
import type { HoldingWay } from './hold-classes'

/** What of a stick-out's bounds the clamping decides; both are taken off the overall length. */
export interface ClampDepths {
  /** The least that is in the bore: the longest stick-out is the overall length less this. */
  leastInMm: number
  /** The most that goes in: the shortest stick-out is the overall length less this. */
  mostInMm: number
}

/**
 * How deep a shank may stand in what clamps it.
 *
 * Units      Millimetres.
 * Result     Crossed, `leastInMm` the larger, where nothing can be clamped.
 *
 * @example
 * clampDepths({ boreDepthMm: 40, gripStartMm: 2, gripMm: 20, insertionMm: null }) // => { leastInMm: 22, mostInMm: 40 }
 */
export function clampDepths({ boreDepthMm, gripStartMm, gripMm, insertionMm }: CheckedClamping): ClampDepths {
  return {
    leastInMm: Math.max(gripMm === null ? 0 : gripMm + gripStartMm, insertionMm ?? 0),
    mostInMm: Math.min(boreDepthMm, insertionMm ?? Number.POSITIVE_INFINITY),
  }
}

/** Ways to clamp one class of shanks, as columns; alike ways, of one outline and depths, stand side by side. */
interface ClampColumns {
  count: number
  owner: Int32Array
  collet: Int32Array
  outline: Int32Array
  leastInMm: Float64Array
  mostInMm: Float64Array
}

/** Ways alike, taken together. */
export interface ClampGroups {
  count: number
  outline: Int32Array
  leastInMm: Float64Array
  mostInMm: Float64Array
  size: Int32Array
}

export interface ClampTable extends ClampColumns {
  groups: ClampGroups
  /** The most that goes into any of them. */
  mostInAnyMm: number
  /** A floor under what any of their bodies adds to the compliance. */
  least: LeastCompliance
}

/**
 * Packs the ways that hold a class of shanks and whose figures are known.
 *
 * Units      Millimetres.
 *
 * @example
 * packClamps([{ owner: 0, collet: -1 }], packBodies([null]), () => null).count // => 0
 */
export function packClamps(
  ways: readonly HoldingWay[],
  bodies: BodyTable,
  depthsOf: (way: HoldingWay) => ClampDepths | null,
): ClampTable {
  const clamps: (HoldingWay & ClampDepths & { outline: number })[] = []
  for (const way of ways) {
    const depths = depthsOf(way)
    const outline = bodies.outlineOf[way.owner]!
    if (depths && outline >= 0) clamps.push({ ...way, ...depths, outline })
  }
  clamps.sort(
    (a, b) =>
      a.leastInMm - b.leastInMm || a.mostInMm - b.mostInMm || a.outline - b.outline || a.owner - b.owner,
  )
  const columns = emptyColumns(clamps.length)
  for (const [at, clamp] of clamps.entries()) {
    columns.owner[at] = clamp.owner
    columns.collet[at] = clamp.collet
    columns.outline[at] = clamp.outline
    columns.leastInMm[at] = clamp.leastInMm
    columns.mostInMm[at] = clamp.mostInMm
  }
  return clampTable(columns, bodies)
}

/**
 * What of a table of clamps is left with some owners and collets masked out.
 *
 * Shapes     A mask has one entry for every record; 0 leaves it out.
 *
 * @example
 * maskedClamps(packClamps([{ owner: 0, collet: -1 }], packBodies([null]), () => null), packBodies([null]), Uint8Array.of(0), new Uint8Array(0)).count // => 0
 */
export function maskedClamps(
  clamps: ClampTable,
  bodies: BodyTable,
  ownerMask: Uint8Array,
  colletMask: Uint8Array,
): ClampTable {
  const kept = new Int32Array(clamps.count)
  let count = 0
  for (let clamp = 0; clamp < clamps.count; clamp++) {
    const collet = clamps.collet[clamp]!
    if (ownerMask[clamps.owner[clamp]!] !== 0 && (collet < 0 || colletMask[collet] !== 0))
      kept[count++] = clamp
  }
  if (count === clamps.count) return clamps
  const columns = emptyColumns(count)
  for (let at = 0; at < count; at++) {
    const clamp = kept[at]!
    columns.owner[at] = clamps.owner[clamp]!
    columns.collet[at] = clamps.collet[clamp]!
    columns.outline[at] = clamps.outline[clamp]!
    columns.leastInMm[at] = clamps.leastInMm[clamp]!
    columns.mostInMm[at] = clamps.mostInMm[clamp]!
  }
  return clampTable(columns, bodies)
}

function emptyColumns(count: number): ClampColumns {
  return {
    count,
    owner: new Int32Array(count),
    collet: new Int32Array(count),
    outline: new Int32Array(count),
    leastInMm: new Float64Array(count),
    mostInMm: new Float64Array(count),
  }
}

function clampTable(columns: ClampColumns, bodies: BodyTable): ClampTable {
  let mostInAnyMm = Number.NEGATIVE_INFINITY
  for (const mm of columns.mostInMm) mostInAnyMm = Math.max(mostInAnyMm, mm)
  return {
    ...columns,
    groups: clampGroups(columns),
    mostInAnyMm,
    least: leastCompliance(bodies, columns.outline),
  }
}

function clampGroups({ count, outline, leastInMm, mostInMm }: ClampColumns): ClampGroups {
  const groups = {
    outline: new Int32Array(count),
    leastInMm: new Float64Array(count),
    mostInMm: new Float64Array(count),
    size: new Int32Array(count),
  }
  let last = -1
  for (let clamp = 0; clamp < count; clamp++) {
    const isAlike =
      last >= 0 &&
      outline[clamp] === groups.outline[last] &&
      leastInMm[clamp] === groups.leastInMm[last] &&
      mostInMm[clamp] === groups.mostInMm[last]
    if (!isAlike) {
      last++
      groups.outline[last] = outline[clamp]!
      groups.leastInMm[last] = leastInMm[clamp]!
      groups.mostInMm[last] = mostInMm[clamp]!
    }
    groups.size[last] = (groups.size[last] ?? 0) + 1
  }
  return { count: last + 1, ...groups }
}
