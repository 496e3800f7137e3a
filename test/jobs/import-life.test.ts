import { type ChildProcess, spawn } from 'node:child_process'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { importLimits } from '@/schemas/import-limits'
import { createImportSite, type ImportSite, uploadRequest } from '../support/import-site'

let site: ImportSite
beforeAll(async () => {
  site = await createImportSite()
})
afterAll(() => site.close())

const head = 'code,form,dc,apmx,oal,dmm,description\n'

function manyCutters(prefix: string, count: number): string {
  const rows = Array.from({ length: count }, (_, at) => `${prefix}-${at},square,6,12,57,6,Number ${at}`)
  return head + rows.join('\n')
}

async function countItems(prefix: string): Promise<number> {
  const row = await site.db('items').where('code', 'like', `${prefix}-%`).count().first()
  return Number(row?.count)
}

async function until(condition: () => Promise<boolean>, what: string): Promise<void> {
  const end = Date.now() + 50_000
  while (!(await condition())) {
    if (Date.now() > end) throw new Error(`waited in vain: ${what}`)
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
}

async function waitingBackends(): Promise<number> {
  const row = await site
    .db('pg_stat_activity')
    .where('wait_event_type', 'Lock')
    .whereRaw('datname = current_database()')
    .count()
    .first()
  return Number(row?.count)
}

it('the database is told what was staged, so that it does not plan for a row where there are thousands', async () => {
  const { id: earlier } = await site.checked({ kind: 'cutters', content: manyCutters('PLA', 2_000) })
  // As autovacuum may have left it: it knows of the first file and of no other.
  await site.db.raw('analyze import_rows')
  const { id } = await site.checked({ kind: 'cutters', content: manyCutters('PLB', 3_000) })
  const { rows } = await site.db.raw(
    'explain (format json) select line from import_rows where import_id = ?',
    [id],
  )
  const expected = rows[0]['QUERY PLAN'][0].Plan['Plan Rows']
  expect(expected).toBeGreaterThan(1_500)
  expect(expected).toBeLessThan(6_000)
  // The next tests ask for a store without files.
  for (const staged of [earlier, id]) await site.cancel(staged)
})

describe('a cancel', () => {
  it('it leaves no row, no file and nothing in the catalogue', async () => {
    const { id } = await site.checked({ kind: 'cutters', content: manyCutters('LA', 3) })
    await site.cancel(id)
    expect(await site.get(id)).toMatchObject({ state: 'cancelled', added: 0, rejected: [] })
    expect(await site.db('import_rows').where('import_id', id)).toEqual([])
    expect(site.storedFiles()).toEqual([])
    expect(await countItems('LA')).toBe(0)
    await expect(site.commit(id)).rejects.toMatchObject({ code: 'import-not-ready' })
    await site.cancel(id)
  })

  it('it stops the reading of a file', async () => {
    const id = await site.upload({ kind: 'cutters', content: manyCutters('LB', 20_000) })
    const reading = site.check(id)
    await until(async () => (await site.get(id)).rowsRead > 0, 'the first rows')
    await site.cancel(id)
    await reading
    expect(await site.get(id)).toMatchObject({ state: 'cancelled' })
    expect(await site.db('import_rows').where('import_id', id)).toEqual([])
    expect(site.storedFiles()).toEqual([])
  })

  it('it undoes a commit that is under way, even one that waits', async () => {
    const { id } = await site.checked({ kind: 'cutters', content: manyCutters('LC', 2000) })
    await site.commit(id)
    // Somebody holds the catalogue, so the commit stands in the middle of its transaction.
    const blocker = await site.db.transaction()
    await blocker.raw('lock table cutters in access exclusive mode')
    try {
      const applying = site.apply(id)
      await until(async () => (await waitingBackends()) > 0, 'the commit to wait')
      await site.cancel(id)
      await applying
    } finally {
      await blocker.rollback()
    }
    expect(await site.get(id)).toMatchObject({ state: 'cancelled' })
    expect(await countItems('LC')).toBe(0)
    expect(await site.db('import_rows').where('import_id', id)).toEqual([])
    expect(await site.db('audit_entries').where('entity_id', id)).toEqual([])
  })

  it('it is refused once the import is committed', async () => {
    const { id } = await site.committed({ kind: 'cutters', content: manyCutters('LD', 2) })
    await expect(site.cancel(id)).rejects.toMatchObject({ code: 'import-already-committed' })
    await expect(site.commit(id)).rejects.toMatchObject({ code: 'import-already-committed' })
    expect(await countItems('LD')).toBe(2)
  })
})

describe('the check at the commit', () => {
  it('it keeps what somebody changed meanwhile where the file says nothing of it', async () => {
    await site.committed({ kind: 'cutters', content: manyCutters('LE', 1) })
    const { id } = await site.checked({ kind: 'cutters', content: 'code,oal\nLE-0,63\n' })
    await site.db('items').where('code', 'LE-0').update({ description: 'By hand' })
    await site.commit(id)
    await site.apply(id)
    expect(await site.get(id)).toMatchObject({ state: 'committed', changed: 1 })
    const row = await site.db('cutters').join('items', 'items.id', 'item_id').where('code', 'LE-0').first()
    expect(row).toMatchObject({ description: 'By hand', overall_length_mm: 63 })
  })

  it('it turns back what has become impossible, and changes nothing', async () => {
    await site.committed({ kind: 'cutters', content: manyCutters('LF', 2) })
    const { id } = await site.checked({ kind: 'cutters', content: 'code,apmx\nLF-0,50\nLF-1,13\n' })
    await site
      .db('cutters')
      .whereIn('item_id', site.db('items').where('code', 'LF-0').select('id'))
      .update({ overall_length_mm: 40 })
    await site.commit(id)
    await site.apply(id)
    const after = await site.get(id)
    expect(after).toMatchObject({ state: 'checked', changed: 1, rejectedCount: 1 })
    expect(after.message).toContain('The catalogue changed since this file was checked')
    const row = await site.db('cutters').join('items', 'items.id', 'item_id').where('code', 'LF-1').first()
    expect(row).toMatchObject({ length_of_cut_mm: 12 })
  })

  it('it makes a code that was added meanwhile a change, not a second item', async () => {
    const content = manyCutters('LG', 2)
    const [first, second] = [
      await site.checked({ kind: 'cutters', content }),
      await site.checked({ kind: 'cutters', content }),
    ]
    for (const { id } of [first, second]) await site.commit(id)
    await Promise.all([site.apply(first.id), site.apply(second.id)])
    const ends = [await site.get(first.id), await site.get(second.id)]
    expect(ends.map(({ state }) => state)).toEqual(['committed', 'committed'])
    expect(ends.map(({ added, unchanged }) => [added, unchanged]).sort()).toEqual([
      [0, 2],
      [2, 0],
    ])
    expect(await countItems('LG')).toBe(2)
  })
})

describe('a file that cannot be', () => {
  let waiting: string[]
  beforeEach(() => {
    waiting = site.storedFiles()
  })

  it.each([
    ['a workbook', Buffer.from('PK\x03\x04and more'), 'This is a workbook or a zip archive, not CSV.'],
    ['an image', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0, 0]), 'This is an image, not CSV.'],
    ['an empty file', Buffer.from(''), 'This file is empty.'],
    [
      '201 columns',
      Buffer.from(Array.from({ length: 201 }, (_, at) => `c${at}`).join(',')),
      'more than 200 columns',
    ],
  ])('it refuses %s at the upload and keeps no file', async (_, content, message) => {
    await expect(site.upload({ kind: 'cutters', content })).rejects.toMatchObject({
      code: 'impossible',
      detail: expect.stringContaining(message),
    })
    expect(site.storedFiles()).toEqual(waiting)
  })

  it('it refuses more than 50 MB while it arrives, and keeps no file', async () => {
    const { createImport } = await import('@/server/services/imports/create-import')
    const boundary = 'xxxxxxxx'
    const opening = `--${boundary}\r\ncontent-disposition: form-data; name="file"; filename="a.csv"\r\n\r\ncode\r\n`
    const piece = new TextEncoder().encode('x'.repeat(1_000_000))
    let sent = 0
    const body = new ReadableStream({
      start: (controller) => controller.enqueue(new TextEncoder().encode(opening)),
      pull: (controller) => {
        sent += piece.length
        controller.enqueue(piece)
        if (sent > 2 * importLimits.fileBytes) controller.close()
      },
    })
    const request = new Request('http://127.0.0.1/api/imports', {
      method: 'POST',
      body,
      headers: { 'content-type': `multipart/form-data; boundary=${boundary}` },
      duplex: 'half',
    } as RequestInit)
    await expect(createImport(site.actor, request)).rejects.toMatchObject({ code: 'too-large' })
    expect(sent).toBeLessThan(importLimits.fileBytes + 8_000_000)
    expect(site.storedFiles()).toEqual(waiting)
  })

  it('it refuses a form without a file or kind', async () => {
    const { createImport } = await import('@/server/services/imports/create-import')
    const empty = new FormData()
    empty.set('kind', 'cutters')
    const request = new Request('http://127.0.0.1/', { method: 'POST', body: empty })
    await expect(createImport(site.actor, request)).rejects.toMatchObject({ code: 'wrong-shape' })
    const noKind = uploadRequest({ kind: 'nonsense' as 'cutters', content: 'a\n1\n' })
    await expect(createImport(site.actor, noKind)).rejects.toMatchObject({ code: 'wrong-shape' })
    expect(site.storedFiles()).toEqual(waiting)
  })

  it('it rejects a row with a cell beyond 10,000 characters, and takes one at the limit', async () => {
    const row = (code: string, length: number) => `${code},square,6,12,57,6,${'x'.repeat(length)}\n`
    const content =
      head + row('LH-1', importLimits.cellCharacters) + row('LH-2', importLimits.cellCharacters + 1)
    const checked = await site.checked({ kind: 'cutters', content })
    expect(checked).toMatchObject({ added: 1, rejectedCount: 1 })
    expect(checked.rejected[0]).toMatchObject({ line: 3, column: 'description' })
  })

  it('it keeps a bare quote and warns, and rejects a quote that is never closed at its line', async () => {
    const content = `${head}LI-1,square,6,12,57,6,1/2" long\nLI-2,square,6,12,57,6,"open\nLI-3,square,6,12,57,6,x\n`
    const checked = await site.checked({ kind: 'cutters', content })
    expect(checked).toMatchObject({ added: 1, rejectedCount: 1, warningCount: 1, rows: 2 })
    expect(checked.warnings[0]).toMatchObject({ line: 2, column: 'description', value: '1/2" long' })
    expect(checked.rejected[0]).toMatchObject({ line: 3, column: 'description' })
  })

  it('it ends an import whose text is broken with the reason, and drops file and rows', async () => {
    const content = Buffer.concat([
      Buffer.from(`\ufeff${head}LJ-1,square,6,12,57,6,a\n`),
      Buffer.from([0xff, 0x41]),
    ])
    const ended = await site.checked({ kind: 'cutters', content })
    expect(ended).toMatchObject({ state: 'failed' })
    expect(ended.message).toContain('holds bytes that are not')
    expect(site.storedFiles()).toEqual(waiting)
  })
})

