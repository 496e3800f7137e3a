/** The cutters of the demo shop: invented makers and numbers, sizes as shops own them. */

import { randomFrom } from './random'

export interface CutterPlan {
  code: string
  maker: string
  description: string
  unitCostMinor: number
  /** How often it is taken from the drawer, relative to the others. */
  use: number
  isInch: boolean
  geometry: Record<string, string | number | null>
}

const inch = 25.4
/** Lengths are kept to 1e-9 mm. */
const mm = (value: number) => Math.round(value * 1e9) / 1e9
const inches = (value: number) => mm(value * inch)

const fractionNames: Record<number, string> = {
  0.0625: '1/16',
  0.09375: '3/32',
  0.125: '1/8',
  0.15625: '5/32',
  0.1875: '3/16',
  0.25: '1/4',
  0.3125: '5/16',
  0.375: '3/8',
  0.5: '1/2',
  0.625: '5/8',
  0.75: '3/4',
  1: '1',
}
const inchName = (size: number) => `${fractionNames[size] ?? size} in`

interface Body {
  form: string
  dc: number
  shank: number
  oal: number
  apmx: number
  lcf?: number
  flutes: number
  substrate?: 'carbide' | 'hss'
  re?: number
  taperDeg?: number
  pointDeg?: number
  tip?: number
  neck?: number
  reach?: number
  rpm?: number
}

function geometryOf(body: Body): CutterPlan['geometry'] {
  return {
    form: body.form,
    cutting_diameter_mm: mm(body.dc),
    corner_radius_mm: body.re === undefined ? null : mm(body.re),
    taper_half_angle_deg: body.taperDeg ?? null,
    point_angle_deg: body.pointDeg ?? null,
    tip_diameter_mm: body.tip === undefined ? null : mm(body.tip),
    length_of_cut_mm: mm(body.apmx),
    flute_length_mm: body.lcf === undefined ? null : mm(body.lcf),
    neck_diameter_mm: body.neck === undefined ? null : mm(body.neck),
    reach_length_mm: body.reach === undefined ? null : mm(body.reach),
    shank_diameter_mm: mm(body.shank),
    overall_length_mm: mm(body.oal),
    flute_count: body.flutes,
    substrate: body.substrate ?? 'carbide',
    maximum_rpm: body.rpm ?? null,
  }
}

const makerSeed = 4711
const makers = ['Corvane', 'Hallbeck', 'Nordvane', 'Brightmoor'] as const

/** Gives each family its own run of codes, and every cutter a maker, a cost and a share of the use. */
class Drawer {
  readonly plans: CutterPlan[] = []
  private readonly counts = new Map<string, number>()
  private readonly random = randomFrom(makerSeed)

  add(prefix: string, description: string, body: Body, options: { isInch: boolean; use?: number }): void {
    const count = (this.counts.get(prefix) ?? 0) + 1
    this.counts.set(prefix, count)
    const { dc, oal, substrate } = body
    const cost = 900 + dc * dc * 28 + dc * oal * 5 + (body.neck ? 1400 : 0) + (body.re ? 500 : 0)
    this.plans.push({
      code: `${prefix}-${String(count).padStart(3, '0')}`,
      maker: this.random.pick(makers),
      description,
      unitCostMinor: Math.round((cost * (substrate === 'hss' ? 0.45 : 1)) / 5) * 5,
      use: options.use ?? 1,
      isInch: options.isInch,
      geometry: geometryOf(body),
    })
  }
}

/** Shank that a metric carbide cutter of this size comes on (DIN 6535 sizes). */
const metricShank = (dc: number) => [3, 4, 6, 8, 10, 12, 16, 20].find((size) => size >= dc) ?? 20
const smallMetricShank = (dc: number) => (dc <= 6 ? 6 : metricShank(dc))
const inchShank = (dc: number) =>
  [0.125, 0.1875, 0.25, 0.3125, 0.375, 0.5, 0.625, 0.75, 1].find((size) => size >= dc) ?? 1

