import { type ChildProcess, spawn } from 'node:child_process'
import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { Role } from '@/core/policies/permissions'
import type { AssemblyResponse } from '@/schemas/assembly'
import { type Books, createBooks, post } from '../support/books'
import { createCollet, createCutter, createHolder } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'

let database: TestDatabase
let db: Knex
let books: Books
let services: Awaited<ReturnType<typeof importServices>>
let actor: { id: string; role: Role; locationId: string }
let items: { cutterId: string; holderId: string; colletId: string }
let assembly: AssemblyResponse

async function importServices() {
  const { keepAssembly } = await import('@/server/services/assemblies/keep-assembly')
  const { buildAssembly } = await import('@/server/services/assemblies/build-assembly')
  const { getAssembly } = await import('@/server/services/assemblies/read-assembly')
  const { recheckDueAssemblies } = await import('@/server/services/assemblies/recheck-due-assemblies')
  const { closeDb } = await import('@/server/db/connection')
  return { keepAssembly, buildAssembly, getAssembly, recheckDueAssemblies, closeDb }
}

beforeAll(async () => {
  database = await createTestDatabase()
  db = database.db
  Object.assign(process.env, {
    DATABASE_URL: database.url,
    DATA_DIR: '.',
    SESSION_SECRET: 'a secret for tests that is long enough',
    LOG_LEVEL: 'silent',
  })
  services = await importServices()
})
afterAll(async () => {
  await services.closeDb()
  await database.drop()
})

/** A 6 mm end mill of 12 mm length of cut on a 5.5 neck to 30 mm, kept for a wall 25 deep. */
beforeEach(async () => {
  books = await createBooks(db)
  actor = { id: books.userId, role: 'machinist', locationId: books.personId }
  items = {
    cutterId: await createCutter(db, {
      flute_length_mm: 12,
      neck_diameter_mm: 5.5,
      reach_length_mm: 30,
      overall_length_mm: 80,
    }),
    holderId: await createHolder(db, { bore_depth_mm: 60 }),
    colletId: await createCollet(db, { minimum_grip_mm: 15 }),
  }
  await db('holder_segments').insert({
    item_id: items.holderId,
    position: 1,
    part: 'nut',
    length_mm: 18,
    nose_diameter_mm: 28,
    spindle_diameter_mm: 28,
  })
  for (const itemId of Object.values(items))
    await post(db, books, { kind: 'receipt', itemId, quantity: 2, from: books.supplierId, to: books.binId })
  assembly = await keep()
})

const asActor = () => actor as Parameters<typeof services.keepAssembly>[0]
const keep = () =>
  services.keepAssembly(asActor(), {
    feature: { kind: 'wall', depthMm: 25 },
    cutter: { id: items.cutterId },
    holder: { id: items.holderId },
    collet: { id: items.colletId },
  })
const build = (kept: AssemblyResponse) =>
  services.buildAssembly(
    asActor(),
    kept.id,
    {
      version: kept.version,
      parts: (['cutter', 'collet', 'holder'] as const).map((kind) => ({
        kind,
        fromLocationId: books.binId,
        condition: 'new' as const,
      })),
    },
    { key: randomUUID(), route: `build ${kept.id}`, bodyHash: 'x' },
  )
const now = (id = assembly.id) => services.getAssembly(id)
const due = () => db('assembly_rechecks').select('id')
const shortenNeck = (on: Knex = db, reachLengthMm = 20) =>
  on('cutters').where('item_id', items.cutterId).update({ reach_length_mm: reachLengthMm })
const findings = (id = assembly.id) => db('assembly_findings').where('assembly_id', id).orderBy('id')

