import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { createCrib, createItem, createPerson } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { expectRefusal } from '../support/refusal'

let database: TestDatabase

beforeAll(async () => {
  database = await createTestDatabase()
})
afterAll(() => database.drop())

describe('a person', () => {
  test('their e-mail address stands once, in capitals or not', async () => {
    await createPerson(database.db, 'ada@leadline.example')
    await expectRefusal(createPerson(database.db, 'ADA@leadline.example'), '23505', 'users_email_idx')
  })

  test('their role is one of four', async () => {
    const owner = { email: 'owner@leadline.example', name: 'Owner', role: 'owner' }
    await expectRefusal(database.db('users').insert(owner), '23514', 'users_role_check')
  })

  test('their version rises with a change and not without one', async () => {
    const id = await createPerson(database.db, 'version@leadline.example')
    const person = () => database.db('users').where({ id })
    await person().update({ role: 'machinist' })
    expect(await person().first('version')).toEqual({ version: 1 })
    await person().update({ role: 'estimator' })
    expect(await person().first('version')).toEqual({ version: 2 })
  })
})

describe('a crib', () => {
  test('it is in a time zone that exists', async () => {
    const nowhere = { code: 'NOWHERE', name: 'Nowhere', time_zone: 'Europe/Nowhere' }
    await expectRefusal(database.db('cribs').insert(nowhere), '22023')
  })

  test('its code stands once', async () => {
    await createCrib(database.db, 'ONCE')
    await expectRefusal(createCrib(database.db, 'once'), '23505', 'cribs_code_idx')
  })
})

describe('a token', () => {
  const token = { token_hash: 'a', expires_at: new Date() }

  test('only the one for setting the shop up belongs to nobody', async () => {
    const userId = await createPerson(database.db, 'token@leadline.example')
    const named = { ...token, purpose: 'setup', user_id: userId }
    await expectRefusal(database.db('user_tokens').insert(named), '23514', 'user_tokens_setup_has_no_user')
    const nameless = { ...token, purpose: 'invitation' }
    await expectRefusal(database.db('user_tokens').insert(nameless), '23514', 'user_tokens_setup_has_no_user')
    await database.db('user_tokens').insert({ ...token, purpose: 'setup' })
  })
})

describe('the settings of the shop', () => {
  test('they are one row, there from the start, which stays', async () => {
    const rows = await database.db('shop_settings').select('id', 'shank_clearance_mm', 'holder_clearance_mm')
    expect(rows).toEqual([{ id: 1, shank_clearance_mm: 0.025, holder_clearance_mm: 0.5 }])
    await expectRefusal(database.db('shop_settings').insert({ id: 2 }), '23514', 'shop_settings_id_check')
    await expectRefusal(database.db('shop_settings').delete(), 'LL001')
  })

  test('they refuse what no shop can mean', async () => {
    const settings = () => database.db('shop_settings')
    await expectRefusal(settings().update({ currency: 'euro' }), '23514', 'shop_settings_currency_check')
    await expectRefusal(
      settings().update({ stick_out_step_mm: 0 }),
      '23514',
      'shop_settings_stick_out_step_mm_check',
    )
    await expectRefusal(
      settings().update({ flute_stiffness_ratio: 1.1 }),
      '23514',
      'shop_settings_flute_stiffness_ratio_check',
    )
  })
})

describe('the audit', () => {
  test('it is only ever added to', async () => {
    const entry = { action: 'cutter-changed', entity: 'item', entity_id: '1', before: '{}', after: '{"a":1}' }
    await database.db('audit_entries').insert(entry)
    await expectRefusal(database.db('audit_entries').update({ action: 'nothing' }), 'LL001')
    await expectRefusal(database.db('audit_entries').delete(), 'LL001')
    await expectRefusal(database.db.raw('truncate audit_entries'), 'LL001')
    expect(await database.db('audit_entries').select('action', 'after')).toEqual([
      { action: 'cutter-changed', after: { a: 1 } },
    ])
  })
})

describe('an idempotency key', () => {
  test('it stands once for a person and a route, and a second call waits for the first', async () => {
    const userId = await createPerson(database.db, 'key@leadline.example')
    const key = { actor_id: userId, route: 'POST /api/movements', key: 'k1', body_hash: 'h' }
    const first = await database.db.transaction()
    await first('idempotency_keys').insert({ ...key, status: 201, answer: '{"id":"1"}' })
    const second = expectRefusal(
      database.db('idempotency_keys').insert(key),
      '23505',
      'idempotency_keys_pkey',
    )
    await first.commit()
    await second
    await database.db('idempotency_keys').insert({ ...key, route: 'POST /api/imports' })
  })

  test('it keeps only answers that went well', async () => {
    const userId = await createPerson(database.db, 'well@leadline.example')
    const key = { actor_id: userId, route: 'r', key: 'k', body_hash: 'h', status: 409, answer: '{}' }
    await expectRefusal(database.db('idempotency_keys').insert(key), '23514', 'idempotency_keys_status_check')
  })
})

describe('a reorder point', () => {
  test('it is at most what is ordered up to, and stands once for an item and crib', async () => {
    const own = {
      item_id: await createItem(database.db, { code: 'R' }),
      crib_id: await createCrib(database.db, 'R'),
    }
    const points = () => database.db('reorder_points')
    await expectRefusal(
      points().insert({ ...own, reorder_point: 5, order_up_to: 4 }),
      '23514',
      'reorder_points_point_within_order_up_to',
    )
    await points().insert({ ...own, reorder_point: 4, order_up_to: 9 })
    await expectRefusal(points().insert({ ...own, reorder_point: 1, order_up_to: 2 }), '23505')
  })
})