function addSquare(drawer: Drawer): void {
  for (const dc of [0.0625, 0.09375, 0.125, 0.15625, 0.1875, 0.25, 0.3125, 0.375, 0.5, 0.625, 0.75, 1]) {
    const shank = inchShank(dc)
    const apmx = dc < 0.5 ? dc * 3 : dc * 2
    drawer.add(
      'S',
      `Square end mill ${inchName(dc)}, 4 flutes`,
      {
        form: 'square',
        dc: inches(dc),
        shank: inches(shank),
        apmx: inches(dc === 0.125 ? 0.5 : apmx),
        oal: inches(dc <= 0.1875 ? 1.5 + (dc > 0.125 ? 0.5 : 0) : 2 + dc * 2),
        flutes: 4,
      },
      { isInch: true, use: dc === 0.25 || dc === 0.5 ? 4 : 2 },
    )
  }
  for (const dc of [0.25, 0.375, 0.5, 0.75]) {
    drawer.add(
      'S',
      `Square end mill ${inchName(dc)}, 3 flutes, long`,
      {
        form: 'square',
        dc: inches(dc),
        shank: inches(dc),
        apmx: inches(dc * 4),
        oal: inches(3 + dc * 3),
        flutes: 3,
      },
      { isInch: true },
    )
  }
  for (const dc of [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10, 12, 16, 20]) {
    const shank = smallMetricShank(dc)
    drawer.add(
      'S',
      `Square end mill ${dc} mm, 4 flutes`,
      {
        form: 'square',
        dc,
        shank,
        apmx: dc < 6 ? dc * 2.5 : dc * 2.2,
        lcf: shank === dc ? dc * 2.2 + dc * 0.5 : undefined,
        oal: dc < 6 ? 57 : { 6: 57, 8: 63, 10: 72, 12: 83, 16: 92, 20: 104 }[dc]!,
        flutes: 4,
      } as Body,
      { isInch: false, use: dc === 6 || dc === 10 ? 5 : 2 },
    )
  }
  for (const dc of [3, 6, 8, 10, 12, 16]) {
    drawer.add(
      'S',
      `Square end mill ${dc} mm, 4 flutes, long`,
      {
        form: 'square',
        dc,
        shank: smallMetricShank(dc),
        apmx: dc * 4,
        oal: 60 + dc * 5,
        flutes: 4,
      },
      { isInch: false },
    )
  }
}

function addForAluminium(drawer: Drawer): void {
  for (const dc of [3, 4, 5, 6, 8, 10, 12, 16]) {
    drawer.add(
      'S',
      `Square end mill ${dc} mm, 3 flutes, for aluminium`,
      {
        form: 'square',
        dc,
        shank: smallMetricShank(dc),
        apmx: dc * 3,
        oal: dc <= 6 ? 64 : 48 + dc * 4,
        flutes: 3,
      },
      { isInch: false, use: 3 },
    )
  }
  for (const dc of [0.125, 0.1875, 0.25, 0.375, 0.5]) {
    drawer.add(
      'S',
      `Square end mill ${inchName(dc)}, 2 flutes, stub`,
      {
        form: 'square',
        dc: inches(dc),
        shank: inches(inchShank(dc)),
        apmx: inches(dc * 1.5),
        oal: inches(dc <= 0.1875 ? 1.5 : 1.5 + dc * 2),
        flutes: 2,
      },
      { isInch: true, use: 1.5 },
    )
  }
}

