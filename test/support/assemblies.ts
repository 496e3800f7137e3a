import fc from 'fast-check'
import { defaultReachSettings, type Feature, type ReachRequest, type WallFeature } from '@/core/reach/types'
import type {
  CutterGeometry,
  ExtensionGeometry,
  HolderGeometry,
  HolderSegment,
  OutlineSegment,
} from '@/core/tooling'

/* Random assemblies that can be built: sizes to a hundredth, as catalogues print them. */

const hundredths = (from: number, to: number) =>
  fc.integer({ min: Math.round(from * 100), max: Math.round(to * 100) }).map((whole) => whole / 100)

const maybe = <Value>(arbitrary: fc.Arbitrary<Value>) => fc.option(arbitrary, { nil: null })
const round = (mm: number) => Math.round(mm * 100) / 100

const millForms = ['square', 'cornerRadius', 'ball', 'taperedSharp', 'taperedBall', 'taperedCorner'] as const
type MillForm = (typeof millForms)[number]

const lengths = fc.record({
  diameterMm: hundredths(0.5, 20),
  cutShare: hundredths(0.6, 4),
  runOutShare: maybe(hundredths(0, 1)),
  neckShare: maybe(hundredths(0.7, 0.99)),
  neckLengthShare: hundredths(0.2, 8),
  neckTaperDeg: maybe(hundredths(0, 6)),
  transitionDeg: maybe(fc.constantFrom(10, 30, 60, 90)),
  shankShare: fc.oneof(fc.constant(1), hundredths(0.7, 2.5)),
  restMm: hundredths(35, 70),
})

/** A milling cutter whose taper, if it has one, is at most so many degrees. */
export function millingCutter(form: MillForm, taperDeg: number): fc.Arbitrary<CutterGeometry> {
  return fc.record({ of: lengths, cornerShare: hundredths(0.05, 0.95) }).map(({ of, cornerShare }) => {
    const isTapered = form.startsWith('tapered')
    const radiusMm = of.diameterMm / 2
    const lengthOfCutMm = round(of.diameterMm * of.cutShare)
    const fluteLengthMm =
      of.runOutShare === null ? null : round(lengthOfCutMm + of.diameterMm * of.runOutShare)
    const flutedMm = fluteLengthMm ?? lengthOfCutMm + radiusMm
    const hasNeck = of.neckShare !== null && !isTapered
    const reachLengthMm = hasNeck ? round(flutedMm + of.diameterMm * of.neckLengthShare) : null
    const cornerRadiusMm =
      form === 'cornerRadius' || form === 'taperedCorner'
        ? radiusMm * cornerShare
        : form === 'taperedBall'
          ? radiusMm
          : null
    const shankDiameterMm = round(of.diameterMm * of.shankShare)
    return {
      form: isTapered ? ('tapered' as const) : (form as 'square' | 'cornerRadius' | 'ball'),
      cuttingDiameterMm: of.diameterMm,
      cornerRadiusMm,
      taperHalfAngleDeg: isTapered ? taperDeg : null,
      lengthOfCutMm,
      fluteLengthMm,
      neckDiameterMm: hasNeck ? round(of.diameterMm * (of.neckShare ?? 1)) : null,
      neckTaperHalfAngleDeg: hasNeck ? of.neckTaperDeg : null,
      reachLengthMm,
      neckTransitionAngleDeg: hasNeck ? of.transitionDeg : null,
      shankDiameterMm,
      overallLengthMm: round((reachLengthMm ?? flutedMm) + shankDiameterMm * 6 + of.restMm),
      substrate: 'carbide' as const,
    }
  })
}

const hole = fc.record({
  form: fc.constantFrom('drill', 'reamer', 'tap'),
  of: lengths,
  pointAngleDeg: fc.constantFrom(90, 118, 140, 180),
})

