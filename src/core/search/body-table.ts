import type { CheckLine, CheckPart } from '@/core/reach/check-parts'
import { fullDepthRadiusMm, lineBoundAt, mostBoundMm } from '@/core/reach/clearance-bounds'
import type { Placement } from '@/core/reach/placement'
import { type BeamPiece, complianceByOffset, type OffsetCompliance } from '@/core/stiffness/compliance'

/** What stands behind a nose: a holder with the spindle behind it, or an extension. Heights from its own nose. */
export interface Body {
  /** Without the spindle's face. */
  parts: CheckPart[]
  /** Gauge length or projection. */
  lengthMm: number
  /** Infinity where it is not known; null for an extension. */
  spindleRadiusMm: number | null
  /** With its nose at the tip. */
  beam: BeamPiece[]
}

/** Bodies packed flat, every outline once however many records share it. */
export interface BodyTable {
  /** A record's outline; -1 where the record is refused. */
  outlineOf: Int32Array
  outlineCount: number
  noseRadiusMm: Float64Array
  /** The least of `noseRadiusMm`; Infinity without outlines. */
  slimmestNoseMm: number
  /** Where an outline's lines begin; one more at the end. */
  lineStart: Int32Array
  z0: Float64Array
  r0: Float64Array
  z1: Float64Array
  r1: Float64Array
  /** 1 for a face that begins at the axis: see `widenedStart`. */
  isFromAxis: Uint8Array
  lengthMm: Float64Array
  /** 0 for an extension, which has no spindle behind it. */
  spindleRadiusMm: Float64Array
  /** Of its compliance: see `complianceByOffset`. */
  constant: Float64Array
  linear: Float64Array
  quadratic: Float64Array
}

/**
 * Packs the bodies of a table's records.
 *
 * Shapes     One entry for every record; null where the record is refused.
 * Units      Millimetres.
 *
 * @example
 * packBodies([null]).outlineOf[0] // => -1
 */
export function packBodies(bodies: (Body | null)[]): BodyTable {
  const outlineOf = new Int32Array(bodies.length).fill(-1)
  const distinct: { body: Body; lines: CheckLine[] }[] = []
  const known = new Map<string, number>()
  for (const [index, body] of bodies.entries()) {
    if (!body) continue
    const lines = leadingLines(body.parts)
    const key = bodyKey(body, lines)
    const outline = known.get(key) ?? distinct.push({ body, lines }) - 1
    known.set(key, outline)
    outlineOf[index] = outline
  }
  return { outlineOf, ...packedOutlines(distinct) }
}

/** Parts do not count: what touches is the same, whatever it is called. */
function bodyKey({ lengthMm, spindleRadiusMm, beam }: Body, lines: CheckLine[]): string {
  const ofLines = lines.flatMap(({ z0, r0, z1, r1 }) => [z0, r0, z1, r1])
  const ofBeam = beam.flatMap((piece) => [piece.toMm, piece.fromDiameterMm, piece.toDiameterMm])
  return [lengthMm, spindleRadiusMm, ...ofLines, '', ...ofBeam].join()
}

function packedOutlines(distinct: { body: Body; lines: CheckLine[] }[]): Omit<BodyTable, 'outlineOf'> {
  const lineStart = lineStarts(distinct.map(({ lines }) => lines))
  const lines = packLines(distinct.flatMap((one) => one.lines))
  const noseRadiusMm = Float64Array.from(distinct, (one) => one.lines[0]?.r1 ?? 0)
  const compliances = distinct.map(({ body }) => complianceByOffset(body.beam))
  return {
    outlineCount: distinct.length,
    noseRadiusMm,
    slimmestNoseMm: noseRadiusMm.reduce((least, mm) => Math.min(least, mm), Number.POSITIVE_INFINITY),
    lineStart,
    ...lines,
    lengthMm: Float64Array.from(distinct, ({ body }) => body.lengthMm),
    spindleRadiusMm: Float64Array.from(distinct, ({ body }) => body.spindleRadiusMm ?? 0),
    constant: Float64Array.from(compliances, ({ constant }) => constant),
    linear: Float64Array.from(compliances, ({ linear }) => linear),
    quadratic: Float64Array.from(compliances, ({ quadratic }) => quadratic),
  }
}

/**
 * Where the lines of each of several outlines begin in one list of all of them; one more at the end.
 *
 * @example
 * [...lineStarts([[], []])] // => [0, 0, 0]
 */
export function lineStarts(outlines: readonly (readonly CheckLine[])[]): Int32Array {
  const starts = new Int32Array(outlines.length + 1)
  for (const [index, lines] of outlines.entries()) starts[index + 1] = (starts[index] ?? 0) + lines.length
  return starts
}

