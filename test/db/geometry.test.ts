import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { createItem } from '../support/books'
import { createCollet, createCutter, createExtension, createHolder, soundCutter } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

type Change = Record<string, unknown>
const neck: Change = { neck_diameter_mm: 5.8, reach_length_mm: 30 }

describe('a cutter that can be', () => {
  test.each<[string, Change]>([
    ['a corner radius of half the diameter', { form: 'corner_radius', corner_radius_mm: 3 }],
    ['half an odd diameter, rounded up', { cutting_diameter_mm: 3.000000001, corner_radius_mm: 1.500000001 }],
    ['flutes as long as the length of cut', { flute_length_mm: 12 }],
    ['only a length of cut', { flute_length_mm: null }],
    ['only a flute length', { length_of_cut_mm: null }],
    [
      'cut, fluted and used over its whole length',
      { length_of_cut_mm: 60, flute_length_mm: 60, reach_length_mm: 60 },
    ],
    ['a neck as thick as the flutes', { ...neck, neck_diameter_mm: 6 }],
    ['a neck after the length of cut, where no flute length is given', { ...neck, flute_length_mm: null }],
    ['a usable length without a neck', { reach_length_mm: 10 }],
    ['a flat drill', { form: 'drill', point_angle_deg: 180 }],
  ])('it is taken: %s', async (_, change) => {
    await createCutter(database.db, change)
  })
})

describe('a cutter that cannot be', () => {
  test.each<[string, string, Change]>([
    ['no width', 'cutters_cutting_diameter_mm_check', { cutting_diameter_mm: 0 }],
    ['a length below zero', 'cutters_shank_diameter_mm_check', { shank_diameter_mm: -1 }],
    ['a length without end', 'cutters_overall_length_mm_check', { overall_length_mm: 'Infinity' }],
    ['a diameter that is no number', 'cutters_cutting_diameter_mm_check', { cutting_diameter_mm: 'NaN' }],
    ['a form nobody knows', 'cutters_form_check', { form: 'dovetail' }],
    [
      'a corner radius over half the diameter',
      'cutters_corner_radius_within_half_diameter',
      { corner_radius_mm: 3.001 },
    ],
    [
      'no length of cut at all',
      'cutters_length_of_cut_or_flute_length_given',
      { length_of_cut_mm: null, flute_length_mm: null },
    ],
    ['a length of cut over the flutes', 'cutters_length_of_cut_within_flutes', { length_of_cut_mm: 15.001 }],
    ['flutes over the whole', 'cutters_flutes_within_overall', { flute_length_mm: 60.001 }],
    [
      'a length of cut over the whole',
      'cutters_length_of_cut_within_overall',
      { length_of_cut_mm: 60.001, flute_length_mm: null },
    ],
    ['a usable length over the whole', 'cutters_reach_length_within_overall', { reach_length_mm: 60.001 }],
    ['a neck that ends where the flutes do', 'cutters_neck_beyond_flutes', { ...neck, reach_length_mm: 15 }],
    ['a neck of no length', 'cutters_neck_beyond_flutes', { neck_diameter_mm: 5.8 }],
    [
      'a neck that ends at the length of cut',
      'cutters_neck_beyond_flutes',
      { ...neck, flute_length_mm: null, reach_length_mm: 12 },
    ],
    ['a neck thicker than the flutes', 'cutters_neck_within_flutes', { ...neck, neck_diameter_mm: 6.001 }],
    ['a taper of no angle', 'cutters_taper_has_angle', { form: 'tapered' }],
    ['a taper lying flat', 'cutters_taper_half_angle_deg_check', { taper_half_angle_deg: 90 }],
    ['a point wider than flat', 'cutters_point_angle_deg_check', { point_angle_deg: 181 }],
    [
      'a tip wider than the whole',
      'cutters_tip_within_diameter',
      { form: 'chamfer', tip_diameter_mm: 6.001 },
    ],
    ['no flutes', 'cutters_flute_count_check', { flute_count: 0 }],
  ])('it is refused: %s', async (_, constraint, change) => {
    await expectRefusal(createCutter(database.db, change), '23514', constraint)
  })
})