/** A drill, reamer or tap, flutes long enough for its point. */
export const holeTool: fc.Arbitrary<CutterGeometry> = hole.map(({ form, of, pointAngleDeg }) => {
  const lengthOfCutMm = round(of.diameterMm * (1 + 2 * of.cutShare))
  const shankDiameterMm = round(of.diameterMm * of.shankShare)
  const fluteLengthMm = of.runOutShare === null ? null : round(lengthOfCutMm + of.diameterMm * of.runOutShare)
  return {
    form: form as 'drill' | 'reamer' | 'tap',
    cuttingDiameterMm: of.diameterMm,
    pointAngleDeg: form === 'drill' || of.neckShare === null ? pointAngleDeg : null,
    lengthOfCutMm,
    fluteLengthMm,
    neckDiameterMm: of.neckShare === null ? null : round(of.diameterMm * of.neckShare),
    reachLengthMm:
      of.neckShare === null
        ? null
        : round((fluteLengthMm ?? lengthOfCutMm + of.diameterMm / 2) + of.diameterMm * of.neckLengthShare),
    shankDiameterMm,
    overallLengthMm: round(lengthOfCutMm + of.diameterMm * 10 + shankDiameterMm * 6 + of.restMm),
    substrate: 'carbide' as const,
  }
})

const segment = (leastMm: number): fc.Arbitrary<OutlineSegment> =>
  fc.record({
    lengthMm: hundredths(4, 30),
    noseDiameterMm: hundredths(leastMm, leastMm + 30),
    spindleDiameterMm: hundredths(leastMm, leastMm + 40),
  })

/** A holder whose nose is wider than the shank, with what it needs to clamp it. */
export function holderFor(cutter: CutterGeometry): fc.Arbitrary<HolderGeometry> {
  const leastMm = Math.ceil(cutter.shankDiameterMm + 2)
  const segments = fc.array(segment(leastMm), { minLength: 1, maxLength: 3 })
  return fc
    .record({
      segments,
      hasNut: fc.boolean(),
      moreMm: hundredths(0, 50),
      boreShare: hundredths(0.3, 1),
      spindleNoseDiameterMm: maybe(hundredths(60, 200)),
      gripStartMm: maybe(hundredths(0, 3)),
    })
    .map(({ segments: plain, hasNut, moreMm, boreShare, spindleNoseDiameterMm, gripStartMm }) => {
      const parts: HolderSegment[] = plain.map((one, index) => ({
        ...one,
        part: hasNut && index === 0 ? 'nut' : 'holder',
      }))
      const lengthMm = plain.reduce((sum, one) => sum + one.lengthMm, 0)
      return {
        gaugeLengthMm: round(lengthMm + moreMm),
        boreDepthMm: round(Math.max(10, cutter.overallLengthMm * boreShare)),
        minimumGripMm: round(Math.min(8 + cutter.shankDiameterMm, cutter.overallLengthMm / 3)),
        gripStartMm,
        spindleNoseDiameterMm,
        segments: parts,
      }
    })
}

export function extensionFor(cutter: CutterGeometry): fc.Arbitrary<ExtensionGeometry> {
  const leastMm = Math.ceil(cutter.shankDiameterMm + 1)
  return fc
    .record({
      segments: fc.array(segment(leastMm), { minLength: 1, maxLength: 2 }),
      moreMm: hundredths(0, 60),
      boreShare: hundredths(0.3, 1),
    })
    .map(({ segments, moreMm, boreShare }) => ({
      projectionMm: round(segments.reduce((sum, one) => sum + one.lengthMm, 0) + moreMm),
      boreDepthMm: round(Math.max(10, cutter.overallLengthMm * boreShare)),
      minimumGripMm: round(Math.min(8 + cutter.shankDiameterMm, cutter.overallLengthMm / 3)),
      segments,
    }))
}

export type WallKind = 'straight' | 'drafted' | 'tilted' | 'obstacles'

