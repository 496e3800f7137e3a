import fc from 'fast-check'
import type { Knex } from 'knex'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { databaseErrorCode } from '@/server/db/database-errors'
import { ledgerFaults } from '@/server/db/ledger-faults'
import { type Books, createBooks, createItem, createPlaceApart, type Posting, post } from '../support/books'
import { createTestDatabase, type TestDatabase } from '../support/database'
import { NaiveLedger, type NaiveMovement, type NaivePlace } from '../support/naive-ledger'

const conditions = ['new', 'used', 'reground', 'worn']

let database: TestDatabase
let books: Books
let places: Map<string, NaivePlace>
let ways: { kind: string; from: string; to: string }[]

beforeAll(async () => {
  database = await createTestDatabase()
  books = await createBooks(database.db)
  const machine = await createPlaceApart(database.db, 'machine', 'M1')
  const transit = await createPlaceApart(database.db, 'in_transit', 'T1')
  const inside = { isOutside: false, binOfCrib: null }
  const outside = { isOutside: true, binOfCrib: null }
  const bin = { isOutside: false, binOfCrib: books.cribId }
  places = new Map<string, NaivePlace>([
    [books.supplierId, outside],
    [books.scrapId, outside],
    [books.countAdjustmentId, outside],
    [books.binId, bin],
    [books.secondBinId, bin],
    [books.farBinId, { isOutside: false, binOfCrib: books.secondCribId }],
    [books.personId, inside],
    [machine, inside],
    [transit, inside],
  ])
  ways = [
    { kind: 'receipt', from: books.supplierId, to: books.binId },
    { kind: 'adjustment', from: books.countAdjustmentId, to: books.secondBinId },
    { kind: 'adjustment', from: books.binId, to: books.countAdjustmentId },
    { kind: 'issue', from: books.binId, to: books.personId },
    { kind: 'issue', from: books.secondBinId, to: machine },
    { kind: 'return', from: books.personId, to: books.binId },
    { kind: 'return', from: machine, to: books.binId },
    { kind: 'relocation', from: books.binId, to: books.secondBinId },
    { kind: 'transfer', from: books.binId, to: transit },
    { kind: 'transfer', from: transit, to: books.farBinId },
    { kind: 'scrap', from: books.personId, to: books.scrapId },
    { kind: 'scrap', from: books.binId, to: books.scrapId },
  ]
})
afterAll(() => database.drop())

interface Step {
  way: number
  item: number
  quantity: number
  fromCondition: string
  toCondition: string
}
type Command = { post: Step[] } | { reverse: number }

const condition = fc.oneof({ weight: 4, arbitrary: fc.constant('new') }, fc.constantFrom(...conditions))
const step: fc.Arbitrary<Step> = fc.record({
  way: fc.nat(11),
  item: fc.nat(1),
  quantity: fc.integer({ min: 1, max: 4 }),
  fromCondition: condition,
  toCondition: condition,
})
const commands: fc.Arbitrary<Command[]> = fc.array(
  fc.oneof(
    { weight: 5, arbitrary: fc.record({ post: fc.array(step, { minLength: 1, maxLength: 5 }) }) },
    { weight: 2, arbitrary: fc.record({ reverse: fc.nat(8) }) },
  ),
  { minLength: 5, maxLength: 25 },
)

/** Something of everything to begin with; else most of what follows would find nothing there. */
const openingStock: Step[] = [0, 1].flatMap((item) =>
  conditions.flatMap((kept) =>
    [0, 1].map((way) => ({ way, item, quantity: 4, fromCondition: kept, toCondition: kept })),
  ),
)

const counts = { posted: 0, short: 0, reversed: 0, refused: 0 }

/** One run: the same commands to the database and to the naive ledger, which must agree after each of them. */
class Run {
  private readonly naive = new NaiveLedger(places)
  private readonly posted: {
    id: string
    movement: NaiveMovement
    isReversal: boolean
    isReversed: boolean
  }[] = []

  constructor(
    private readonly trx: Knex.Transaction,
    private readonly items: string[],
  ) {}

  async obey(command: Command): Promise<void> {
    if ('post' in command) await this.postSteps(command.post)
    else await this.reverse(command.reverse)
  }