/**
 * Diameters at the end of the flutes, worked by hand from the outlines of the forms. Tapered, half angle 5°, DC 2, LCF 10:
 * sharp 2 + 20·tan 5° = 3.749773; with RE = 1, 2·(cos 5° + (10 − (1 − sin 5°))·tan 5°) = 3.582436. A ball of 6 cut only 1
 * high is 2·√(3² − 2²) = 4.472136 wide there; a 90° drill of 6 cut 2 high is 4 wide; a chamfer mill with a tip of 1
 * and 90°, 2 high, is 5 wide.
 */
describe('the neck of a cutter that widens', () => {
  test.each<[string, number, Change]>([
    ['sharp taper', 3.749773, { form: 'tapered', taper_half_angle_deg: 5 }],
    ['tapered ball', 3.582436, { form: 'tapered', taper_half_angle_deg: 5, corner_radius_mm: 1 }],
    ['low ball', 4.472136, { form: 'ball', cutting_diameter_mm: 6, length_of_cut_mm: 1 }],
    ['low drill', 4, { form: 'drill', cutting_diameter_mm: 6, length_of_cut_mm: 2, point_angle_deg: 90 }],
    [
      'chamfer mill',
      5,
      {
        form: 'chamfer',
        cutting_diameter_mm: 6,
        length_of_cut_mm: 2,
        point_angle_deg: 90,
        tip_diameter_mm: 1,
      },
    ],
  ])('it may be as thick as the flutes are there and no thicker: %s', async (_, diameterMm, change) => {
    const widening = {
      cutting_diameter_mm: 2,
      flute_length_mm: 10,
      length_of_cut_mm: 10,
      reach_length_mm: 30,
    }
    await createCutter(database.db, { ...widening, ...change, neck_diameter_mm: diameterMm - 1e-6 })
    const thick = createCutter(database.db, { ...widening, ...change, neck_diameter_mm: diameterMm + 2e-6 })
    await expectRefusal(thick, '23514', 'cutters_neck_within_flutes')
  })
})

describe('what holds a cutter', () => {
  test.each<[string, Change]>([
    [
      'a side-lock',
      { bore_kind: 'fixed', bore_series: null, bore_diameter_mm: 6, side_lock_insertion_mm: 30 },
    ],
    ['a grip that fills the bore', { bore_depth_mm: 30, grip_start_mm: 10, minimum_grip_mm: 20 }],
  ])('a holder is taken: %s', async (_, change) => {
    await createHolder(database.db, change)
  })

  test.each<[string, string, Change]>([
    ['a bore of both kinds', 'holders_bore_is_collet_or_fixed', { bore_diameter_mm: 6 }],
    ['a bore of no size', 'holders_bore_is_collet_or_fixed', { bore_kind: 'fixed', bore_series: null }],
    ['a chuck of no series', 'holders_bore_is_collet_or_fixed', { bore_series: null }],
    [
      'a grip deeper than the bore',
      'holders_grip_within_bore',
      { bore_depth_mm: 29, grip_start_mm: 10, minimum_grip_mm: 20 },
    ],
    ['a side-lock on a collet', 'holders_side_lock_is_fixed', { side_lock_insertion_mm: 20 }],
    [
      'a flat deeper than the bore',
      'holders_side_lock_within_bore',
      {
        bore_kind: 'fixed',
        bore_series: null,
        bore_diameter_mm: 6,
        bore_depth_mm: 20,
        side_lock_insertion_mm: 21,
      },
    ],
    ['no gauge length', 'holders_gauge_length_mm_check', { gauge_length_mm: 0 }],
  ])('a holder is refused: %s', async (_, constraint, change) => {
    await expectRefusal(createHolder(database.db, change), '23514', constraint)
  })

  test.each<[string, string, Change]>([
    ['a range turned round', 'collets_minimum_within_maximum', { minimum_mm: 6.1 }],
    ['a grip longer than it is', 'collets_grip_within_length', { length_mm: 27, minimum_grip_mm: 28 }],
    ['no series', 'collets_series_check', { series: '' }],
  ])('a collet is refused: %s', async (_, constraint, change) => {
    await expectRefusal(createCollet(database.db, change), '23514', constraint)
  })

  test('a collet of a single size is taken', async () => {
    await createCollet(database.db, { minimum_mm: 6, maximum_mm: 6, length_mm: 27, minimum_grip_mm: 27 })
  })
})