function addNecked(drawer: Drawer): void {
  for (const [dc, times] of [
    [0.0625, 8],
    [0.09375, 8],
    [0.125, 12],
    [0.1875, 8],
    [0.25, 5],
    [0.25, 8],
    [0.375, 5],
    [0.5, 5],
  ] as const) {
    drawer.add(
      'N',
      `Square end mill ${inchName(dc)}, 4 flutes, neck ${times}×D`,
      {
        form: 'square',
        dc: inches(dc),
        shank: inches(inchShank(dc)),
        apmx: inches(dc * 2),
        neck: inches(dc * 0.945),
        reach: inches(dc * times),
        oal: inches(dc <= 0.125 ? 3 : 2.5 + dc * times),
        flutes: 4,
      },
      { isInch: true, use: 0.8 },
    )
  }
  for (const [dc, times] of [
    [1, 10],
    [2, 8],
    [3, 5],
    [3, 10],
    [4, 8],
    [6, 5],
    [6, 8],
    [8, 5],
    [10, 5],
    [12, 5],
  ] as const) {
    const shank = smallMetricShank(dc)
    drawer.add(
      'N',
      `Square end mill ${dc} mm, 4 flutes, neck ${times}×D`,
      {
        form: 'square',
        dc,
        shank,
        apmx: dc * 1.5,
        neck: dc * 0.95,
        reach: dc * times,
        oal: Math.max(57, dc * times + 42),
        flutes: 4,
      },
      { isInch: false, use: 0.8 },
    )
  }
}

function addCorner(drawer: Drawer): void {
  for (const [dc, re] of [
    [3, 0.3],
    [4, 0.5],
    [6, 0.5],
    [6, 1],
    [8, 0.5],
    [8, 1],
    [10, 0.5],
    [10, 1],
    [10, 2],
    [12, 1],
    [12, 2],
    [16, 2],
    [5, 0.3],
    [20, 3],
  ] as const) {
    drawer.add(
      'R',
      `Corner radius end mill ${dc} mm R${re}, 4 flutes`,
      {
        form: 'corner_radius',
        dc,
        re,
        shank: smallMetricShank(dc),
        apmx: dc * 2,
        oal: 50 + dc * 3,
        flutes: 4,
      },
      { isInch: false, use: 2 },
    )
  }
  for (const [dc, re] of [
    [0.25, 0.015],
    [0.25, 0.03],
    [0.375, 0.03],
    [0.5, 0.03],
    [0.5, 0.06],
    [0.75, 0.125],
  ] as const) {
    drawer.add(
      'R',
      `Corner radius end mill ${inchName(dc)} R${re}, 4 flutes`,
      {
        form: 'corner_radius',
        dc: inches(dc),
        re: inches(re),
        shank: inches(dc),
        apmx: inches(dc * 2.5),
        oal: inches(2 + dc * 3),
        flutes: 4,
      },
      { isInch: true, use: 1.5 },
    )
  }
  for (const [dc, re, times] of [
    [4, 0.5, 8],
    [6, 0.5, 6],
    [8, 1, 6],
    [10, 1, 5],
  ] as const) {
    drawer.add(
      'R',
      `Corner radius end mill ${dc} mm R${re}, 4 flutes, neck ${times}×D`,
      {
        form: 'corner_radius',
        dc,
        re,
        shank: smallMetricShank(dc),
        apmx: dc * 1.5,
        neck: dc * 0.95,
        reach: dc * times,
        oal: dc * times + 45,
        flutes: 4,
      },
      { isInch: false },
    )
  }
}

function addBall(drawer: Drawer): void {
  for (const dc of [1, 2, 3, 4, 5, 6, 8, 10, 12, 16]) {
    drawer.add(
      'B',
      `Ball end mill ${dc} mm, 2 flutes`,
      {
        form: 'ball',
        dc,
        re: dc / 2,
        shank: smallMetricShank(dc),
        apmx: dc * 2,
        oal: dc === 6 ? 80 : 52 + dc * 3,
        flutes: 2,
      },
      { isInch: false, use: 2 },
    )
  }
  for (const dc of [0.0625, 0.125, 0.1875, 0.25, 0.375, 0.5]) {
    drawer.add(
      'B',
      `Ball end mill ${inchName(dc)}, 2 flutes`,
      {
        form: 'ball',
        dc: inches(dc),
        re: inches(dc) / 2,
        shank: inches(inchShank(dc)),
        apmx: inches(dc * 2),
        oal: inches(dc < 0.25 ? 2 : 3),
        flutes: 2,
      },
      { isInch: true },
    )
  }
  for (const [dc, times] of [
    [2, 10],
    [3, 10],
    [4, 8],
    [6, 8],
    [8, 6],
    [10, 5],
  ] as const) {
    drawer.add(
      'B',
      `Ball end mill ${dc} mm, 2 flutes, neck ${times}×D`,
      {
        form: 'ball',
        dc,
        re: dc / 2,
        shank: 6,
        apmx: dc * 1.2,
        neck: dc * 0.94,
        reach: dc * times,
        oal: Math.max(70, dc * times + 45),
        flutes: 2,
      },
      { isInch: false },
    )
  }
}

