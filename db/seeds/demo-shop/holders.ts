/** The chucks, collets and extensions of the demo shop. */

export interface Segment {
  part?: 'nut' | 'holder'
  length: number
  nose: number
  spindle: number
}

interface BorePlan {
  bore_kind: 'collet' | 'fixed'
  bore_series: string | null
  bore_diameter_mm: number | null
  bore_depth_mm: number
  minimum_grip_mm: number | null
}

export interface HolderPlan {
  code: string
  maker: string
  description: string
  unitCostMinor: number
  geometry: BorePlan & {
    taper: string
    gauge_length_mm: number
    side_lock_insertion_mm: number | null
    maximum_rpm: number
  }
  segments: Segment[]
}

export interface ColletPlan {
  code: string
  maker: string
  description: string
  unitCostMinor: number
  geometry: {
    series: string
    minimum_mm: number
    maximum_mm: number
    length_mm: number
    minimum_grip_mm: number | null
  }
}

export interface ExtensionPlan {
  code: string
  maker: string
  description: string
  unitCostMinor: number
  geometry: BorePlan & { projection_mm: number; shank_diameter_mm: number }
  segments: Segment[]
}

const makers = ['Arkwell', 'Pellmere'] as const

/**
 * ISO 15488 series: nut diameter and height, collet length, largest size. Nut and length figures are makers' catalogue
 * values, quoted from memory; they vary with the maker, so the demo shop's are the demo shop's.
 */
const series = {
  ER11: { nut: 19, nutHeight: 11.3, slimNut: 16, length: 18, largest: 7, depth: 42 },
  ER16: { nut: 28, nutHeight: 17, slimNut: 22, length: 27.5, largest: 10, depth: 55 },
  ER20: { nut: 34, nutHeight: 19, slimNut: 28, length: 31.5, largest: 13, depth: 60 },
  ER25: { nut: 42, nutHeight: 20, slimNut: 35, length: 34, largest: 16, depth: 65 },
  ER32: { nut: 50, nutHeight: 22.5, slimNut: 50, length: 40, largest: 20, depth: 72 },
  ER40: { nut: 63, nutHeight: 25.5, slimNut: 63, length: 46, largest: 26, depth: 80 },
} as const
type Series = keyof typeof series

/** Gauge line to the front of the flange, and its diameter: MAS 403 size 30; ASME B5.50 size 40. */
const tapers = {
  BT30: { flange: 46, flangeFront: 22, rpm: 24_000 },
  CAT40: { flange: 63.5, flangeFront: 19.05, rpm: 15_000 },
} as const
type Taper = keyof typeof tapers

/** Body between nut and flange, then the flange up to the gauge line. */
function bodySegments(
  taper: Taper,
  gaugeLength: number,
  noseLength: number,
  nose: number,
  root: number,
): Segment[] {
  const { flange, flangeFront } = tapers[taper]
  const body = Math.round((gaugeLength - noseLength - flangeFront) * 1e6) / 1e6
  return [
    { part: 'holder', length: body, nose, spindle: root },
    { part: 'holder', length: flangeFront, nose: flange, spindle: flange },
  ]
}

const chucks: readonly [Taper, Series, gaugeLength: number, isSlim: boolean][] = [
  ['BT30', 'ER11', 60, true],
  ['BT30', 'ER11', 100, true],
  ['BT30', 'ER16', 60, false],
  ['BT30', 'ER16', 70, true],
  ['BT30', 'ER16', 100, true],
  ['BT30', 'ER20', 60, false],
  ['BT30', 'ER20', 80, true],
  ['BT30', 'ER25', 60, false],
  ['BT30', 'ER32', 70, false],
  ['CAT40', 'ER11', 100, true],
  ['CAT40', 'ER16', 70, false],
  ['CAT40', 'ER16', 100, true],
  ['CAT40', 'ER16', 150, true],
  ['CAT40', 'ER20', 100, false],
  ['CAT40', 'ER25', 80, false],
  ['CAT40', 'ER25', 120, true],
  ['CAT40', 'ER32', 70, false],
  ['CAT40', 'ER32', 100, false],
  ['CAT40', 'ER40', 80, false],
]

