import { type ChildProcess, spawn } from 'node:child_process'
import type { Knex } from 'knex'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { createMailSender } from '@/server/emails/mail-sender'
import { readMail } from '@/server/emails/read-mail'
import { addMember, setReorderPoint } from '../support/alerts'
import { type Books, createBooks, receive } from '../support/books'
import { soundCutter } from '../support/catalogue'
import { createTestDatabase, type TestDatabase } from '../support/database'
import {
  messageIdOf,
  type ScriptedMailServer,
  startScriptedMailServer,
} from '../support/scripted-mail-server'

let database: TestDatabase
let db: Knex
let books: Books
let server: ScriptedMailServer
let sendDueMail: typeof import('@/server/services/mail/send-due-mail').sendDueMail
let closeDb: () => Promise<void>

const from = 'Leadline <crib@leadline.example>'
const impatient = { connectionMs: 300, greetingMs: 300, silenceMs: 300 }

beforeAll(async () => {
  database = await createTestDatabase()
  db = database.db
  Object.assign(process.env, {
    DATABASE_URL: database.url,
    DATA_DIR: '.',
    SESSION_SECRET: 'a secret for tests that is long enough',
    LOG_LEVEL: 'silent',
    PUBLIC_URL: 'http://crib.leadline.example',
  })
  ;({ sendDueMail } = await import('@/server/services/mail/send-due-mail'))
  ;({ closeDb } = await import('@/server/db/connection'))
})
afterAll(async () => {
  await closeDb()
  await database.drop()
})

beforeEach(async () => {
  await db('outbox').delete()
  books = await createBooks(db)
  await addMember(db, books.cribId, books.userId)
  await receive(db, books, 5)
  server = await startScriptedMailServer()
})
afterEach(() => server.close())

const send = () => sendDueMail(createMailSender(server.url, from, impatient))
const outbox = () => db('outbox').orderBy('id')
/** The wait is over: what was put off is due. */
const later = () => db('outbox').whereNull('sent_at').update({ next_attempt_at: db.fn.now() })
const goLow = () => setReorderPoint(db, books, 5)

