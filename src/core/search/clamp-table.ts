import type { CheckedClamping } from '@/core/reach/stick-out-bounds'
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

/** Ways to clamp one class of shanks, packed flat; those that clamp the least first. */
export interface ClampTable {
  count: number
  owner: Int32Array
  collet: Int32Array
  outline: Int32Array
  leastInMm: Float64Array
  mostInMm: Float64Array
}

/**
 * Packs the ways that hold a class of shanks and whose figures are known.
 *
 * Units      Millimetres.
 * Result     Alike ways, of one outline and depths, stand side by side.
 *
 * @example
 * packClamps([{ owner: 0, collet: -1 }], Int32Array.of(0), () => null).count // => 0
 */
export function packClamps(
  ways: readonly HoldingWay[],
  outlineOf: Int32Array,
  depthsOf: (way: HoldingWay) => ClampDepths | null,
): ClampTable {
  const clamps = ways.flatMap((way) => {
    const depths = depthsOf(way)
    const outline = outlineOf[way.owner] ?? -1
    return depths && outline >= 0 ? [{ ...way, ...depths, outline }] : []
  })
  clamps.sort(
    (a, b) =>
      a.leastInMm - b.leastInMm || a.mostInMm - b.mostInMm || a.outline - b.outline || a.owner - b.owner,
  )
  return {
    count: clamps.length,
    owner: Int32Array.from(clamps, ({ owner }) => owner),
    collet: Int32Array.from(clamps, ({ collet }) => collet),
    outline: Int32Array.from(clamps, ({ outline }) => outline),
    leastInMm: Float64Array.from(clamps, ({ leastInMm }) => leastInMm),
    mostInMm: Float64Array.from(clamps, ({ mostInMm }) => mostInMm),
  }
}