function colletChucks(): HolderPlan[] {
  return chucks.map(([taper, name, gaugeLength, isSlim], index) => {
    const { nut, slimNut, nutHeight, depth } = series[name]
    const nutDiameter = isSlim ? slimNut : nut
    const root = Math.min(tapers[taper].flange - 2, nutDiameter + 6)
    return {
      code: `H-${String(index + 1).padStart(3, '0')}`,
      maker: makers[index % 2]!,
      description: `${taper} collet chuck ${name}${isSlim ? ', slim nut' : ''}, ${gaugeLength} mm`,
      unitCostMinor: 8900 + gaugeLength * 45 + (isSlim ? 2500 : 0),
      geometry: {
        taper,
        gauge_length_mm: gaugeLength,
        bore_kind: 'collet',
        bore_series: name,
        bore_diameter_mm: null,
        bore_depth_mm: depth,
        minimum_grip_mm: null,
        side_lock_insertion_mm: null,
        maximum_rpm: tapers[taper].rpm,
      },
      segments: [
        { part: 'nut', length: nutHeight, nose: nutDiameter, spindle: nutDiameter },
        ...bodySegments(taper, gaugeLength, nutHeight, nutDiameter, root),
      ],
    }
  })
}

/** Shrink and hydraulic chucks: bore depth and least grip by shank, makers' tables, quoted from memory. */
const fixedBores: readonly [
  kind: 'Shrink' | 'Hydraulic' | 'Side-lock',
  taper: Taper,
  bore: number,
  gaugeLength: number,
  nose: number,
  root: number,
  depth: number,
  grip: number,
  insertion: number | null,
][] = [
  ['Shrink', 'BT30', 3, 80, 10, 20, 32, 22, null],
  ['Shrink', 'BT30', 4, 80, 10, 20, 34, 24, null],
  ['Shrink', 'BT30', 6, 80, 21, 27, 36, 26, null],
  ['Shrink', 'BT30', 8, 80, 21, 27, 36, 26, null],
  ['Shrink', 'BT30', 10, 80, 24, 32, 42, 32, null],
  ['Shrink', 'BT30', 12, 80, 24, 32, 47, 37, null],
  ['Shrink', 'CAT40', 3.175, 100, 10, 22, 32, 22, null],
  ['Shrink', 'CAT40', 6.35, 100, 21, 27, 36, 26, null],
  ['Shrink', 'CAT40', 9.525, 100, 24, 32, 42, 32, null],
  ['Shrink', 'CAT40', 12.7, 100, 24, 32, 47, 37, null],
  ['Shrink', 'CAT40', 6, 120, 21, 27, 36, 26, null],
  ['Shrink', 'CAT40', 10, 120, 24, 32, 42, 32, null],
  ['Shrink', 'CAT40', 16, 120, 27, 34, 50, 40, null],
  ['Hydraulic', 'BT30', 12, 70, 32, 40, 46, 36, null],
  ['Hydraulic', 'CAT40', 12, 90, 32, 48, 46, 36, null],
  ['Hydraulic', 'CAT40', 20, 90, 38, 48, 51, 41, null],
  ['Side-lock', 'BT30', 16, 70, 40, 44, 52, 48, 48],
  ['Side-lock', 'CAT40', 12.7, 65, 28, 40, 50, 45, 45],
  ['Side-lock', 'CAT40', 19.05, 80, 44, 50, 55, 50, 50],
  ['Side-lock', 'CAT40', 20, 80, 44, 50, 55, 50, 50],
  ['Side-lock', 'CAT40', 25.4, 100, 52, 58, 62, 57, 57],
]

