import { randomUUID } from 'node:crypto'
import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { type AnswerBody, type ApiClient, allRows, faultPaths, signedInAs } from '../support/api'
import { siteDatabase } from '../support/api-stock'
import {
  type AssemblyRows,
  buildAssembly,
  createAssemblyRows,
  createMachine,
  keepAssembly,
  untilRechecked,
} from '../support/kept-assemblies'

let db: Knex
let crib: ApiClient
let machinist: ApiClient
let estimator: ApiClient
let rows: AssemblyRows

beforeAll(async () => {
  db = siteDatabase()
  ;[crib, machinist, estimator] = await Promise.all([
    signedInAs('cribManager'),
    signedInAs('machinist'),
    signedInAs('estimator'),
  ])
})
afterAll(() => db.destroy())
beforeEach(async () => {
  rows = await createAssemblyRows(db, crib)
})

const kept = async (change: Record<string, unknown> = {}) =>
  (await keepAssembly(machinist, rows, change)).body
const built = async (change: Record<string, unknown> = {}, build: Record<string, unknown> = {}) =>
  (await buildAssembly(machinist, rows, await kept(change), build)).body
const read = async (id: string) => (await machinist.get(`/api/assemblies/${id}`)).body
const act = (who: ApiClient, assembly: AnswerBody, what: string, body: Record<string, unknown>) =>
  who.post(`/api/assemblies/${assembly.id}/${what}`, { version: assembly.version, ...body }, randomUUID())
const balances = async (itemId: string) => {
  const { body } = await crib.get(`/api/items/${itemId}/stock`)
  return (body.balances as { locationId: string; condition: string; quantity: number }[]).map(
    ({ locationId, condition, quantity }) => ({ locationId, condition, quantity }),
  )
}
const inBin = (quantity: number, condition = 'new') => ({ locationId: rows.shelf.binId, condition, quantity })
const backToBin = ['cutter', 'collet', 'holder'].map((kind) => ({
  kind,
  outcome: 'return',
  condition: 'used',
}))

describe('an option that is kept', () => {
  it('has a number, the stick-out it needs and the gauge length to expect', async () => {
    const answer = await keepAssembly(machinist, rows, { name: ' Deep pocket ', toolNumber: 12 })
    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({
      name: 'Deep pocket',
      state: 'planned',
      stickOutMm: 39.5,
      gaugeLengthMm: 139.5,
      toolNumber: 12,
      isMarked: false,
      place: null,
      checks: [{ holds: true, feature: { kind: 'wall', depthMm: 25 } }],
      parts: [{ kind: 'cutter' }, { kind: 'collet' }, { kind: 'holder' }],
    })
    expect((await kept()).number).not.toBe(answer.body.number)
  })

  it('is refused where it does not reach, with how much is missing', async () => {
    const answer = await keepAssembly(machinist, rows, {
      stickOutMm: 39.5,
      feature: { kind: 'wall', depthMm: 45 },
    })
    expect([answer.status, faultPaths(answer)]).toEqual([422, ['stickOutMm']])
    expect(String(answer.body.detail)).toContain('short of 45 mm')
  })

  it('is refused without the collet of its chuck, of an archived item and of sizes typed in', async () => {
    const bare = await keepAssembly(machinist, rows, { collet: null })
    expect([bare.status, faultPaths(bare)]).toEqual([422, ['collet']])
    const spare = await createAssemblyRows(db, crib)
    const colletId = (
      await crib.post('/api/collets', {
        code: `${spare.colletCode}-x`,
        series: 'ER16',
        minimumMm: 3,
        maximumMm: 4,
        minimumGripMm: 10,
      })
    ).body.id
    await crib.remove(`/api/collets/${colletId}`)
    const archived = await keepAssembly(machinist, rows, { collet: { id: colletId } })
    expect([archived.status, faultPaths(archived)]).toEqual([422, ['collet.id']])
    const typed = await keepAssembly(machinist, rows, { holder: { gaugeLengthMm: 100, segments: [] } })
    expect(typed.status).toBe(400)
  })

  it('goes by the sizes of the piece it names', async () => {
    const { cutterId } = rows
    const [piece] = await db('pieces')
      .insert({ item_id: cutterId, tag: `P-${randomUUID()}`, cutting_diameter_mm: 3.1 })
      .returning('id')
    const { tools } = await kept({ cutter: { pieceId: piece.id } })
    expect(tools).toMatchObject({ cutter: { cuttingDiameterMm: 3.1 } })
  })

  it('is kept for another feature it is good for as it is set, and for none it is not', async () => {
    const assembly = await kept()
    const add = (depthMm: number) =>
      machinist.post(`/api/assemblies/${assembly.id}/checks`, {
        version: assembly.version,
        feature: { kind: 'wall', depthMm },
      })
    const added = await add(30)
    expect(added.status).toBe(201)
    expect(added.body).toMatchObject({ checks: [{ holds: true }, { holds: true, feature: { depthMm: 30 } }] })
    const short = await add(39)
    expect([short.status, faultPaths(short)]).toEqual([422, ['feature']])
    const change = { version: assembly.version, stickOutMm: 39.2 }
    expect((await machinist.patch(`/api/assemblies/${assembly.id}`, change)).status).toBe(200)
  })

  it('is changed by its version, and never to a stick-out that fails its check', async () => {
    const assembly = await kept()
    const path = `/api/assemblies/${assembly.id}`
    const longer = await machinist.patch(path, {
      version: assembly.version,
      stickOutMm: 42,
      lengthOffsetNumber: 7,
    })
    expect(longer.body).toMatchObject({ stickOutMm: 42, gaugeLengthMm: 142, lengthOffsetNumber: 7 })
    const stale = await machinist.patch(path, { version: assembly.version, name: 'late' })
    expect([stale.status, stale.body.code]).toEqual([409, 'stale-version'])
    expect(stale.body.current).toMatchObject({ stickOutMm: 42 })
    const short = await machinist.patch(path, { version: longer.body.version, stickOutMm: 39 })
    expect([short.status, faultPaths(short)]).toEqual([422, ['stickOutMm']])
    expect(await read(assembly.id)).toMatchObject({ stickOutMm: 42, isMarked: false })
  })
})