function addTapered(drawer: Drawer): void {
  for (const [dc, half] of [
    [1, 1],
    [1, 3],
    [2, 1],
    [2, 3],
    [3, 3],
  ] as const) {
    drawer.add(
      'T',
      `Tapered ball end mill ${dc} mm, ${half}° a side, 3 flutes`,
      {
        form: 'tapered',
        dc,
        re: dc / 2,
        taperDeg: half,
        shank: 6,
        apmx: 20,
        oal: 75,
        flutes: 3,
      },
      { isInch: false, use: 0.6 },
    )
  }
  for (const [dc, half] of [
    [3, 5],
    [4, 10],
  ] as const) {
    drawer.add(
      'T',
      `Tapered end mill ${dc} mm, ${half}° a side, 3 flutes`,
      {
        form: 'tapered',
        dc,
        taperDeg: half,
        shank: 8,
        apmx: 10,
        oal: 63,
        flutes: 3,
      },
      { isInch: false, use: 0.4 },
    )
  }
}

/** Numbered sizes by the ASME B94.11M table: inches. */
const gaugeDrills = [
  ['#7', 0.201],
  ['#21', 0.159],
  ['#29', 0.136],
  ['#36', 0.1065],
  ['F', 0.257],
  ['Q', 0.332],
] as const

function addHoleTools(drawer: Drawer): void {
  for (const dc of [1, 1.25, 1.6, 2, 2.5, 3, 3.3, 4, 4.2, 5, 6, 6.6, 6.8, 7, 8.5, 9, 10.2, 11, 12]) {
    drawer.add(
      'D',
      `Drill ${dc} mm, 140° point`,
      {
        form: 'drill',
        dc,
        pointDeg: 140,
        shank: dc <= 2 ? 3 : smallMetricShank(dc),
        apmx: dc * 5.5,
        oal: Math.max(45, dc * 5.5 + 40),
        flutes: 2,
      },
      { isInch: false, use: 3 },
    )
  }
  for (const dc of [3, 5, 8]) {
    drawer.add(
      'D',
      `Deep-hole drill ${dc} mm, 135° point, 12×D`,
      {
        form: 'drill',
        dc,
        pointDeg: 135,
        shank: smallMetricShank(dc),
        apmx: dc * 13.5,
        oal: dc * 13.5 + 45,
        flutes: 2,
      },
      { isInch: false, use: 0.5 },
    )
  }
  for (const [name, dc] of gaugeDrills) {
    drawer.add(
      'D',
      `Drill ${name} (${dc} in), 118° point, jobber`,
      {
        form: 'drill',
        dc: inches(dc),
        pointDeg: 118,
        shank: inches(dc),
        apmx: inches(dc * 12),
        oal: inches(dc * 12 + 1.25),
        flutes: 2,
        substrate: 'hss',
      },
      { isInch: true, use: 2 },
    )
  }
  for (const dc of [3, 4, 5, 6, 8, 10]) {
    drawer.add(
      'M',
      `Reamer ${dc} mm H7`,
      {
        form: 'reamer',
        dc,
        shank: dc,
        apmx: dc * 3,
        oal: 50 + dc * 6,
        flutes: 6,
      },
      { isInch: false, use: 0.5 },
    )
  }
  for (const [name, dc, shank, apmx] of [
    ['M3', 3, 3.5, 11],
    ['M4', 4, 4.5, 13],
    ['M5', 5, 6, 15],
    ['M6', 6, 6, 17],
    ['M8', 8, 8, 20],
    ['M10', 10, 10, 22],
  ] as const) {
    drawer.add(
      'G',
      `Tap ${name}, spiral flute`,
      {
        form: 'tap',
        dc,
        shank,
        apmx,
        oal: 46 + dc * 5,
        flutes: 3,
        substrate: 'hss',
      },
      { isInch: false, use: 2 },
    )
  }
  for (const [name, dc, shank, apmx] of [
    ['4-40', 0.112, 0.141, 0.42],
    ['8-32', 0.164, 0.168, 0.5],
    ['10-32', 0.19, 0.194, 0.6],
    ['1/4-20', 0.25, 0.255, 0.75],
  ] as const) {
    drawer.add(
      'G',
      `Tap ${name}, spiral point`,
      {
        form: 'tap',
        dc: inches(dc),
        shank: inches(shank),
        apmx: inches(apmx),
        oal: inches(1.8 + dc * 3),
        flutes: 2,
        substrate: 'hss',
      },
      { isInch: true, use: 1.5 },
    )
  }
}

