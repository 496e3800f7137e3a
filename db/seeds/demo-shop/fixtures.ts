import type { Knex } from 'knex'
import type { People } from './people'
import type { Places } from './places'

const fixtures = [
  { code: 'F-VISE-125', maker: 'Pellmere', description: 'Vise, 125 mm jaws', heightMm: 98, quantity: 3 },
  { code: 'F-VISE-100', maker: 'Pellmere', description: 'Vise, 100 mm jaws', heightMm: 74, quantity: 2 },
  { code: 'F-PLATE-38', maker: 'Arkwell', description: 'Sub-plate, 1 1/2 in', heightMm: 38.1, quantity: 2 },
  {
    code: 'F-PLATE-25',
    maker: 'Arkwell',
    description: 'Pallet plate, 96 mm grid',
    heightMm: 25,
    quantity: 4,
  },
  {
    code: 'F-BLOCK-HEX',
    maker: 'Arkwell',
    description: 'Collet block, hexagon',
    heightMm: 50.8,
    quantity: 2,
  },
  { code: 'F-ANGLE-200', maker: 'Pellmere', description: 'Angle plate', heightMm: 200, quantity: 1 },
] as const
type FixtureCode = (typeof fixtures)[number]['code']

/** Fixtures of the main crib in a cabinet of their own; the answer is each one's id by its code. */
export async function loadFixtures(trx: Knex, places: Places, people: People): Promise<Map<string, string>> {
  const rows = await trx('items')
    .insert(fixtures.map(({ code, maker, description }) => ({ kind: 'fixture', code, maker, description })))
    .returning(['id', 'code'])
  const ids = new Map<string, string>(rows.map((row: { id: string; code: string }) => [row.code, row.id]))
  await trx('fixtures').insert(
    fixtures.map(({ code, heightMm }) => ({ item_id: ids.get(code), height_mm: heightMm })),
  )
  const root = await trx('locations').where({ kind: 'crib', crib_id: places.mainCribId }).first('id')
  const [shelf] = await trx('locations')
    .insert({
      ...{ kind: 'bin', code: 'F-01', name: 'Fixture shelf' },
      ...{ crib_id: places.mainCribId, parent_id: root.id },
    })
    .returning('id')
  await trx('movements').insert(
    fixtures.map(({ code, quantity }) => ({
      kind: 'receipt',
      item_id: ids.get(code),
      quantity,
      from_location_id: places.supplierId,
      from_condition: 'new',
      to_location_id: shelf.id,
      to_condition: 'new',
      actor_id: people.cribManagerId,
    })),
  )
  return ids
}

interface SetUpPlan {
  machine: string
  name: string
  note?: string
  heights: [highestMm: number, lowestTipMm: number, retractClearanceMm: number]
  rotary?: Record<string, number>
  fixtures?: [code: FixtureCode, baseMm: number][]
}

const setUps: SetUpPlan[] = [
  {
    machine: 'M1',
    name: 'Bar 50 in the rotary chuck',
    note: 'Turned bracket: the corners of the bar set the retract until it is round.',
    heights: [0, 150, 25],
    rotary: {
      stock_width_mm: 50,
      stock_height_mm: 50,
      axis_height_mm: 170,
      chuck_radius_mm: 62.5,
      part_diameter_mm: 48,
      centring_error_mm: 0.4,
    },
  },
  {
    machine: 'M1',
    name: 'Bar 80 by 60 between chuck and tailstock',
    heights: [0, 110, 25],
    rotary: {
      stock_width_mm: 80,
      stock_height_mm: 60,
      stock_offset_x_mm: 2,
      axis_height_mm: 140,
      chuck_radius_mm: 45,
    },
  },
  {
    machine: 'M1',
    name: 'Pallet plate, part 60 high',
    heights: [110, 50, 20],
    fixtures: [
      ['F-PLATE-25', 0],
      ['F-PLATE-25', 25],
    ],
  },
  { machine: 'M2', name: 'Vise on the table', heights: [140, 96, 25], fixtures: [['F-VISE-125', 0]] },
  {
    machine: 'M2',
    name: 'Vise on the sub-plate',
    heights: [175, 130, 25],
    fixtures: [
      ['F-PLATE-38', 0],
      ['F-VISE-125', 38.1],
    ],
  },
  {
    machine: 'M3',
    name: 'Tall casting on the table',
    note: 'Only stubby holders get over it.',
    heights: [330, 60, 25],
  },
  {
    machine: 'M3',
    name: 'Hexagon collet block in the vise',
    heights: [165, 120, 25],
    fixtures: [
      ['F-VISE-100', 0],
      ['F-BLOCK-HEX', 62],
    ],
  },
]

/** What the machines are set up for. */
export async function loadSetUps(trx: Knex, fixtureIds: Map<string, string>): Promise<void> {
  const machines: { id: string; code: string }[] = await trx('machines').select('id', 'code')
  for (const { machine, name, note = '', heights, rotary = {}, fixtures: standing = [] } of setUps) {
    const [highest_mm, lowest_tip_mm, retract_clearance_mm] = heights
    const [setUp] = await trx('set_ups')
      .insert({
        machine_id: machines.find(({ code }) => code === machine)?.id,
        ...{ name, note, highest_mm, lowest_tip_mm, retract_clearance_mm, ...rotary },
      })
      .returning('id')
    if (standing.length === 0) continue
    await trx('set_up_fixtures').insert(
      standing.map(([code, base_mm], index) => ({
        set_up_id: setUp.id,
        position: index + 1,
        item_id: fixtureIds.get(code),
        base_mm,
      })),
    )
  }
}
