import type { BodyTable } from '@/core/search/body-table'
import type { SearchTables } from '@/core/search/search-tables'
import type { Survivor } from './surviving-pairs'

/*
 * The bare loop the search is held against: typed arrays and nothing else, every surviving cutter with everything that
 * holds it, the outline gone through line by line for each pair. It counts; it ranks nothing, keeps nothing, explains
 * nothing.
 */

interface Outlines {
  lineStart: Int32Array
  a0: Float64Array
  r0: Float64Array
  a1: Float64Array
  r1: Float64Array
}

export interface BareCrib {
  holders: Outlines
  extensions: Outlines
}

export interface BareCount {
  pairs: number
  reaching: number
}

/** Outlines widened and lowered, the spindle's face the last line. */
export function bareCrib({ holders, extensions, settings }: SearchTables): BareCrib {
  return {
    holders: widened(holders, settings.holderClearanceMm),
    extensions: widened(extensions, settings.holderClearanceMm),
  }
}

function widened(bodies: BodyTable, clearanceMm: number): Outlines {
  const lines: [number, number, number, number][] = []
  const lineStart = [0]
  for (let outline = 0; outline < bodies.outlineCount; outline++) {
    for (let line = bodies.lineStart[outline]!; line < bodies.lineStart[outline + 1]!; line++)
      lines.push([
        bodies.z0[line]! - clearanceMm,
        bodies.isFromAxis[line] === 1 ? 0 : bodies.r0[line]! + clearanceMm,
        bodies.z1[line]! - clearanceMm,
        bodies.r1[line]! + clearanceMm,
      ])
    const spindleMm = bodies.spindleRadiusMm[outline]!
    const faceMm = bodies.lengthMm[outline]! - clearanceMm
    if (spindleMm > 0) lines.push([faceMm, 0, faceMm, Math.min(spindleMm, 1e6) + clearanceMm])
    lineStart.push(lines.length)
  }
  const column = (at: 0 | 1 | 2 | 3) => Float64Array.from(lines, (line) => line[at])
  return { lineStart: Int32Array.from(lineStart), a0: column(0), r0: column(1), a1: column(2), r1: column(3) }
}

/** Every surviving cutter with everything that holds its shank; an extension without the holders behind it. */
export function bareDirect(
  tables: SearchTables,
  crib: BareCrib,
  survivors: readonly Survivor[],
  depthMm: number,
  tanDraft: number,
): BareCount {
  const count = { pairs: 0, reaching: 0 }
  for (const { standOffMm, overallMm, fullShankMm, shankClass } of survivors) {
    for (const side of [0, 1] as const) {
      const {
        outline,
        leastInMm,
        mostInMm,
        count: clamps,
      } = (side === 0 ? tables.inHolders : tables.inExtensions)[shankClass]!
      const outlines = side === 0 ? crib.holders : crib.extensions
      for (let clamp = 0; clamp < clamps; clamp++) {
        const askMm = outlineBoundMm(outlines, outline[clamp]!, standOffMm, depthMm, tanDraft)
        const lowerMm = Math.max(askMm, fullShankMm, overallMm - mostInMm[clamp]!)
        if (side === 0 && lowerMm <= overallMm - leastInMm[clamp]! + 1e-9) count.reaching++
      }
      count.pairs += clamps
    }
  }
  return count
}

/** Every holder behind every extension too: all assemblies there are. */
export function bareStacks(
  tables: SearchTables,
  crib: BareCrib,
  survivors: readonly Survivor[],
  takersOf: (extension: number) => Int32Array,
  depthMm: number,
  tanDraft: number,
): BareCount {
  const count = { pairs: 0, reaching: 0 }
  for (const { standOffMm, overallMm, fullShankMm, shankClass } of survivors) {
    const clamps = tables.inExtensions[shankClass]!
    for (let clamp = 0; clamp < clamps.count; clamp++) {
      const outline = clamps.outline[clamp]!
      const projectionMm = tables.extensions.lengthMm[outline]!
      const lowestMm = Math.max(
        outlineBoundMm(crib.extensions, outline, standOffMm, depthMm, tanDraft),
        fullShankMm,
        overallMm - clamps.mostInMm[clamp]!,
      )
      const upperMm = overallMm - clamps.leastInMm[clamp]! + 1e-9
      const takers = takersOf(clamps.owner[clamp]!)
      for (let one = 0; one < takers.length; one++) {
        const askMm = outlineBoundMm(crib.holders, takers[one]!, standOffMm, depthMm, tanDraft) - projectionMm
        if (Math.max(askMm, lowestMm) <= upperMm) count.reaching++
      }
      count.pairs += takers.length
    }
  }
  return count
}

/** On a straight line the lesser of wall and depth is most at an end, or where the two meet. */
function outlineBoundMm(
  { lineStart, a0, r0, a1, r1 }: Outlines,
  outline: number,
  standOffMm: number,
  depthMm: number,
  tanDraft: number,
): number {
  const edgeMm = standOffMm + depthMm * tanDraft
  const end = lineStart[outline + 1]!
  let boundMm = -1e9
  for (let line = lineStart[outline]!; line < end; line++) {
    const startMm = r0[line]!
    const endMm = r1[line]!
    if (startMm > edgeMm) boundMm = Math.max(boundMm, depthMm - a0[line]!)
    else if (endMm > edgeMm + 1e-9)
      boundMm = Math.max(
        boundMm,
        depthMm - (a0[line]! + ((edgeMm - startMm) / (endMm - startMm)) * (a1[line]! - a0[line]!)),
      )
    if (tanDraft > 0) {
      if (startMm <= edgeMm) boundMm = Math.max(boundMm, (startMm - standOffMm) / tanDraft - a0[line]!)
      if (endMm <= edgeMm) boundMm = Math.max(boundMm, (endMm - standOffMm) / tanDraft - a1[line]!)
    }
  }
  return boundMm
}