function addOthers(drawer: Drawer): void {
  for (const [dc, shank, flutes] of [
    [32, 20, 3],
    [40, 20, 4],
    [50, 20, 5],
  ] as const) {
    drawer.add(
      'F',
      `Face mill ${dc} mm, indexable, ${flutes} inserts`,
      {
        form: 'face_mill',
        dc,
        shank,
        apmx: 6,
        lcf: 6,
        neck: dc * 0.72,
        reach: 40,
        oal: 110,
        flutes,
        rpm: 12_000,
      },
      { isInch: false, use: 0.4 },
    )
  }
  for (const [dc, width, shank] of [
    [12, 3, 6],
    [16, 4, 8],
    [20, 5, 10],
  ] as const) {
    drawer.add(
      'L',
      `T-slot cutter ${dc} mm × ${width} mm`,
      {
        form: 'slotting',
        dc,
        shank,
        apmx: width,
        lcf: width,
        neck: dc * 0.45,
        reach: 20,
        oal: 70,
        flutes: 6,
      },
      { isInch: false, use: 0.2 },
    )
  }
  for (const [name, dc, apmx] of [
    ['M3', 2.35, 6.5],
    ['M4', 3.1, 9],
    ['M6', 4.7, 13],
    ['M8', 6.2, 17],
  ] as const) {
    drawer.add(
      'P',
      `Thread mill ${name}, 2×D`,
      {
        form: 'thread_mill',
        dc,
        shank: dc <= 6 ? 6 : 8,
        apmx,
        oal: 58,
        flutes: 3,
      },
      { isInch: false, use: 0.7 },
    )
  }
  for (const [dc, angle] of [
    [6, 90],
    [8, 90],
    [10, 90],
    [12, 90],
    [6, 60],
    [10, 60],
  ] as const) {
    const tip = 0.5
    const height = (dc - tip) / 2 / Math.tan((angle / 2) * (Math.PI / 180))
    drawer.add(
      'V',
      `Chamfer mill ${dc} mm, ${angle}°`,
      {
        form: 'chamfer',
        dc,
        tip,
        pointDeg: angle,
        shank: dc,
        apmx: Math.round(height * 1000) / 1000 + 0.5,
        oal: 50 + dc * 2,
        flutes: 4,
      },
      { isInch: false, use: 2 },
    )
  }
  drawer.add(
    'V',
    `Chamfer mill ${inchName(0.25)}, 90°`,
    {
      form: 'chamfer',
      dc: inches(0.25),
      tip: inches(0.02),
      pointDeg: 90,
      shank: inches(0.25),
      apmx: inches(0.135),
      oal: inches(2.5),
      flutes: 4,
    },
    { isInch: true, use: 2 },
  )
}

/** Every cutter of the shop, always the same. */
export function cutterPlans(): CutterPlan[] {
  const drawer = new Drawer()
  addSquare(drawer)
  addForAluminium(drawer)
  addNecked(drawer)
  addCorner(drawer)
  addBall(drawer)
  addTapered(drawer)
  addHoleTools(drawer)
  addOthers(drawer)
  return drawer.plans
}
