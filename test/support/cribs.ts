import fc from 'fast-check'
import type { Feature } from '@/core/reach/types'
import type {
  CribTooling,
  SearchCollet,
  SearchCutter,
  SearchExtension,
  SearchHolder,
  SearchQuestion,
} from '@/core/search/types'
import type { Bore, CutterGeometry } from '@/core/tooling'
import { assembly, extensionFor, holderFor, holeTool, millingCutter } from './assemblies'

/* Random cribs, small enough to be gone through one assembly at a time. */

const shanksMm = [4, 6, 6.35, 8, 10]
const series = ['ER16', 'er 16', 'ER20', 'ER32']

const hundredths = (from: number, to: number) =>
  fc.integer({ min: Math.round(from * 100), max: Math.round(to * 100) }).map((whole) => whole / 100)

/** Mostly there. */
const usually = <Value>(arbitrary: fc.Arbitrary<Value>) => fc.option(arbitrary, { nil: null, freq: 12 })

const bore: fc.Arbitrary<Bore | null> = fc.oneof(
  {
    weight: 5,
    arbitrary: fc.constantFrom(...shanksMm).map((diameterMm) => ({ kind: 'fixed', diameterMm }) as const),
  },
  {
    weight: 6,
    arbitrary: fc.constantFrom(...series).map((name) => ({ kind: 'collet', series: name }) as const),
  },
  { weight: 1, arbitrary: fc.constant(null) },
)

/** The geometry on one of a few shanks, mostly none wider than its flutes. */
function onCommonShank(geometry: CutterGeometry, pick: number): CutterGeometry {
  const slim = shanksMm.filter((mm) => mm <= geometry.cuttingDiameterMm)
  const from = pick % 5 === 0 || slim.length === 0 ? shanksMm : slim
  return { ...geometry, shankDiameterMm: from[pick % from.length] ?? 6 }
}

const forms = ['square', 'cornerRadius', 'ball', 'taperedSharp', 'taperedBall', 'taperedCorner'] as const

/** A cutter of a kind the feature is for, now and then of another; a few can't be. */
function cutter(kind: SearchedKind, draftDeg: number): fc.Arbitrary<CutterGeometry> {
  const fitting =
    kind === 'tilted' ? (['ball', 'taperedBall'] as const) : draftDeg > 0 ? forms : forms.slice(0, 3)
  const millOf = (some: readonly (typeof forms)[number][]) =>
    fc
      .record({ form: fc.constantFrom(...some), taperShare: hundredths(0.1, 1) })
      .chain(({ form, taperShare }) => millingCutter(form, Math.max(0.1, draftDeg * taperShare)))
  return fc
    .record({
      geometry: fc.oneof(
        { weight: 8, arbitrary: kind === 'hole' ? holeTool : millOf(fitting) },
        { weight: 1, arbitrary: millOf(forms) },
        { weight: 1, arbitrary: holeTool },
      ),
      pick: fc.nat(),
      broken: fc.integer({ min: 0, max: 40 }),
      isHss: fc.boolean(),
    })
    .map(({ geometry, pick, broken, isHss }) => ({
      ...onCommonShank(geometry, pick),
      substrate: isHss ? 'hss' : 'carbide',
      ...(broken === 0 ? { overallLengthMm: 1 } : {}),
      ...(broken === 1 ? { form: 'chamfer' as const, pointAngleDeg: 90 } : {}),
    }))
}

const holder: fc.Arbitrary<Omit<SearchHolder, 'id'>> = fc
  .record({
    bore,
    shankDiameterMm: fc.constantFrom(...shanksMm),
    isSideLock: fc.boolean(),
    grips: fc.boolean(),
  })
  .chain(({ bore: ofHolder, shankDiameterMm, isSideLock, grips }) =>
    fc
      .record({
        geometry: holderFor({
          form: 'square',
          cuttingDiameterMm: 6,
          shankDiameterMm,
          overallLengthMm: 90,
        }),
        insertionMm: hundredths(20, 45),
        boreDepthMm: usually(hundredths(25, 90)),
      })
      .map(({ geometry, insertionMm, boreDepthMm }) => ({
        geometry: {
          ...geometry,
          boreDepthMm,
          minimumGripMm: grips ? geometry.minimumGripMm : null,
          sideLockInsertionMm: isSideLock && ofHolder?.kind === 'fixed' ? insertionMm : null,
        },
        bore: ofHolder,
        taper: null,
      })),
  )

const extension: fc.Arbitrary<Omit<SearchExtension, 'id'>> = fc
  .record({
    geometry: extensionFor({ form: 'square', cuttingDiameterMm: 6, shankDiameterMm: 8, overallLengthMm: 90 }),
    bore,
    shankDiameterMm: fc.option(fc.constantFrom(...shanksMm), { nil: null }),
    boreDepthMm: usually(hundredths(25, 90)),
  })
  .map(({ geometry, boreDepthMm, ...rest }) => ({ ...rest, geometry: { ...geometry, boreDepthMm } }))