describe('the worker, a process of its own', () => {
  const running = new Set<ChildProcess>()
  afterEach(() => {
    for (const worker of running) worker.kill('SIGKILL')
    running.clear()
  })

  function startWorker(): ChildProcess {
    const argv = ['--conditions=react-server', '--import', 'tsx', 'src/server/worker.ts']
    const worker = spawn(process.execPath, argv, { env: process.env, stdio: 'ignore' })
    running.add(worker)
    return worker
  }

  it('it takes up what a killed worker left in the middle, reading and committing, and does it once', async () => {
    const id = await site.upload({ kind: 'cutters', content: manyCutters('LK', 8_000) })
    const first = startWorker()
    await until(async () => (await site.get(id)).rowsRead > 0, 'the first worker to read')
    first.kill('SIGKILL')
    expect(await site.get(id)).toMatchObject({ state: 'reading' })

    const second = startWorker()
    await until(async () => (await site.get(id)).state === 'checked', 'the second worker to finish')
    expect(await site.get(id)).toMatchObject({ rows: 8_000, rowsRead: 8_000, added: 8_000 })
    // Somebody holds the cutters, so the worker dies with half of its transaction done.
    const blocker = await site.db.transaction()
    try {
      await blocker.raw('lock table cutters in access exclusive mode')
      await site.commit(id)
      await until(async () => (await waitingBackends()) > 0, 'the commit to be under way')
      second.kill('SIGKILL')
    } finally {
      await blocker.rollback()
    }
    await until(async () => (await waitingBackends()) === 0, 'what the dead worker had begun to be undone')
    expect(await countItems('LK')).toBe(0)
    expect(await site.get(id)).toMatchObject({ state: 'committing' })

    startWorker()
    await until(async () => (await site.get(id)).state === 'committed', 'the third worker to commit')
    expect(await countItems('LK')).toBe(8_000)
    expect(await site.db('audit_entries').where({ entity: 'import', entity_id: id })).toHaveLength(1)
  }, 180_000)
})