describe('building', () => {
  it('issues every part into the hands of whoever builds, once however often it is sent', async () => {
    const assembly = await kept()
    const key = randomUUID()
    const [one, two] = await Promise.all([
      buildAssembly(machinist, rows, assembly, {}, key),
      buildAssembly(machinist, rows, assembly, {}, key),
    ])
    expect([one.status, two.status]).toEqual([200, 200])
    expect(one.body).toMatchObject({ state: 'built', place: { locationId: machinist.user.locationId } })
    expect(await balances(rows.cutterId)).toEqual([
      inBin(4),
      { locationId: machinist.user.locationId, condition: 'new', quantity: 1 },
    ])
    expect(await balances(rows.holderId)).toHaveLength(2)
  })

  it('takes nothing at all where one part is not there, and says what is', async () => {
    const assembly = await kept()
    const parts = [
      { kind: 'cutter', fromLocationId: rows.shelf.binId },
      { kind: 'collet', fromLocationId: rows.shelf.secondBinId },
      { kind: 'holder', fromLocationId: rows.shelf.binId },
    ]
    const answer = await buildAssembly(machinist, rows, assembly, { parts })
    expect(answer.status).toBe(409)
    expect(answer.body).toMatchObject({
      code: 'not-enough-stock',
      itemId: rows.colletId,
      available: 0,
      wanted: 1,
    })
    expect(await balances(rows.cutterId)).toEqual([inBin(5)])
    expect(await read(assembly.id)).toMatchObject({ state: 'planned' })
  })

  it('never takes the last part twice', async () => {
    const assemblies = await Promise.all([kept(), kept(), kept()])
    const answers = await Promise.all(assemblies.map((assembly) => buildAssembly(machinist, rows, assembly)))
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 200, 409])
    expect(await balances(rows.holderId)).toEqual([
      { locationId: machinist.user.locationId, condition: 'new', quantity: 2 },
    ])
  })

  it('asks for every part, from a bin', async () => {
    const assembly = await kept()
    const some = await buildAssembly(machinist, rows, assembly, {
      parts: [{ kind: 'cutter', fromLocationId: machinist.user.locationId }],
    })
    expect([some.status, faultPaths(some)]).toEqual([422, ['parts.0.fromLocationId', 'parts', 'parts']])
  })

  it('is not for an estimator, who plans', async () => {
    const planned = await keepAssembly(estimator, rows)
    expect(planned.status).toBe(201)
    expect((await buildAssembly(estimator, rows, planned.body)).status).toBe(403)
    const standing = await built()
    const change = { version: standing.version, toolNumber: 3 }
    expect((await estimator.patch(`/api/assemblies/${standing.id}`, change)).status).toBe(403)
  })
})