/** A wall of one kind; its draft is at least the taper that has to cut it, mostly. */
function wallOf(kind: WallKind, draftDeg: number): fc.Arbitrary<WallFeature> {
  const depthMm = fc.oneof(hundredths(0.5, 90), hundredths(0.5, 15))
  const throughMm = maybe(hundredths(0, 2))
  if (kind === 'tilted')
    return fc.record({
      kind: fc.constant('wall' as const),
      depthMm,
      throughMm,
      draftDeg: fc.constant(draftDeg),
      tiltDeg: hundredths(1, Math.min(55, 75 - draftDeg)),
    })
  const obstacle = fc.record({ setbackMm: hundredths(0, 40), riseMm: hundredths(0, 30) })
  const mostObstacles = kind === 'obstacles' ? 2 : 0
  return fc.record({
    kind: fc.constant('wall' as const),
    depthMm,
    throughMm,
    draftDeg: fc.constant(draftDeg),
    openingWidthMm: maybe(hundredths(1, 60)),
    insideCornerRadiusMm: maybe(hundredths(1, 20)),
    floorRadiusMm: maybe(hundredths(0, 10)),
    obstacles: fc.array(obstacle, { minLength: Math.min(1, mostObstacles), maxLength: mostObstacles }),
  })
}

const clearances = fc.record({ shankMm: hundredths(0.03, 0.3), holderMm: hundredths(0.1, 3) })

/** A whole request: feature, cutter, holder, often an extension, a stick-out given or not. */
export function assembly(kind: WallKind | 'hole' | 'circled'): fc.Arbitrary<ReachRequest> {
  const isLeaning = kind === 'drafted' || kind === 'obstacles' || kind === 'tilted'
  return fc
    .record({
      form: fc.constantFrom(...millForms),
      ball: fc.constantFrom<MillForm>('ball', 'taperedBall'),
      draftDeg: isLeaning
        ? fc.oneof(hundredths(0.2, 10), hundredths(0.2, 45), fc.constant(0))
        : fc.constant(0),
      taperShare: fc.oneof(hundredths(0.1, 1), hundredths(0.1, 1.3), fc.constant(1)),
    })
    .chain(({ form, ball, draftDeg, taperShare }) => {
      const taperDeg = Math.max(0.1, round(draftDeg * taperShare))
      const upright = form.startsWith('tapered') ? 'cornerRadius' : form
      const millForm = kind === 'tilted' ? ball : draftDeg === 0 ? upright : form
      const cutter = kind === 'hole' ? holeTool : millingCutter(millForm, taperDeg)
      return fc.record({ cutter, draftDeg: fc.constant(draftDeg) })
    })
    .chain(({ cutter, draftDeg }) =>
      fc
        .record({
          feature: featureFor(kind, cutter, draftDeg),
          holder: holderFor(cutter),
          extension: maybe(extensionFor(cutter)),
          clearances,
          stickOutShare: maybe(hundredths(0.2, 1.05)),
        })
        .map(({ stickOutShare, ...rest }) => ({
          ...rest,
          cutter,
          stickOutMm: stickOutShare === null ? null : round(cutter.overallLengthMm * stickOutShare),
          settings: defaultReachSettings,
        })),
    )
}

function featureFor(
  kind: WallKind | 'hole' | 'circled',
  cutter: CutterGeometry,
  draftDeg: number,
): fc.Arbitrary<Feature> {
  if (kind !== 'hole' && kind !== 'circled') return wallOf(kind, draftDeg)
  const widerMm = kind === 'hole' ? hundredths(-0.12, 0.12) : hundredths(-1, 30)
  return fc
    .record({ depthMm: hundredths(0.5, 90), widerMm, breakThroughMm: maybe(hundredths(0, 3)) })
    .map(({ depthMm, widerMm: wider, breakThroughMm }) => ({
      kind: 'hole' as const,
      depthMm,
      diameterMm: Math.max(0.3, round(cutter.cuttingDiameterMm + wider)),
      breakThroughMm,
    }))
}