  private async postSteps(steps: Step[]): Promise<void> {
    const postings = steps.map((one): Posting & NaiveMovement => {
      const item = this.items[one.item] ?? ''
      const way = ways[one.way]
      if (!way) throw new Error('no such way')
      return { ...one, ...way, itemId: item, item }
    })
    const outcome = await this.tried(postings)
    const isTaken = this.naive.post(postings)
    expect(outcome.code).toBe(isTaken ? null : 'LL014')
    counts[isTaken ? 'posted' : 'short'] += 1
    outcome.ids.forEach((id, index) => {
      const movement = postings[index]
      if (movement) this.posted.push({ id, movement, isReversal: false, isReversed: false })
    })
  }

  private async reverse(which: number): Promise<void> {
    const target = this.posted[which % Math.max(1, this.posted.length)]
    if (!target) return
    const { item, quantity, from, fromCondition, to, toCondition } = target.movement
    const movement = {
      item,
      quantity,
      from: to,
      fromCondition: toCondition,
      to: from,
      toCondition: fromCondition,
    }
    const outcome = await this.tried([{ ...movement, kind: 'reversal', itemId: item, reversesId: target.id }])
    if (target.isReversal || target.isReversed) {
      expect(outcome.code).toBe(target.isReversed ? '23505' : 'LL011')
      counts.refused += 1
      return
    }
    const isTaken = this.naive.post([movement])
    expect(outcome.code).toBe(isTaken ? null : 'LL014')
    if (!isTaken) return
    counts.reversed += 1
    target.isReversed = true
    this.posted.push({ id: outcome.ids[0] ?? '', movement, isReversal: true, isReversed: false })
  }

  private async tried(postings: Posting[]): Promise<{ ids: string[]; code: string | null }> {
    try {
      return {
        ids: await this.trx.transaction((savepoint) => post(savepoint, books, ...postings)),
        code: null,
      }
    } catch (error) {
      return { ids: [], code: databaseErrorCode(error) ?? String(error) }
    }
  }

  async compare(): Promise<void> {
    const balances = await this.trx('balances').whereIn('item_id', this.items)
    for (const item of this.items) {
      for (const place of places.keys()) {
        for (const kept of conditions) {
          const row = balances.find(
            (one) => one.item_id === item && one.location_id === place && one.condition === kept,
          )
          expect(row?.quantity ?? 0).toBe(this.naive.balance(item, place, kept))
        }
      }
    }
    const levels = await this.trx('stock_levels').whereIn('item_id', this.items)
    for (const level of levels) expect(level.on_hand).toBe(this.naive.onHand(level.item_id, level.crib_id))
  }
}

test('it keeps the same books as a naive ledger, whatever is posted and reversed', async () => {
  let serial = 0
  const property = fc.asyncProperty(commands, async (sequence) => {
    const trx = await database.db.transaction()
    try {
      serial += 1
      const items = [
        await createItem(trx, { code: `M-${serial}-1` }),
        await createItem(trx, { code: `M-${serial}-2` }),
      ]
      const run = new Run(trx, items)
      await run.obey({ post: openingStock })
      for (const command of sequence) await run.obey(command)
      await run.compare()
      expect((await ledgerFaults(trx)).faults).toEqual([])
    } finally {
      await trx.rollback()
    }
  })
  await fc.assert(property, { numRuns: 60 })
  for (const [what, count] of Object.entries(counts)) expect(count, what).toBeGreaterThan(5)
})

test('it takes twenty thousand movements in one statement, into tables that the planner takes for empty', async () => {
  await database.db.raw('vacuum analyze')
  const itemId = await createItem(database.db, { code: 'MANY' })
  await post(database.db, books, {
    kind: 'receipt',
    itemId,
    quantity: 10_000,
    from: books.supplierId,
    to: books.binId,
  })
  await database.db.raw(
    `insert into movements
       (kind, item_id, quantity, from_location_id, from_condition, to_location_id, to_condition, actor_id)
     select way.kind, :itemId::bigint, 1, way.source, 'new', way.target, 'new', :userId::bigint
     from generate_series(1, 20001) as n
     join (values ('issue', 1, :binId::bigint, :personId::bigint), ('return', 0, :personId::bigint, :binId::bigint))
       as way (kind, odd, source, target) on way.odd = n % 2
     order by n`,
    { itemId, userId: books.userId, binId: books.binId, personId: books.personId },
  )
  const inHand = await database
    .db('balances')
    .where({ item_id: itemId, location_id: books.personId })
    .first('quantity')
  expect(inHand).toEqual({ quantity: 1 })
  expect((await ledgerFaults(database.db)).faults).toEqual([])
})