describe('a built assembly', () => {
  it('is measured against what was calculated', async () => {
    const assembly = await built()
    const answer = await act(machinist, assembly, 'measure', { gaugeLengthMm: 139.53, diameterMm: 3.17 })
    expect(answer.body).toMatchObject({
      isMarked: false,
      measurement: {
        gaugeLengthMm: 139.53,
        diameterMm: 3.17,
        expectedGaugeLengthMm: 139.5,
        expectedDiameterMm: 3.175,
        source: 'byHand',
      },
    })
  })

  it('is marked where the stick-out really measured falls short', async () => {
    const assembly = await built()
    const { body } = await act(machinist, assembly, 'measure', { gaugeLengthMm: 139 })
    expect(body).toMatchObject({ isMarked: true, findings: [{ detail: { code: 'checkFailsAsMeasured' } }] })
    const again = await act(machinist, body, 'measure', { gaugeLengthMm: 139.49 })
    expect(again.body).toMatchObject({ isMarked: false, findings: [] })
  })

  it('is not measured shorter than its holder, and not before it is built', async () => {
    const assembly = await built()
    const short = await act(machinist, assembly, 'measure', { gaugeLengthMm: 100 })
    expect([short.status, faultPaths(short)]).toEqual([422, ['gaugeLengthMm']])
    const planned = await act(machinist, await kept(), 'measure', { gaugeLengthMm: 139.5 })
    expect([planned.status, planned.body.code]).toEqual([409, 'wrong-state'])
  })

  it('goes into a pocket of a machine and back into hands, on the books as in truth', async () => {
    const machine = await createMachine(db)
    const assembly = await built()
    const inside = await act(machinist, assembly, 'pocket', {
      machineId: machine.id,
      pocket: 5,
      toolNumber: 12,
    })
    expect(inside.body).toMatchObject({
      machine: { code: machine.code },
      pocket: 5,
      toolNumber: 12,
      isMarked: false,
      place: { locationId: machine.locationId },
    })
    expect(await balances(rows.holderId)).toEqual([
      inBin(1),
      { locationId: machine.locationId, condition: 'new', quantity: 1 },
    ])
    const listed = await allRows(machinist, `/api/assemblies?machineId=${machine.id}`)
    expect(listed.map(({ id }) => id)).toEqual([assembly.id])
    const out = await act(crib, inside.body, 'pocket', { machineId: null })
    expect(out.body).toMatchObject({
      machine: null,
      pocket: null,
      place: { locationId: crib.user.locationId },
    })
    await untilRechecked(db, assembly.id)
    expect(await read(assembly.id)).toMatchObject({ isMarked: false })
  })

  it('goes into no machine of another taper, however that is written', async () => {
    const machine = await createMachine(db)
    const taperOf = (taper: string | null) => db('holders').where('item_id', rows.holderId).update({ taper })
    const assembly = await built()
    await taperOf('CAT40')
    try {
      const refused = await act(machinist, assembly, 'pocket', { machineId: machine.id, pocket: 1 })
      expect([refused.status, faultPaths(refused)]).toEqual([422, ['machineId']])
      expect(refused.body.detail).toContain(`is CAT40, ${machine.code} takes BT30.`)
      await taperOf('bt-30')
      const { version } = await read(assembly.id)
      const inside = await act(machinist, { ...assembly, version }, 'pocket', { machineId: machine.id })
      expect(inside.status).toBe(200)
    } finally {
      await taperOf(null)
    }
  })

  it('shares no pocket and no tool number of a machine, and finds only pockets that are there', async () => {
    const machine = await createMachine(db, 10)
    const first = await built({ toolNumber: 4 }, { machineId: machine.id, pocket: 1 })
    expect(first).toMatchObject({ pocket: 1 })
    const second = await built()
    const refused = async (change: Record<string, unknown>) => {
      const answer = await act(machinist, second, 'pocket', { machineId: machine.id, ...change })
      return [answer.status, ...faultPaths(answer)]
    }
    expect(await refused({ pocket: 1 })).toEqual([409, 'pocket'])
    expect(await refused({ pocket: 2, toolNumber: 4 })).toEqual([409, 'toolNumber'])
    expect(await refused({ pocket: 11 })).toEqual([422, 'pocket'])
    expect(await balances(rows.holderId)).toContainEqual({
      locationId: machinist.user.locationId,
      condition: 'new',
      quantity: 1,
    })
  })

  it('is broken down: what is said comes back in its condition, what broke goes to scrap', async () => {
    const assembly = await built()
    const parts = [{ kind: 'cutter', outcome: 'scrap' }, ...backToBin.slice(1)]
    const answer = await act(machinist, assembly, 'break-down', { parts })
    expect(answer.body).toMatchObject({ state: 'brokenDown', place: null, isMarked: false })
    expect(await balances(rows.cutterId)).toEqual([inBin(4)])
    expect(await balances(rows.colletId)).toEqual([inBin(1), inBin(1, 'used')])
    const again = await buildAssembly(machinist, rows, answer.body)
    expect(again.body).toMatchObject({ state: 'built' })
  })

  it('is broken down whole or not at all', async () => {
    const assembly = await built()
    const some = await act(machinist, assembly, 'break-down', { parts: backToBin.slice(0, 2) })
    expect([some.status, faultPaths(some)]).toEqual([422, ['parts']])
    const parts = [{ kind: 'cutter', outcome: 'gone' }, ...backToBin.slice(1)]
    const there = await act(machinist, assembly, 'break-down', { parts })
    expect([there.status, faultPaths(there)]).toEqual([422, ['parts.0.outcome']])
    expect(await read(assembly.id)).toMatchObject({ state: 'built' })
  })

  it('is archived only when it is broken down', async () => {
    const assembly = await built()
    const early = await machinist.remove(`/api/assemblies/${assembly.id}?version=${assembly.version}`)
    expect([early.status, early.body.code]).toEqual([409, 'wrong-state'])
    const { body } = await act(machinist, assembly, 'break-down', { parts: backToBin })
    const answer = await machinist.remove(`/api/assemblies/${assembly.id}?version=${body.version}`)
    expect(answer.status).toBe(200)
    expect(answer.body.archivedAt).toEqual(expect.any(String))
  })

  it('scraps from a machine only for who keeps the crib', async () => {
    const machine = await createMachine(db)
    const assembly = await built({}, { machineId: machine.id, pocket: 1 })
    const parts = [{ kind: 'cutter', outcome: 'scrap' }, ...backToBin.slice(1)]
    expect((await act(machinist, assembly, 'break-down', { parts })).status).toBe(403)
    expect((await act(crib, assembly, 'break-down', { parts })).status).toBe(200)
  })
})