/**
 * Lines of an outline as columns.
 *
 * Units      Millimetres.
 *
 * @example
 * packLines([{ z0: 0, r0: 0, z1: 0, r1: 14, arc: null }]).isFromAxis[0] // => 1
 */
export function packLines(lines: readonly CheckLine[]) {
  return {
    z0: Float64Array.from(lines, ({ z0 }) => z0),
    r0: Float64Array.from(lines, ({ r0 }) => r0),
    z1: Float64Array.from(lines, ({ z1 }) => z1),
    r1: Float64Array.from(lines, ({ r1 }) => r1),
    isFromAxis: Uint8Array.from(lines, ({ z0, r0, z1 }) => (r0 === 0 && z0 === z1 ? 1 : 0)),
  }
}

/**
 * The lines of an outline that can be the first to touch: those that come further out than all below them.
 *
 * Assumes an outline without gaps from the axis on: of two points at one radius the lower touches first, on every
 * wall, floor, obstacle and in every hole.
 *
 * Units      Millimetres.
 *
 * @example
 * leadingLines(holderCheckParts(handHolder, null).slice(0, 2)) // => [{ z0: 0, r0: 0, z1: 0, r1: 14, arc: null }]
 */
export function leadingLines(parts: readonly CheckPart[]): CheckLine[] {
  const rising = parts.flatMap(({ lines }) => lines).sort((a, b) => a.z0 - b.z0 || a.z1 - b.z1)
  const leading: CheckLine[] = []
  let widestMm = 0
  for (const line of rising) {
    const outMm = Math.max(line.r0, line.r1)
    if (outMm <= widestMm) continue
    leading.push(line)
    widestMm = outMm
  }
  return leading
}

/** A floor under the compliance of several bodies: each figure of `complianceByOffset` the least of any. */
export type LeastCompliance = OffsetCompliance

/**
 * The floor under what some outlines add to the compliance.
 *
 * Result     Infinite without outlines.
 *
 * @example
 * leastCompliance(packBodies([]), new Int32Array(0)).constant // => Infinity
 */
export function leastCompliance(bodies: BodyTable, outlines: Int32Array): LeastCompliance {
  let constant = Number.POSITIVE_INFINITY
  let linear = Number.POSITIVE_INFINITY
  let quadratic = Number.POSITIVE_INFINITY
  for (const outline of outlines) {
    constant = Math.min(constant, bodies.constant[outline]!)
    linear = Math.min(linear, bodies.linear[outline]!)
    quadratic = Math.min(quadratic, bodies.quadratic[outline]!)
  }
  return { constant, linear, quadratic }
}

/**
 * The stick-out every outline asks for at one placement, into `bounds`.
 *
 * Units      Millimetres; `spindleRadiusMm` stands in for the outlines' own where it is given.
 * Result     -Infinity where any stick-out does.
 *
 * @example
 * boundsAt(packBodies([]), placementOf({ kind: 'wall', depthMm: 25 }, squareCutter), 0.5, null, new Float64Array(0)).length // => 0
 */
export function boundsAt(
  bodies: BodyTable,
  at: Placement,
  clearanceMm: number,
  spindleRadiusMm: number | null,
  bounds: Float64Array,
): Float64Array {
  const ofLine = lineBoundAt(at)
  const mostMm = mostBoundMm(at, clearanceMm)
  const { lineStart, z0, r0, z1, r1, isFromAxis } = bodies
  const fullDepthMm = fullDepthRadiusMm(at) - clearanceMm
  if (bodies.slimmestNoseMm > fullDepthMm) return bounds.fill(mostMm)
  for (let outline = 0; outline < bodies.outlineCount; outline++) {
    if (bodies.noseRadiusMm[outline]! > fullDepthMm) {
      bounds[outline] = mostMm
      continue
    }
    let boundMm = Number.NEGATIVE_INFINITY
    for (let line = lineStart[outline]!; line < lineStart[outline + 1]! && boundMm < mostMm; line++) {
      const startMm = isFromAxis[line] === 1 ? 0 : r0[line]! + clearanceMm
      const ofThis = ofLine(
        z0[line]! - clearanceMm,
        startMm,
        z1[line]! - clearanceMm,
        r1[line]! + clearanceMm,
      )
      if (ofThis > boundMm) boundMm = ofThis
    }
    const ownMm = bodies.spindleRadiusMm[outline]!
    const outMm = ownMm > 0 ? (spindleRadiusMm ?? ownMm) : 0
    if (outMm > 0 && boundMm < mostMm) {
      const faceMm = bodies.lengthMm[outline]! - clearanceMm
      boundMm = Math.max(boundMm, ofLine(faceMm, 0, faceMm, outMm + clearanceMm))
    }
    bounds[outline] = boundMm
  }
  return bounds
}