describe('the segments of an outline', () => {
  const segments = (itemId: string, ...lengthsMm: number[]) =>
    lengthsMm.map((length, index) => ({
      item_id: itemId,
      position: index + 1,
      length_mm: length,
      nose_diameter_mm: 20,
      spindle_diameter_mm: 25,
    }))
  const asHolder = (rows: Change[]) => rows.map((row) => ({ ...row, part: 'holder' }))

  test('a holder’s are together no longer than its gauge length', async () => {
    const itemId = await createHolder(database.db)
    await database.db('holder_segments').insert(asHolder(segments(itemId, 20, 40)))
    const lengthened = database
      .db('holder_segments')
      .where({ item_id: itemId, position: 1 })
      .update({ length_mm: 21 })
    await expectRefusal(lengthened, '23514', 'holder_segments_within_gauge_length_mm')
    const shortened = database.db('holders').where('item_id', itemId).update({ gauge_length_mm: 59 })
    await expectRefusal(shortened, '23514', 'holder_segments_within_gauge_length_mm')
  })

  test('an extension’s are together no longer than its projection', async () => {
    const itemId = await createExtension(database.db)
    const long = database.db('extension_segments').insert(segments(itemId, 50, 31))
    await expectRefusal(long, '23514', 'extension_segments_within_projection_mm')
    await database.db('extension_segments').insert(segments(itemId, 50, 30))
  })

  test('they may be exchanged for others in one transaction, in any order', async () => {
    const itemId = await createHolder(database.db)
    await database.db('holder_segments').insert(asHolder(segments(itemId, 60)))
    await database.db.transaction(async (trx) => {
      await trx('holders').where('item_id', itemId).update({ gauge_length_mm: 40 })
      await trx('holder_segments').where('item_id', itemId).delete()
      await trx('holder_segments').insert(asHolder(segments(itemId, 40)))
    })
  })

  test('a sum of decimals that is a hair long is none too long', async () => {
    const itemId = await createHolder(database.db, { gauge_length_mm: 0.3 })
    await database.db('holder_segments').insert(asHolder(segments(itemId, 0.1, 0.2)))
  })
})

describe('an item and its geometry', () => {
  test('a cutter hangs on an item of that kind alone, and once', async () => {
    const itemId = await createItem(database.db, { code: 'A-HOLDER', kind: 'holder' })
    await expectRefusal(database.db('cutters').insert({ item_id: itemId, ...soundCutter }), '23503')
    const cutterId = await createCutter(database.db)
    await expectRefusal(
      database.db('cutters').insert({ item_id: cutterId, ...soundCutter }),
      '23505',
      'cutters_pkey',
    )
    await expectRefusal(database.db('items').where('id', cutterId).update({ kind: 'collet' }), '23503')
    await expectRefusal(database.db('items').where('id', cutterId).delete(), '23503')
  })
})

describe('flute_end_diameter_mm', () => {
  test('a straight form keeps its diameter however long its flutes are', async () => {
    for (const form of ['square', 'reamer', 'tap', 'face_mill', 'slotting', 'thread_mill']) {
      const sql = 'select flute_end_diameter_mm(?, 6, null, null, null, null, 12, 40) as mm'
      const { rows } = await database.db.raw(sql, [form])
      expect(rows).toEqual([{ mm: 6 }])
    }
  })
})