describe('kept true', () => {
  it('says what was corrected, what no longer holds with it, and takes it over on demand', async () => {
    const assembly = await built()
    const holder = (await crib.get(`/api/holders/${rows.holderId}`)).body
    await crib.patch(`/api/holders/${rows.holderId}`, {
      version: holder.version,
      gaugeLengthMm: 98,
      segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 30, spindleDiameterMm: 30 }],
    })
    await untilRechecked(db, assembly.id)
    const marked = await read(assembly.id)
    expect(marked).toMatchObject({ isMarked: true, gaugeLengthMm: 139.5 })
    expect(marked.findings).toEqual([
      expect.objectContaining({
        isFault: true,
        detail: { code: 'offsetChanged', offset: 'gaugeLength', beforeMm: 139.5, afterMm: 137.5 },
      }),
      expect.objectContaining({
        isFault: false,
        detail: expect.objectContaining({
          code: 'sizesChanged',
          part: 'holder',
          changes: [
            { field: 'gaugeLengthMm', before: 100, after: 98 },
            expect.objectContaining({ field: 'segments' }),
          ],
        }),
      }),
    ])
    const list = await machinist.get(`/api/assemblies?marked=true&itemId=${rows.holderId}`)
    expect(list.body.rows.map(({ id }) => id)).toEqual([assembly.id])
    const taken = await machinist.post(`/api/assemblies/${assembly.id}/take-over`, {
      version: marked.version,
    })
    expect(taken.body).toMatchObject({ isMarked: false, gaugeLengthMm: 137.5, findings: [] })
  })

  it('marks a check that fails with the corrected sizes, and is not built so', async () => {
    const assembly = await kept()
    const cutter = (await crib.get(`/api/cutters/${rows.cutterId}`)).body
    await crib.patch(`/api/cutters/${rows.cutterId}`, { version: cutter.version, reachLengthMm: 20 })
    await untilRechecked(db, assembly.id)
    const marked = await read(assembly.id)
    expect(marked).toMatchObject({ isMarked: true, checks: [{ holds: false, answer: { verdict: 'short' } }] })
    const answer = await buildAssembly(machinist, rows, marked)
    expect([answer.status, faultPaths(answer)]).toEqual([422, ['parts']])
    expect(await balances(rows.cutterId)).toEqual([inBin(5)])
  })

  it('marks an assembly whose part went, with who took it, and clears when it is back', async () => {
    const assembly = await built()
    const movement = await machinist.post(
      '/api/movements',
      {
        kind: 'return',
        itemId: rows.colletId,
        quantity: 1,
        fromLocationId: machinist.user.locationId,
        toLocationId: rows.shelf.binId,
      },
      randomUUID(),
    )
    await untilRechecked(db, assembly.id)
    expect(await read(assembly.id)).toMatchObject({
      isMarked: true,
      findings: [{ detail: { code: 'partGone', part: 'collet' }, movement: { kind: 'return' } }],
    })
    await machinist.post(`/api/movements/${movement.body.id}/reversal`, {}, randomUUID())
    await untilRechecked(db, assembly.id)
    expect(await read(assembly.id)).toMatchObject({ isMarked: false, findings: [] })
  })

  it('lets an assembly be broken down whose part is gone', async () => {
    const assembly = await built()
    await machinist.post(
      '/api/movements',
      { kind: 'scrap', itemId: rows.cutterId, quantity: 1, fromLocationId: machinist.user.locationId },
      randomUUID(),
    )
    await untilRechecked(db, assembly.id)
    const marked = await read(assembly.id)
    const parts = [{ kind: 'cutter', outcome: 'gone' }, ...backToBin.slice(1)]
    const answer = await act(machinist, marked, 'break-down', { parts })
    expect(answer.body).toMatchObject({ state: 'brokenDown', isMarked: false })
  })
})