function fixedChucks(first: number): HolderPlan[] {
  return fixedBores.map(([kind, taper, bore, gaugeLength, nose, root, depth, grip, insertion], index) => ({
    code: `H-${String(first + index).padStart(3, '0')}`,
    maker: makers[(index + 1) % 2]!,
    description: `${taper} ${kind.toLowerCase()} chuck ${bore} mm, ${gaugeLength} mm`,
    unitCostMinor: (kind === 'Hydraulic' ? 28_900 : kind === 'Shrink' ? 14_900 : 7900) + gaugeLength * 30,
    geometry: {
      taper,
      gauge_length_mm: gaugeLength,
      bore_kind: 'fixed',
      bore_series: null,
      bore_diameter_mm: bore,
      bore_depth_mm: depth,
      minimum_grip_mm: grip,
      side_lock_insertion_mm: insertion,
      maximum_rpm: tapers[taper].rpm,
    },
    segments: bodySegments(taper, gaugeLength, 0, nose, root),
  }))
}

export function holderPlans(): HolderPlan[] {
  const first = colletChucks()
  return [...first, ...fixedChucks(first.length + 1)]
}

/** A collet closes by half a millimetre up to 3 mm, by one above, and is never opened beyond its size. */
function collapse(size: number): number {
  return size <= 3 ? 0.5 : 1
}

const colletSizes: Record<Exclude<Series, 'ER40'>, readonly number[]> = {
  ER11: [1, 2, 3, 4, 5, 6, 7],
  ER16: [1, 2, 3, 4, 5, 6, 7, 8, 9, 10],
  ER20: [2, 3, 4, 5, 6, 7, 8, 10, 12, 13],
  ER25: [2, 3, 4, 5, 6, 7, 8, 9, 10, 12, 13, 14, 16],
  ER32: [3, 4, 6, 7, 8, 9, 10, 11, 12, 13, 14, 16, 18, 20],
}

export function colletPlans(): ColletPlan[] {
  const metric = Object.entries(colletSizes).flatMap(([name, sizes]) =>
    sizes.map((size) => ({
      name: name as Series,
      low: size - collapse(size),
      high: size,
      label: `${size} mm`,
    })),
  )
  const inchSizes = [
    { name: 'ER16' as const, low: 3.175 - 0.5, high: 3.175, label: '1/8 in' },
    { name: 'ER16' as const, low: 6.35 - 1, high: 6.35, label: '1/4 in' },
    { name: 'ER25' as const, low: 12.7 - 1, high: 12.7, label: '1/2 in' },
    { name: 'ER40' as const, low: 19, high: 20, label: '20 mm' },
    { name: 'ER40' as const, low: 24.4, high: 25.4, label: '1 in' },
    { name: 'ER40' as const, low: 15, high: 16, label: '16 mm' },
  ]
  return [...metric, ...inchSizes].map(({ name, low, high, label }, index) => ({
    code: `C-${String(index + 1).padStart(3, '0')}`,
    maker: makers[index % 2]!,
    description: `Collet ${name}, ${label}`,
    unitCostMinor: 1800 + series[name].largest * 60,
    geometry: {
      series: name,
      minimum_mm: Math.round(low * 1e6) / 1e6,
      maximum_mm: high,
      length_mm: series[name].length,
      minimum_grip_mm: null,
    },
  }))
}

const extensions: readonly [Exclude<Series, 'ER20' | 'ER25' | 'ER32' | 'ER40'>, number, number][] = [
  ['ER11', 60, 16],
  ['ER11', 100, 16],
  ['ER11', 140, 16],
  ['ER16', 80, 22],
  ['ER16', 120, 22],
]

export function extensionPlans(): ExtensionPlan[] {
  return extensions.map(([name, projection, diameter], index) => ({
    code: `X-${String(index + 1).padStart(3, '0')}`,
    maker: makers[index % 2]!,
    description: `Collet extension ${name}, slim, ${projection} mm`,
    unitCostMinor: 6900 + projection * 25,
    geometry: {
      projection_mm: projection,
      shank_diameter_mm: name === 'ER11' ? 16 : 20,
      bore_kind: 'collet',
      bore_series: name,
      bore_diameter_mm: null,
      bore_depth_mm: Math.min(projection, series[name].depth),
      minimum_grip_mm: null,
    },
    segments: [
      { length: series[name].nutHeight, nose: diameter, spindle: diameter },
      { length: projection - series[name].nutHeight, nose: diameter - 1, spindle: diameter - 1 },
    ],
  }))
}
