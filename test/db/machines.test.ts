import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

const machine = (code: string) => ({
  code,
  name: `Mill ${code}`,
  taper: 'BT30',
  gauge_line_to_table_mm: 500,
  z_travel_mm: 400,
  maximum_rpm: 12_000,
})
const setUp = (machineId: string, name: string) => ({
  machine_id: machineId,
  name,
  highest_mm: 100,
  lowest_tip_mm: 20,
  retract_clearance_mm: 25,
})

async function addMachine(code: string): Promise<{ id: string; location_id: string }> {
  const [row] = await database.db('machines').insert(machine(code)).returning(['id', 'location_id'])
  return row
}

describe('a machine', () => {
  test('it has one place of its own, which follows its code and name', async () => {
    const { id, location_id } = await addMachine('M1')
    await database.db('machines').where({ id }).update({ code: 'M1b', name: 'Corner mill' })
    const place = await database.db('locations').where('id', location_id).first()
    expect(place).toMatchObject({ kind: 'machine', code: 'M1b', name: 'Corner mill', crib_id: null })
  })

  test('it takes over a place of its code that no machine has, in capitals or not', async () => {
    const [place] = await database
      .db('locations')
      .insert({ kind: 'machine', code: 'm2', name: 'Before' })
      .returning('id')
    expect((await addMachine('M2')).location_id).toBe(place.id)
    await expectRefusal(database.db('machines').insert(machine('m2')), '23505', 'locations_crib_id_code_idx')
  })

  test('it refuses sizes, speeds and efficiencies that cannot be', async () => {
    const refuse = (change: object, constraint: string) =>
      expectRefusal(database.db('machines').insert({ ...machine('M3'), ...change }), '23514', constraint)
    await refuse({ z_travel_mm: 0 }, 'machines_z_travel_mm_check')
    await refuse({ gauge_line_to_table_mm: 'Infinity' }, 'machines_gauge_line_to_table_mm_check')
    await refuse({ minimum_rpm: 12_001 }, 'machines_speeds_in_order')
    await refuse({ efficiency: 1.01 }, 'machines_efficiency_check')
  })

  test('a point of its curve gives power, torque or both', async () => {
    const { id } = await addMachine('M4')
    await database.db('machine_spindle_points').insert({ machine_id: id, rpm: 1500, torque_nm: 70 })
    await expectRefusal(
      database.db('machine_spindle_points').insert({ machine_id: id, rpm: 2000 }),
      '23514',
      'machine_spindle_points_give_something',
    )
    await expectRefusal(
      database.db('machine_spindle_points').insert({ machine_id: id, rpm: 1500, power_kw: 5 }),
      '23505',
      'machine_spindle_points_pkey',
    )
  })
})

describe('a set-up', () => {
  test('it has a rotary stock whole or not at all', async () => {
    const { id } = await addMachine('M5')
    const add = (change: object) => database.db('set_ups').insert({ ...setUp(id, 'Rotary'), ...change })
    await expectRefusal(add({ stock_width_mm: 40 }), '23514', 'set_ups_rotary_stock_whole')
    await expectRefusal(add({ part_diameter_mm: 40 }), '23514', 'set_ups_rotary_details_have_stock')
    await add({ stock_width_mm: 40, stock_height_mm: 40, axis_height_mm: 90, part_diameter_mm: 38 })
  })

  test('it stands on fixtures of the crib alone, and a changed height raises the fixture’s version', async () => {
    const { id } = await addMachine('M6')
    const [made] = await database.db('set_ups').insert(setUp(id, 'Vise')).returning('id')
    const [vise] = await database.db('items').insert({ kind: 'fixture', code: 'VISE' }).returning('id')
    await database.db('fixtures').insert({ item_id: vise.id, height_mm: 98 })
    const [pin] = await database.db('items').insert({ kind: 'accessory', code: 'PIN' }).returning('id')
    const stand = (itemId: string, position: number) =>
      database.db('set_up_fixtures').insert({ set_up_id: made.id, position, item_id: itemId, base_mm: 0 })
    await stand(vise.id, 1)
    await expectRefusal(stand(pin.id, 2), '23503', 'set_up_fixtures_item_id_item_kind_fkey')
    const before = await database.db('items').where('id', vise.id).first('version')
    await database.db('fixtures').where('item_id', vise.id).update({ height_mm: 99 })
    expect(await database.db('items').where('id', vise.id).first('version')).toEqual({
      version: before.version + 1,
    })
  })

  test('its name is one of a kind on its machine, in capitals or not', async () => {
    const { id } = await addMachine('M7')
    await database.db('set_ups').insert(setUp(id, 'Plate'))
    await expectRefusal(database.db('set_ups').insert(setUp(id, 'PLATE')), '23505', 'set_ups_name_idx')
  })
})

describe('what a shop sets about cutting', () => {
  test('care comes before the limit', async () => {
    await expectRefusal(
      database.db('shop_settings').where('id', 1).update({ stick_out_caution_ratio: 9 }),
      '23514',
      'shop_settings_stick_out_bands',
    )
  })
})