describe('the worker', () => {
  it('marks what no longer holds, with what changed before and after', async () => {
    await shortenNeck()
    expect(await now()).toMatchObject({ isMarked: false, isBeingRechecked: true })
    await services.recheckDueAssemblies()
    expect(await now()).toMatchObject({
      isMarked: true,
      isBeingRechecked: false,
      checks: [{ holds: false, keptAnswer: { verdict: 'reaches' }, answer: { verdict: 'short' } }],
      findings: [
        { isFault: true, detail: { code: 'checkFails', answer: { verdict: 'short' } } },
        {
          isFault: false,
          detail: {
            code: 'sizesChanged',
            part: 'cutter',
            changes: [{ field: 'reachLengthMm', before: 30, after: 20 }],
          },
        },
      ],
    })
    expect(await due()).toEqual([])
    const entries = await db('audit_entries').where({ action: 'assembly-marked', entity_id: assembly.id })
    expect(entries).toMatchObject([{ actor_id: null }])
  })

  it('comes twice to one change and finds nothing new the second time', async () => {
    await shortenNeck()
    await services.recheckDueAssemblies()
    const before = await findings()
    await db('assembly_rechecks').insert({ assembly_id: assembly.id })
    await services.recheckDueAssemblies()
    expect(await findings()).toEqual(before)
    expect(
      await db('audit_entries').where({ action: 'assembly-marked', entity_id: assembly.id }),
    ).toHaveLength(1)
  })

  it('takes the mark away when the size is put right again', async () => {
    await shortenNeck()
    await services.recheckDueAssemblies()
    await shortenNeck(db, 30)
    await services.recheckDueAssemblies()
    expect(await now()).toMatchObject({ isMarked: false, findings: [], checks: [{ holds: true }] })
    expect((await findings()).every((row) => row.resolved_at !== null)).toBe(true)
  })

  it('loses nothing that changed while it was down', async () => {
    await build(assembly)
    await shortenNeck()
    const { holderId: itemId } = items
    await post(db, books, { kind: 'scrap', itemId, from: books.personId, to: books.scrapId })
    await services.recheckDueAssemblies()
    const marked = await now()
    expect(marked.findings.map(({ detail }) => detail.code).sort()).toEqual([
      'checkFails',
      'partGone',
      'sizesChanged',
    ])
    expect(marked.findings.find(({ detail }) => detail.code === 'partGone')).toMatchObject({
      movement: { kind: 'scrap', actorName: 'Ada Kern', toName: 'Scrap' },
    })
  })

  it('looks once more at what changes while it looks', async () => {
    await shortenNeck()
    const other = await db.transaction()
    await shortenNeck(other, 18)
    await services.recheckDueAssemblies()
    await other.commit()
    expect(await due()).toHaveLength(1)
    await services.recheckDueAssemblies()
    const changed = (await now()).findings.find(({ detail }) => detail.code === 'sizesChanged')
    expect(changed?.detail).toMatchObject({ changes: [{ after: 18 }] })
  })

  it('does the same work once, however many workers look at the same moment', async () => {
    await shortenNeck()
    await Promise.all([
      services.recheckDueAssemblies(),
      services.recheckDueAssemblies(),
      services.recheckDueAssemblies(),
    ])
    expect(await findings()).toHaveLength(2)
  })

  it('leaves an assembly it cannot look at for later, and goes on with the others', async () => {
    const second = await keep()
    await db('assembly_parts')
      .where({ assembly_id: assembly.id, kind: 'holder' })
      .update({ geometry: JSON.stringify(null) })
    await shortenNeck()
    await services.recheckDueAssemblies()
    expect(await now(second.id)).toMatchObject({ isMarked: true })
    expect(await db('assembly_rechecks').where('assembly_id', assembly.id)).toHaveLength(1)
    await db('assembly_rechecks').delete()
  })

  it('marks both of two assemblies that take one heap for theirs, when one part of it goes', async () => {
    const second = await keep()
    await build(assembly)
    await build(second)
    const { colletId: itemId } = items
    await post(db, books, { kind: 'return', itemId, from: books.personId, to: books.binId })
    await services.recheckDueAssemblies()
    for (const { id } of [assembly, second])
      expect((await now(id)).findings).toMatchObject([
        { detail: { code: 'partGone', part: 'collet', held: 1, claimed: 2 } },
      ])
  })

  it('marks a piece that was reground by what its control has noted', async () => {
    const [piece] = await db('pieces').insert({ item_id: items.cutterId, tag: randomUUID() }).returning('id')
    const own = await services.keepAssembly(asActor(), {
      feature: { kind: 'wall', depthMm: 25 },
      cutter: { pieceId: piece.id },
      holder: { id: items.holderId },
      collet: { id: items.colletId },
    })
    await db('pieces').where('id', piece.id).update({ cutting_diameter_mm: 5.8, regrind_count: 1 })
    await services.recheckDueAssemblies()
    expect(await now()).toMatchObject({ isMarked: false })
    expect((await now(own.id)).findings).toMatchObject([
      { isFault: true, detail: { code: 'offsetChanged', offset: 'diameter', beforeMm: 6, afterMm: 5.8 } },
      { isFault: false, detail: { code: 'sizesChanged' } },
    ])
  })

  it('has an assembly that is kept while a size changes looked at with the new size', async () => {
    const changing = await db.transaction()
    await shortenNeck(changing, 18)
    const keeping = keep().catch((error: Error) => error)
    await new Promise((resolve) => setTimeout(resolve, 200))
    await changing.commit()
    expect(await keeping).toBeInstanceOf(Error)
  })
})

describe('the process of the worker', () => {
  let worker: ChildProcess | undefined

  const start = () =>
    spawn(process.execPath, ['--conditions=react-server', '--import', 'tsx', 'src/server/worker.ts'], {
      env: { ...process.env, SMTP_URL: '', MAIL_FROM: '' },
      stdio: 'ignore',
    })
  const killed = async () => {
    const running = worker
    worker = undefined
    if (!running || running.exitCode !== null || running.signalCode !== null) return
    const gone = new Promise((resolve) => running.once('exit', resolve))
    running.kill('SIGKILL')
    await gone
  }
  afterEach(killed)

  async function until(condition: () => Promise<boolean>, what: string): Promise<void> {
    const end = Date.now() + 40_000
    while (!(await condition())) {
      if (Date.now() > end) throw new Error(`waited in vain: ${what}`)
      await new Promise((resolve) => setTimeout(resolve, 100))
    }
  }

  /** Some transaction waits for a lock: the worker has begun and cannot end. */
  const isHeldUp = async () => {
    const { rows } = await db.raw(
      "select 1 from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'",
    )
    return rows.length > 0
  }

  it('is killed in the middle of a look, and the next one looks from the start', async () => {
    const holding = await db.transaction()
    await holding('assembly_checks').where('assembly_id', assembly.id).forUpdate().select('id')
    await shortenNeck()
    worker = start()
    await until(isHeldUp, 'the worker is in the middle of it')
    await killed()
    await holding.rollback()
    expect(await findings()).toEqual([])
    expect(await due()).toHaveLength(1)
    worker = start()
    await until(async () => (await due()).length === 0, 'the assembly is looked at')
    expect(await now()).toMatchObject({ isMarked: true, checks: [{ holds: false }] })
  })
})