describe('a mail of the outbox', () => {
  it('arrives whole, once, and is noted as sent', async () => {
    await goLow()
    await send()
    await send()
    expect(server.received).toHaveLength(1)
    const [row] = await outbox()
    expect(row).toMatchObject({ attempts: 1, last_error: null })
    expect(row.sent_at).toBeInstanceOf(Date)
    const mail = await readMail(Buffer.from(server.received[0] ?? ''))
    const item = await db('items').where('id', books.itemId).first('code')
    expect(mail.messageId).toBe(row.message_id)
    expect(mail.subject).toContain(item.code)
    for (const said of [item.code, 'A1', `http://crib.leadline.example/cutters/${books.itemId}`]) {
      expect(mail.text).toContain(said)
      expect(mail.html).toContain(said)
    }
  })

  it('says what an item without a description is by its form and diameter', async () => {
    await db('cutters').insert({ item_id: books.itemId, ...soundCutter, cutting_diameter_mm: 6 })
    await goLow()
    await send()
    const mail = await readMail(Buffer.from(server.received[0] ?? ''))
    expect(mail.text).toContain(': Square end mill 6 mm\n')
  })

  it('goes to each member in a mail of its own', async () => {
    const [second] = await db('users')
      .insert({ email: `m-${books.itemId}@leadline.example`, name: 'Bea Holm', role: 'machinist' })
      .returning('id')
    await addMember(db, books.cribId, second.id)
    await goLow()
    await send()
    expect(server.received).toHaveLength(2)
    expect(new Set(server.received.map(messageIdOf)).size).toBe(2)
    const named = server.received.map((mail) => /^to:\s*(.+)$/im.exec(mail)?.[1]?.trim()).sort()
    expect(named).toEqual((await outbox()).map((row) => row.recipient).sort())
  })

  it.each([
    ['later', 'unharmed by a server that says not now', '451'],
    ['refuse', 'unharmed by a server that does not know the mailbox', '550'],
    ['refuseContent', 'unharmed by a server that turns the whole mail back', '554'],
  ] as const)('waits (%s), %s, and says why', async (behaviour, _, code) => {
    server.script(behaviour)
    await goLow()
    await send()
    const [row] = await outbox()
    expect(row).toMatchObject({ attempts: 1, sent_at: null })
    expect(row.last_error).toContain(code)
    expect(row.next_attempt_at.getTime()).toBeGreaterThan(Date.now() + 5000)
    await send()
    expect(server.connections).toBe(1)
    await later()
    await send()
    expect((await outbox())[0].sent_at).toBeInstanceOf(Date)
    expect(messageIdOf(server.received.at(-1) ?? '')).toBe(row.message_id)
  })

  it('is not held up by another that is refused', async () => {
    server.script('refuse')
    await addMember(db, books.secondCribId, books.userId)
    await goLow()
    await setReorderPoint(db, books, 0, { cribId: books.secondCribId })
    await send()
    expect((await outbox()).map((row) => row.sent_at !== null)).toEqual([false, true])
  })

  it.each(['stall', 'dropInTheMiddle'] as const)(
    'is tried again after a connection that fails (%s), and comes once',
    async (behaviour) => {
      server.script(behaviour)
      await goLow()
      await send()
      expect((await outbox())[0]).toMatchObject({ attempts: 1, sent_at: null })
      expect(server.received).toEqual([])
      await later()
      await send()
      await later()
      await send()
      expect(server.received).toHaveLength(1)
    },
  )

  it.each(['dropAfterDot', 'stallAfterDot'] as const)(
    'comes twice only after the last byte went and no answer came (%s), under one Message-ID',
    async (behaviour) => {
      server.script(behaviour)
      await goLow()
      await send()
      expect((await outbox())[0]).toMatchObject({ attempts: 1, sent_at: null })
      await later()
      await send()
      await later()
      await send()
      expect(server.received).toHaveLength(2)
      expect(new Set(server.received.map(messageIdOf)).size).toBe(1)
    },
  )

  it('outlasts a server that is away, and arrives when it is back', async () => {
    await server.close()
    await goLow()
    for (let tries = 0; tries < 3; tries += 1) {
      await send()
      await later()
    }
    expect((await outbox())[0]).toMatchObject({ attempts: 3, sent_at: null })
    server = await startScriptedMailServer(Number(new URL(server.url).port))
    await send()
    expect(server.received).toHaveLength(1)
    expect((await outbox())[0].sent_at).toBeInstanceOf(Date)
  })

  it('is sent once by three workers that look at the same moment', async () => {
    await addMember(db, books.secondCribId, books.userId)
    await goLow()
    await setReorderPoint(db, books, 0, { cribId: books.secondCribId })
    await Promise.all([send(), send(), send()])
    expect(server.received).toHaveLength(2)
    expect((await outbox()).every((row) => row.sent_at !== null)).toBe(true)
  })
})

describe('the worker', () => {
  let worker: ChildProcess | undefined

  const start = (settings: Record<string, string>) =>
    spawn(process.execPath, ['--conditions=react-server', '--import', 'tsx', 'src/server/worker.ts'], {
      env: { ...process.env, ...settings },
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

  async function until(condition: () => Promise<boolean> | boolean, what: string): Promise<void> {
    const end = Date.now() + 40_000
    while (!(await condition())) {
      if (Date.now() > end) throw new Error(`waited in vain: ${what}`)
      await new Promise((resolve) => setTimeout(resolve, 100))
    }
  }

  it('sends by itself; killed while a mail is on the wire, the next one sends it under the same Message-ID', async () => {
    const settings = { SMTP_URL: server.url, MAIL_FROM: from }
    server.script('stallAfterDot')
    await goLow()
    worker = start(settings)
    await until(() => server.received.length === 1, 'the mail is on the wire')
    await killed()
    expect((await outbox())[0]).toMatchObject({ attempts: 0, sent_at: null })
    worker = start(settings)
    await until(async () => (await outbox())[0].sent_at !== null, 'the mail is sent')
    expect(server.received).toHaveLength(2)
    expect(new Set(server.received.map(messageIdOf)).size).toBe(1)
  })

  it('catches mail itself where no server is set, and keeps it to be read', async () => {
    worker = start({ SMTP_URL: '', MAIL_FROM: '' })
    await goLow()
    await until(async () => (await outbox())[0].sent_at !== null, 'the mail is caught')
    const [row] = await outbox()
    const caught = await db('caught_mails').where('message_id', row.message_id)
    expect(caught).toHaveLength(1)
    expect(caught[0].recipients).toEqual([row.recipient])
    expect((await readMail(caught[0].source)).text).toContain('has fallen to its reorder point')
  })
})