const collet: fc.Arbitrary<Omit<SearchCollet, 'id'>> = fc
  .record({
    series: fc.constantFrom(...series),
    maximumMm: fc.constantFrom(4, 6, 7, 8, 10),
    rangeMm: fc.constantFrom(0, 0.5, 1, 2),
    lengthMm: usually(fc.constantFrom(27.5, 31.5, 40)),
    minimumGripMm: fc.option(hundredths(8, 30), { nil: null }),
  })
  .map(({ rangeMm, ...rest }) => ({ geometry: { ...rest, minimumMm: rest.maximumMm - rangeMm } }))

/** Ids whose order is not the order of the list. */
function named<Kind extends object>(kind: string, records: Kind[]): (Kind & { id: string })[] {
  return records.map((record, index) => ({ ...record, id: `${kind}${(index * 7) % 10}-${index}` }))
}

/** The first holder once more with another spindle behind it: another outline that mostly asks the same. */
function withTwin(holders: Omit<SearchHolder, 'id'>[]): Omit<SearchHolder, 'id'>[] {
  return [
    ...holders,
    ...holders.slice(0, 1).map(({ geometry, ...rest }) => ({
      ...rest,
      geometry: { ...geometry, spindleNoseDiameterMm: geometry.spindleNoseDiameterMm ? null : 95 },
    })),
  ]
}

/** A crib, often with the very same record twice. */
export function crib(kind: SearchedKind, draftDeg: number, most = 5): fc.Arbitrary<CribTooling> {
  const list = <Kind extends object>(arbitrary: fc.Arbitrary<Kind>, longest: number, shortest = 0) =>
    fc
      .record({
        records: fc.array(arbitrary, { minLength: shortest, maxLength: longest, size: 'max' }),
        doubles: fc.boolean(),
      })
      .map(({ records, doubles }) => (doubles ? [...records, ...records.slice(0, 1)] : records))
  return fc
    .record({
      cutters: list(
        cutter(kind, draftDeg).map((geometry) => ({ geometry })),
        most,
      ),
      holders: list(holder, most + 1, most - 2).map(withTwin),
      collets: list(collet, most + 2, most - 2),
      extensions: list(extension, 2),
    })
    .map(({ cutters, holders, collets, extensions }) => ({
      cutters: named('T', cutters) satisfies SearchCutter[],
      holders: named('H', holders),
      collets: named('C', collets),
      extensions: named('E', extensions),
    }))
}

export type SearchedKind = Parameters<typeof assembly>[0]

export interface SearchCase {
  tooling: CribTooling
  question: SearchQuestion
}

/**
 * A crib and a feature of one kind, with no limits but the feature's and the clearances. Cutters
 * the feature was made for are in the crib, and the feature is made shallower, so that not everything falls short.
 */
export function searchCase(kind: SearchedKind, most = 5): fc.Arbitrary<SearchCase> {
  return assembly(kind).chain(({ feature, cutter: ofFeature, clearances }) =>
    fc
      .record({
        tooling: crib(kind, draftOf(feature), most),
        share: hundredths(0.02, 1),
        pick: fc.nat(),
        isOpen: fc.boolean(),
        longerMm: fc.array(hundredths(0, 60), { minLength: 1, maxLength: 4 }),
      })
      .map(({ tooling, share, pick, isOpen, longerMm }) => ({
        tooling: { ...tooling, cutters: [...tooling.cutters, ...siblings(ofFeature, longerMm, pick)] },
        question: {
          feature: shallower(feature, share, isOpen),
          clearances: clearances ?? null,
          limit: 1000,
          nearMissLimit: 1000,
        },
      })),
  )
}

function siblings(cutter: CutterGeometry, longerMm: number[], pick: number): SearchCutter[] {
  return longerMm.map((mm, index) => ({
    id: `T-own-${index}`,
    geometry: {
      ...onCommonShank(cutter, pick + index),
      overallLengthMm: Math.round((cutter.overallLengthMm + mm) * 100) / 100,
    },
  }))
}

function shallower(feature: Feature, share: number, isOpen: boolean): Feature {
  const depthMm = Math.max(0.5, feature.depthMm * share)
  if (feature.kind === 'hole' || !isOpen) return { ...feature, depthMm }
  return { ...feature, depthMm, openingWidthMm: null, insideCornerRadiusMm: null, floorRadiusMm: null }
}

function draftOf(feature: Feature): number {
  return feature.kind === 'wall' ? (feature.draftDeg ?? 0) + (feature.tiltDeg ?? 0) : 0
}