describe('a presetter’s file', () => {
  const send = (text: string, change: Record<string, unknown> = {}) =>
    machinist.post('/api/assemblies/measurements', { text, unit: 'mm', ...change })

  it('is shown first and taken over whole', async () => {
    const assembly = await built()
    const text = `Assembly;Gauge length (mm);Diameter (mm)\r\n${assembly.number};139.52;3.171\r\n`
    const shown = await send(text)
    expect(shown.body).toMatchObject({
      isCommitted: false,
      rejected: [],
      rows: [{ line: 2, gaugeLengthMm: 139.52, diameterMm: 3.171, expectedGaugeLengthMm: 139.5 }],
    })
    expect(await read(assembly.id)).toMatchObject({ measurement: null })
    await send(text, { commit: true })
    expect(await read(assembly.id)).toMatchObject({
      measurement: { gaugeLengthMm: 139.52, source: 'presetter' },
    })
  })

  it('reads inches where the file is in inches', async () => {
    const assembly = await built()
    const { body } = await send(`Number,L\n${assembly.number},5.5\n`, { unit: 'in' })
    expect(body.rows).toMatchObject([{ gaugeLengthMm: 139.7, diameterMm: null }])
  })

  it('refuses by line what it cannot take, and then takes nothing', async () => {
    const [one, planned] = [await built(), await kept()]
    const text = [
      'Assembly,Gauge length,Diameter',
      `${one.number},139.5,`,
      '999999999,120,',
      `${planned.number},139.5,`,
      `${one.number},139.6,`,
      `${one.number},a bit,`,
    ].join('\n')
    const shown = await send(text)
    const rejected = shown.body.rejected as { line: number; column: string }[]
    expect(rejected.map(({ line, column }) => [line, column])).toEqual([
      [3, 'Assembly'],
      [4, 'Assembly'],
      [5, 'Assembly'],
      [6, 'Gauge length'],
      [6, 'Assembly'],
    ])
    const answer = await send(text, { commit: true })
    expect(answer.status).toBe(422)
    expect(await read(one.id)).toMatchObject({ measurement: null })
  })

  it('asks for columns whose headings say nothing', async () => {
    const assembly = await built()
    const text = `T,Messwert\n${assembly.number},139.5\n`
    const shown = await send(text)
    expect(shown.body).toMatchObject({ columns: { number: null, gaugeLength: null }, rows: [] })
    const told = await send(text, { columns: { number: 'T', gaugeLength: 'Messwert' } })
    expect(told.body.rows).toMatchObject([{ gaugeLengthMm: 139.5 }])
  })
})

describe('the list', () => {
  it('finds by number, name and code, block by block', async () => {
    const assemblies = [
      await kept({ name: 'One' }),
      await kept({ name: 'Two' }),
      await kept({ name: 'Three' }),
    ]
    const own = `/api/assemblies?itemId=${rows.cutterId}`
    const listed = await allRows(machinist, `${own}&limit=2&sort=-number`)
    expect(listed.map(({ id }) => id)).toEqual(assemblies.map(({ id }) => id).reverse())
    const [first] = assemblies
    const found = await machinist.get(`${own}&q=${first?.number}`)
    expect(found.body).toMatchObject({ total: 1, rows: [{ name: 'One' }] })
    expect((await machinist.get(`${own}&q=two ${rows.holderCode}`)).body.total).toBe(1)
    expect((await machinist.get(`${own}&state=built`)).body.total).toBe(0)
    expect((await machinist.get('/api/assemblies?colour=red')).status).toBe(400)
  })
})
