import type { Bore, Clamping, ColletGeometry, HolderSegment, OutlineSegment } from '../tooling'
import { type GeometryProblem, isMore } from './geometry-problem'

interface CatalogueHolder extends Clamping {
  gaugeLengthMm: number
  bore: Bore
  sideLockInsertionMm?: number | null
  segments: readonly HolderSegment[]
}

interface CatalogueExtension extends Clamping {
  projectionMm: number
  bore: Bore
  segments: readonly OutlineSegment[]
}

/**
 * What about a holder cannot be, each with its field and a sentence; empty for one that can.
 *
 * Shapes     One holder as the catalogue keeps it, every number in its own range; segments from the nose face.
 * Units      Millimetres.
 * Result     Problems in the order of the fields; never throws.
 * Source     reach.md, section 1, Holder; stock.md, Things.
 * Tolerance  1e-9 mm.
 *
 * @example
 * holderProblems({ gaugeLengthMm: 60, bore: { kind: 'fixed', diameterMm: 6 }, segments: [{ part: 'holder', lengthMm: 70, noseDiameterMm: 21, spindleDiameterMm: 27 }] })[0]?.path // => ['segments', 0, 'lengthMm']
 */
export function holderProblems(holder: CatalogueHolder): GeometryProblem[] {
  const problems = clampingProblems(holder)
  if (holder.sideLockInsertionMm != null && holder.bore.kind !== 'fixed') {
    problems.push({
      path: ['sideLockInsertionMm'],
      message: 'A side-lock has a fixed bore: leave this empty for a collet chuck.',
    })
  }
  if (isMore(holder.sideLockInsertionMm, holder.boreDepthMm)) {
    problems.push({
      path: ['sideLockInsertionMm'],
      message: 'The insertion is more than the depth of the bore.',
    })
  }
  const bodyIndex = holder.segments.findIndex((segment) => segment.part === 'holder')
  const lateNut = holder.segments.findIndex((segment, index) => segment.part === 'nut' && index > bodyIndex)
  if (bodyIndex >= 0 && lateNut >= 0) {
    problems.push({
      path: ['segments', lateNut, 'part'],
      message: 'The nut comes before the body: it is nearer the nose.',
    })
  }
  return [
    ...problems,
    ...overlongProblems(
      holder.segments,
      holder.gaugeLengthMm,
      'Together the segments are longer than the gauge length.',
    ),
  ]
}

/**
 * What about an extension cannot be, each with its field and a sentence; empty for one that can.
 *
 * Shapes     One extension as the catalogue keeps it, every number in its own range; segments from the nose face.
 * Units      Millimetres.
 * Result     Problems in the order of the fields; never throws.
 * Source     reach.md, section 1, extension.
 * Tolerance  1e-9 mm.
 *
 * @example
 * extensionProblems({ projectionMm: 100, bore: { kind: 'fixed', diameterMm: 6 }, boreDepthMm: 20, minimumGripMm: 25, segments: [] })[0]?.path // => ['minimumGripMm']
 */
export function extensionProblems(extension: CatalogueExtension): GeometryProblem[] {
  return [
    ...clampingProblems(extension),
    ...overlongProblems(
      extension.segments,
      extension.projectionMm,
      'Together the segments are longer than the projection.',
    ),
  ]
}

/**
 * What about a collet cannot be, each with its field and a sentence; empty for one that can.
 *
 * Shapes     One collet as the catalogue keeps it, every number in its own range.
 * Units      Millimetres.
 * Result     Problems in the order of the fields; never throws.
 * Source     stock.md, Things: minimum at most maximum.
 * Tolerance  Exact for the range, 1e-9 mm for the grip.
 *
 * @example
 * colletProblems({ series: 'ER16', minimumMm: 6, maximumMm: 5 })[0]?.path // => ['maximumMm']
 */
export function colletProblems(collet: ColletGeometry): GeometryProblem[] {
  const problems: GeometryProblem[] = []
  if (collet.minimumMm > collet.maximumMm) {
    problems.push({
      path: ['maximumMm'],
      message: 'The largest shank is smaller than the smallest one it takes.',
    })
  }
  if (isMore(collet.minimumGripMm, collet.lengthMm)) {
    problems.push({
      path: ['minimumGripMm'],
      message: 'The minimum grip is more than the length of the collet.',
    })
  }
  return problems
}

function clampingProblems(clamping: Clamping): GeometryProblem[] {
  if (isMore(clamping.minimumGripMm, clamping.boreDepthMm)) {
    return [{ path: ['minimumGripMm'], message: 'The minimum grip is more than the depth of the bore.' }]
  }
  return isMore((clamping.gripStartMm ?? 0) + (clamping.minimumGripMm ?? 0), clamping.boreDepthMm)
    ? [
        {
          path: ['gripStartMm'],
          message: 'Where gripping begins and the minimum grip do not fit into the bore.',
        },
      ]
    : []
}

/** The sentence stands beside the segment that passes the limit. */
function overlongProblems(
  segments: readonly OutlineSegment[],
  limitMm: number,
  message: string,
): GeometryProblem[] {
  let sumMm = 0
  for (const [index, segment] of segments.entries()) {
    sumMm += segment.lengthMm
    if (isMore(sumMm, limitMm)) return [{ path: ['segments', index, 'lengthMm'], message }]
  }
  return []
}
