import type {
  CribTooling,
  SearchCollet,
  SearchCutter,
  SearchExtension,
  SearchHolder,
} from '@/core/search/types'
import type { CutterForm, CutterGeometry, HolderSegment } from '@/core/tooling'

/*
 * A crib of any size that never was, as a big shop's is: catalogue sizes in mm and inches, stub to extra long, with necks
 * and tapers, jobber drills whose shank is their diameter, one cutter in twelve reground to a size of its own. The same
 * seed always makes the same crib. Sizes of shanks, chucks and nuts follow the usual catalogues from memory.
 */

export interface CribSize {
  cutters: number
  holders: number
  extensions: number
}

export const fullSize: CribSize = { cutters: 20_000, holders: 1000, extensions: 20 }

type Random = () => number

/** Seeded, uniform from 0 to below 1. */
function randomFrom(seed: number): Random {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

const inch = 25.4
const pick = <Value>(random: Random, from: readonly Value[]): Value =>
  from[Math.floor(random() * from.length)]!
const between = (random: Random, least: number, most: number) => least + random() * (most - least)
const to = (mm: number, stepMm: number) => Math.round(mm / stepMm) * stepMm
const hundredth = (mm: number) => Math.round(mm * 100) / 100

const metricShanksMm = [3, 4, 6, 8, 10, 12, 14, 16, 18, 20, 25, 32]
const inchShanksMm = [1 / 8, 3 / 16, 1 / 4, 5 / 16, 3 / 8, 7 / 16, 1 / 2, 5 / 8, 3 / 4, 1].map(
  (size) => size * inch,
)
const metricSizesMm = [
  0.5, 0.8, 1, 1.2, 1.5, 1.8, 2, 2.5, 3, 3.5, 4, 4.5, 5, 5.5, 5.7, 6, 6.5, 7, 7.7, 8, 9, 9.7, 10, 11, 12, 13,
  14, 15, 16, 18, 20, 22, 25, 32,
]
const inchSizesMm = Array.from({ length: 63 }, (_, index) => ((index + 2) / 64) * inch)

export function cribOfSize({ cutters, holders, extensions }: CribSize, seed = 20261201): CribTooling {
  const random = randomFrom(seed)
  const collets = colletSets()
  return {
    cutters: Array.from({ length: cutters }, (_, index) => cutterAt(random, index)),
    holders: Array.from({ length: holders }, (_, index) => holderAt(random, index)),
    collets: collets.map((geometry, index) => ({ id: `C${index}`, geometry })),
    extensions: Array.from({ length: extensions }, (_, index) => extensionAt(random, index)),
  }
}

const forms: readonly [CutterForm, number][] = [
  ['square', 0.27],
  ['cornerRadius', 0.2],
  ['ball', 0.15],
  ['tapered', 0.05],
  ['drill', 0.18],
  ['reamer', 0.03],
  ['tap', 0.05],
  ['threadMill', 0.02],
  ['slotting', 0.02],
  ['faceMill', 0.01],
  ['chamfer', 0.02],
]

function formFrom(share: number): CutterForm {
  let sum = 0
  for (const [form, part] of forms) {
    sum += part
    if (share < sum) return form
  }
  return 'square'
}

function cutterAt(random: Random, index: number): SearchCutter {
  const form = formFrom(random())
  const isInch = random() < 0.3
  const size =
    form === 'drill' && !isInch
      ? to(between(random, 1, 20), 0.1)
      : pick(random, isInch ? inchSizesMm : metricSizesMm)
  const isReground = random() < 1 / 12
  const cuttingDiameterMm = hundredth(
    isReground ? size - between(random, 0.05, 0.6) * Math.min(1, size / 6) : size,
  )
  const geometry =
    form === 'drill' || form === 'reamer' || form === 'tap'
      ? holeTool(random, form, cuttingDiameterMm, size)
      : mill(random, form, cuttingDiameterMm, size, isInch)
  return { id: `T${index}`, geometry, maximumRpm: null }
}

function shankFor(size: number, isInch: boolean): number {
  const shanks = isInch ? inchShanksMm : metricShanksMm
  return shanks.find((shank) => shank >= size - 0.01) ?? shanks.at(-1)!
}

function mill(
  random: Random,
  form: CutterForm,
  diameterMm: number,
  size: number,
  isInch: boolean,
): CutterGeometry {
  const isNecked = random() < 0.35 && form !== 'tapered' && form !== 'chamfer'
  // Small sizes stand on a shank of 3, 4 or 6 mm.
  const least = size < 3 ? pick(random, isInch ? [3.175, 6.35] : [3, 4, 6]) : size
  const shankDiameterMm = shankFor(Math.max(size, least), isInch)
  const cutShare = isNecked ? between(random, 0.8, 1.6) : pick(random, [1.5, 2, 2.5, 3, 4, 5])
  const lengthOfCutMm = to(Math.max(1, diameterMm * cutShare), 0.5)
  const fluteLengthMm = random() < 0.5 ? null : hundredth(lengthOfCutMm + (isNecked ? 0 : 0.4 * diameterMm))
  const reachLengthMm = isNecked
    ? to((fluteLengthMm ?? lengthOfCutMm) + diameterMm * pick(random, [1, 2, 3, 4, 6, 8]), 0.5)
    : null
  const topMm = reachLengthMm ?? fluteLengthMm ?? lengthOfCutMm + diameterMm / 2
  const gripMm = Math.max(28, shankDiameterMm * 3)
  const overallLengthMm = to(topMm + gripMm + pick(random, [4, 10, 20, 45]), 1)
  return {
    form,
    cuttingDiameterMm: diameterMm,
    cornerRadiusMm: cornerOf(random, form, diameterMm),
    taperHalfAngleDeg: form === 'tapered' ? pick(random, [0.5, 1, 1.5, 2, 3, 5, 7]) : null,
    pointAngleDeg: form === 'chamfer' ? 90 : null,
    lengthOfCutMm,
    fluteLengthMm,
    neckDiameterMm: isNecked ? hundredth(diameterMm * between(random, 0.92, 0.97)) : null,
    neckTaperHalfAngleDeg: isNecked && random() < 0.15 ? pick(random, [0.5, 1, 2]) : null,
    reachLengthMm,
    neckTransitionAngleDeg: isNecked && random() < 0.5 ? pick(random, [15, 30, 45]) : null,
    shankDiameterMm,
    overallLengthMm,
    fluteCount: pick(random, [2, 3, 4, 5, 6]),
    substrate: random() < 0.85 ? 'carbide' : 'hss',
  }
}

function cornerOf(random: Random, form: CutterForm, diameterMm: number): number | null {
  const radii = [0.1, 0.2, 0.3, 0.5, 0.8, 1, 1.5, 2, 2.5, 3, 4]
  const fitting = radii.filter((mm) => mm < 0.45 * diameterMm)
  if (form === 'cornerRadius') return fitting.length > 0 ? pick(random, fitting) : hundredth(0.1 * diameterMm)
  if (form !== 'tapered') return null
  return random() < 0.6 ? diameterMm / 2 : null
}

function holeTool(
  random: Random,
  form: 'drill' | 'reamer' | 'tap',
  diameterMm: number,
  size: number,
): CutterGeometry {
  const timesDiameter = form === 'drill' ? pick(random, [3, 5, 8, 12]) : pick(random, [2, 3, 4])
  const isJobber = random() < 0.4
  const lengthOfCutMm = to(diameterMm * (timesDiameter + 2), 0.5) + 1
  const fluteLengthMm = hundredth(lengthOfCutMm + 0.5 * diameterMm)
  const shankDiameterMm = isJobber ? diameterMm : shankFor(size, false)
  return {
    form,
    cuttingDiameterMm: diameterMm,
    pointAngleDeg: form === 'drill' ? pick(random, [118, 130, 135, 140]) : null,
    lengthOfCutMm,
    fluteLengthMm,
    shankDiameterMm,
    overallLengthMm: to(fluteLengthMm + Math.max(28, shankDiameterMm * 3) + pick(random, [4, 15, 30]), 1),
    substrate: isJobber ? 'hss' : 'carbide',
  }
}

interface Chuck {
  series: string
  nutMm: number
  nutLengthMm: number
  bodyMm: number
  boreDepthMm: number
  /** Smallest and largest shank of its collets, each in steps of a millimetre. */
  fromMm: number
  toMm: number
  colletLengthMm: number
}

const chucks: readonly Chuck[] = [
  {
    series: 'ER11',
    nutMm: 19,
    nutLengthMm: 11,
    bodyMm: 19,
    boreDepthMm: 45,
    fromMm: 1,
    toMm: 7,
    colletLengthMm: 18,
  },
  {
    series: 'ER16',
    nutMm: 28,
    nutLengthMm: 17,
    bodyMm: 26,
    boreDepthMm: 55,
    fromMm: 1,
    toMm: 10,
    colletLengthMm: 27.5,
  },
  {
    series: 'ER20',
    nutMm: 34,
    nutLengthMm: 19,
    bodyMm: 32,
    boreDepthMm: 65,
    fromMm: 1,
    toMm: 13,
    colletLengthMm: 31.5,
  },
  {
    series: 'ER25',
    nutMm: 42,
    nutLengthMm: 20,
    bodyMm: 40,
    boreDepthMm: 75,
    fromMm: 1,
    toMm: 16,
    colletLengthMm: 34,
  },
  {
    series: 'ER32',
    nutMm: 50,
    nutLengthMm: 22.5,
    bodyMm: 48,
    boreDepthMm: 85,
    fromMm: 2,
    toMm: 20,
    colletLengthMm: 40,
  },
  {
    series: 'ER40',
    nutMm: 63,
    nutLengthMm: 25.5,
    bodyMm: 60,
    boreDepthMm: 95,
    fromMm: 3,
    toMm: 26,
    colletLengthMm: 46,
  },
]

const tapers = ['BT40', 'BT30', 'HSK-A63', 'CAT40']

/** Every millimetre of every series, and the inch sizes. */
function colletSets(): SearchCollet['geometry'][] {
  return chucks.flatMap(({ series, fromMm, toMm, colletLengthMm }) => {
    const metric = Array.from({ length: toMm - fromMm + 1 }, (_, index) => fromMm + index)
    const ofInch = inchShanksMm.filter((mm) => mm > fromMm && mm <= toMm)
    return [
      ...metric.map((mm) => ({
        series,
        minimumMm: Math.max(0.5, mm - 1),
        maximumMm: mm,
        lengthMm: colletLengthMm,
      })),
      ...ofInch.map((mm) => ({ series, minimumMm: mm - 0.4, maximumMm: mm, lengthMm: colletLengthMm })),
    ]
  })
}

const segment = (
  part: HolderSegment['part'],
  lengthMm: number,
  noseDiameterMm: number,
  spindleDiameterMm: number,
) => ({
  part,
  lengthMm: hundredth(lengthMm),
  noseDiameterMm: hundredth(noseDiameterMm),
  spindleDiameterMm: hundredth(spindleDiameterMm),
})

function holderAt(random: Random, index: number): SearchHolder {
  const kind = random()
  const holder = kind < 0.5 ? colletChuck(random) : fixedHolder(random, kind)
  return { id: `H${index}`, taper: pick(random, tapers), ...holder }
}

function colletChuck(random: Random): Pick<SearchHolder, 'geometry' | 'bore'> {
  const { series, nutMm, nutLengthMm, bodyMm, boreDepthMm } = pick(random, chucks)
  const gaugeLengthMm = pick(random, [60, 70, 80, 100, 120, 150, 200])
  const bodyLengthMm = Math.max(10, gaugeLengthMm - nutLengthMm - between(random, 20, 35))
  return {
    bore: { kind: 'collet', series },
    geometry: {
      gaugeLengthMm,
      boreDepthMm: boreDepthMm + pick(random, [0, 0, 10]),
      spindleNoseDiameterMm: random() < 0.5 ? pick(random, [63, 88.9]) : null,
      segments: [
        segment('nut', nutLengthMm, nutMm - 4, nutMm),
        segment('holder', bodyLengthMm, bodyMm, bodyMm + between(random, 0, 6)),
        segment('holder', gaugeLengthMm - nutLengthMm - bodyLengthMm, 63, 63),
      ],
    },
  }
}

/** Shrink, hydraulic, side-lock. */
function fixedHolder(random: Random, kind: number): Pick<SearchHolder, 'geometry' | 'bore'> {
  const diameterMm = pick(random, random() < 0.7 ? metricShanksMm : inchShanksMm)
  const isSideLock = kind > 0.88
  const gaugeLengthMm = pick(random, [65, 80, 95, 120, 160])
  const noseMm = diameterMm * between(random, 1.5, 2) + 5
  const coneMm = gaugeLengthMm * between(random, 0.4, 0.6)
  return {
    bore: { kind: 'fixed', diameterMm },
    geometry: {
      gaugeLengthMm,
      boreDepthMm: 18 + diameterMm * 1.8,
      minimumGripMm: isSideLock ? null : 14 + diameterMm,
      sideLockInsertionMm: isSideLock ? 20 + diameterMm * 1.3 : null,
      spindleNoseDiameterMm: random() < 0.5 ? pick(random, [63, 88.9]) : null,
      segments: [
        segment('holder', coneMm, noseMm, noseMm + 2 * coneMm * Math.tan((4.5 * Math.PI) / 180)),
        segment('holder', gaugeLengthMm - coneMm - 20, noseMm + 14, noseMm + 16),
        segment('holder', 20, 63, 63),
      ],
    },
  }
}

function extensionAt(random: Random, index: number): SearchExtension {
  const isCollet = random() < 0.5
  const chuck = pick(random, chucks.slice(0, 3))
  const diameterMm = pick(random, [4, 6, 8, 10, 12])
  const noseMm = isCollet ? chuck.nutMm - 5 : diameterMm + pick(random, [6, 9, 12])
  const projectionMm = pick(random, [40, 60, 80, 100, 120])
  return {
    id: `E${index}`,
    bore: isCollet ? { kind: 'collet', series: chuck.series } : { kind: 'fixed', diameterMm },
    shankDiameterMm: random() < 0.2 ? null : pick(random, [12, 16, 20, 25]),
    geometry: {
      projectionMm,
      boreDepthMm: isCollet ? chuck.boreDepthMm : 18 + 1.8 * diameterMm,
      minimumGripMm: isCollet ? null : 14 + diameterMm,
      segments: [
        { lengthMm: 20, noseDiameterMm: noseMm, spindleDiameterMm: noseMm + 1 },
        { lengthMm: projectionMm - 20, noseDiameterMm: noseMm + 1, spindleDiameterMm: noseMm + 4 },
      ],
    },
  }
}
