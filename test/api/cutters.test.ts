import { beforeAll, describe, expect, it } from 'vitest'
import { type ApiClient, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { createCutter, squareCutter } from '../support/api-stock'

let crib: ApiClient
let machinist: ApiClient
let estimator: ApiClient

beforeAll(async () => {
  ;[crib, machinist, estimator] = await Promise.all([
    signedInAs('cribManager'),
    signedInAs('machinist'),
    signedInAs('estimator'),
  ])
})

describe('a cutter that can be', () => {
  it('is added, read back as it was given and counted as not in stock', async () => {
    const given = squareCutter({ maker: ' Norrhult ', partNumber: 'N 606', unitCost: 2150, fluteCount: 4 })
    const made = await crib.post('/api/cutters', given)
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({
      ...given,
      maker: 'Norrhult',
      version: 1,
      kind: 'cutter',
      neckDiameterMm: null,
      archivedAt: null,
      stock: { onHand: 0, available: 0, isLow: false, locations: [] },
    })
    const read = await crib.get(`/api/cutters/${made.body.id}`)
    expect(read.status).toBe(200)
    expect(read.body).toEqual(made.body)
  })

  it('takes every form with what that form needs', async () => {
    const forms = [
      { form: 'cornerRadius', cornerRadiusMm: 1 },
      { form: 'ball' },
      { form: 'ball', cornerRadiusMm: 3 },
      { form: 'tapered', cuttingDiameterMm: 2, cornerRadiusMm: 1, taperHalfAngleDeg: 3 },
      { form: 'drill', pointAngleDeg: 140 },
      { form: 'reamer' },
      { form: 'tap', pointAngleDeg: 90 },
      { form: 'faceMill' },
      { form: 'slotting' },
      { form: 'threadMill' },
      { form: 'chamfer', pointAngleDeg: 90, tipDiameterMm: 0 },
    ]
    for (const form of forms) {
      const made = await crib.post('/api/cutters', squareCutter(form))
      expect(made.status, JSON.stringify(made.body)).toBe(201)
      expect(made.body).toMatchObject(form)
    }
  })

  it('keeps an inch fraction to the last digit', async () => {
    const id = await createCutter(crib, { cuttingDiameterMm: 3.175, lengthOfCutMm: 9.525 })
    expect((await crib.get(`/api/cutters/${id}`)).body).toMatchObject({
      cuttingDiameterMm: 3.175,
      lengthOfCutMm: 9.525,
    })
  })
})

describe('a cutter that cannot be', () => {
  const impossible: [string, Record<string, unknown>, string[]][] = [
    [
      'a corner radius over half the diameter',
      { form: 'cornerRadius', cornerRadiusMm: 3.1 },
      ['cornerRadiusMm'],
    ],
    ['a corner radius form without one', { form: 'cornerRadius' }, ['cornerRadiusMm']],
    ['a square end with a corner radius', { cornerRadiusMm: 1 }, ['cornerRadiusMm']],
    ['a ball with another radius', { form: 'ball', cornerRadiusMm: 2 }, ['cornerRadiusMm']],
    ['a tapered form without its angle', { form: 'tapered' }, ['taperHalfAngleDeg']],
    ['a drill without its point', { form: 'drill' }, ['pointAngleDeg']],
    ['a chamfer without angle and tip', { form: 'chamfer' }, ['pointAngleDeg', 'tipDiameterMm']],
    [
      'a chamfer with a tip over its diameter',
      { form: 'chamfer', pointAngleDeg: 90, tipDiameterMm: 7 },
      ['tipDiameterMm'],
    ],
    ['no length of cut and no flutes', { lengthOfCutMm: null }, ['lengthOfCutMm']],
    ['a length of cut over its flutes', { lengthOfCutMm: 12, fluteLengthMm: 11 }, ['lengthOfCutMm']],
    ['flutes over the whole length', { fluteLengthMm: 58 }, ['fluteLengthMm']],
    ['a reach length over the whole length', { reachLengthMm: 58 }, ['reachLengthMm']],
    ['a neck without its length', { neckDiameterMm: 5 }, ['reachLengthMm']],
    ['a neck that ends in the flutes', { neckDiameterMm: 5, reachLengthMm: 12 }, ['reachLengthMm']],
    ['a neck thicker than the flutes', { neckDiameterMm: 6.1, reachLengthMm: 20 }, ['neckDiameterMm']],
    ['a diameter of nothing', { cuttingDiameterMm: 0 }, ['cuttingDiameterMm']],
    ['a negative cost', { unitCost: -1 }, ['unitCost']],
    ['half a flute', { fluteCount: 2.5 }, ['fluteCount']],
  ]
  it.each(impossible)('is refused beside its field: %s', async (_, change, paths) => {
    const answer = await crib.post('/api/cutters', squareCutter(change))
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual(paths)
    expect(answer.headers.get('content-type')).toContain('application/problem+json')
  })

  const misshapen: [string, Record<string, unknown>, string][] = [
    ['a length as text', { cuttingDiameterMm: '6' }, 'cuttingDiameterMm'],
    ['a form nobody knows', { form: 'spiral' }, 'form'],
    ['no code', { code: '  ' }, 'code'],
    ['a code with a control character', { code: 'EM\u0000 6' }, 'code'],
    ['a code of 101 characters', { code: 'x'.repeat(101) }, 'code'],
  ]
  it.each(misshapen)('is refused as misshapen: %s', async (_, change, path) => {
    const answer = await crib.post('/api/cutters', squareCutter(change))
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toEqual([path])
  })

  it('is refused where the body is not JSON', async () => {
    const answer = await crib.send('POST', '/api/cutters', { text: '{"code":' })
    expect(answer.status).toBe(400)
    expect(answer.body.code).toBe('unreadable-body')
  })

  it('stands exactly on each limit and is taken', async () => {
    const made = await crib.post(
      '/api/cutters',
      squareCutter({ form: 'cornerRadius', cornerRadiusMm: 3, lengthOfCutMm: 57, fluteLengthMm: 57 }),
    )
    expect(made.status).toBe(201)
  })
})

describe('a code', () => {
  it('is refused where another item has it, capitals or not', async () => {
    const code = uniqueCode('Twice')
    await createCutter(crib, { code })
    const answer = await crib.post('/api/cutters', squareCutter({ code: code.toUpperCase() }))
    expect(answer.status).toBe(409)
    expect(answer.body.code).toBe('code-taken')
    expect(faultPaths(answer)).toEqual(['code'])
  })

  it('is given to one of two that ask for it at once', async () => {
    const code = uniqueCode('RACE')
    const answers = await Promise.all(
      [1, 2, 3, 4].map(() => crib.post('/api/cutters', squareCutter({ code }))),
    )
    expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409, 409, 409])
  })
})

describe('a change', () => {
  it('leaves alone what is absent, clears what is null and raises the version', async () => {
    const id = await createCutter(crib, { maker: 'Norrhult', partNumber: 'N1', description: 'short' })
    const changed = await crib.patch(`/api/cutters/${id}`, { version: 1, maker: null, overallLengthMm: 60 })
    expect(changed.status).toBe(200)
    expect(changed.body).toMatchObject({
      maker: null,
      partNumber: 'N1',
      description: 'short',
      overallLengthMm: 60,
      lengthOfCutMm: 12,
    })
    expect(changed.body.version).toBeGreaterThan(1)
  })

  it('is refused with the row as it is now where the version is stale', async () => {
    const id = await createCutter(crib)
    const first = await crib.patch(`/api/cutters/${id}`, { version: 1, description: 'first' })
    const second = await crib.patch(`/api/cutters/${id}`, { version: 1, description: 'second' })
    expect(second.status).toBe(409)
    expect(second.body.code).toBe('stale-version')
    expect(second.body.current).toEqual(first.body)
  })

  it('goes through once where two come at the same time', async () => {
    const id = await createCutter(crib)
    const answers = await Promise.all(
      ['one', 'two'].map((description) => crib.patch(`/api/cutters/${id}`, { version: 1, description })),
    )
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409])
  })

  it('asks the rules of the row as it will be', async () => {
    const id = await createCutter(crib)
    const shorter = await crib.patch(`/api/cutters/${id}`, { version: 1, overallLengthMm: 11 })
    expect(shorter.status).toBe(422)
    expect(faultPaths(shorter)).toEqual(['lengthOfCutMm'])
    const ball = await crib.patch(`/api/cutters/${id}`, { version: 1, form: 'drill', pointAngleDeg: 140 })
    expect(ball.status).toBe(200)
  })

  it('changes no version where it changes nothing, and a row as read may be sent back', async () => {
    const id = await createCutter(crib, { maker: 'Norrhult' })
    const row = (await crib.get(`/api/cutters/${id}`)).body
    const same = await crib.patch(`/api/cutters/${id}`, row)
    expect(same.status).toBe(200)
    expect(same.body).toEqual(row)
  })

  it('is refused without a version', async () => {
    const id = await createCutter(crib)
    const answer = await crib.patch(`/api/cutters/${id}`, { description: 'x' })
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toEqual(['version'])
  })

  it('finds no cutter under the id of another kind, an unknown one or no id at all', async () => {
    const made = await crib.post('/api/collets', {
      code: uniqueCode('C'),
      series: 'ER16',
      minimumMm: 5,
      maximumMm: 6,
    })
    for (const id of [made.body.id, '999999999', 'abc', '0']) {
      expect((await crib.get(`/api/cutters/${id}`)).status).toBe(404)
      expect((await crib.patch(`/api/cutters/${id}`, { version: 1 })).status).toBe(404)
      expect((await crib.remove(`/api/cutters/${id}`)).status).toBe(404)
    }
  })
})

describe('archiving', () => {
  it('takes an item out of the list and keeps it under its address', async () => {
    const code = uniqueCode('OLD')
    const id = await createCutter(crib, { code })
    expect((await crib.remove(`/api/cutters/${id}`)).status).toBe(204)
    expect((await crib.remove(`/api/cutters/${id}`)).status).toBe(204)
    const total = async (archived: string) =>
      (await crib.get(`/api/cutters?code=${code}&archived=${archived}`)).body.total
    expect([await total('no'), await total('only'), await total('all')]).toEqual([0, 1, 1])
    const row = (await crib.get(`/api/cutters/${id}`)).body
    expect(row.archivedAt).not.toBeNull()
    const back = await crib.patch(`/api/cutters/${id}`, { version: row.version, archivedAt: null })
    expect(back.body.archivedAt).toBeNull()
    expect(await total('no')).toBe(1)
  })
})

describe('costs', () => {
  it('leave only for those who may see them', async () => {
    const id = await createCutter(crib, { unitCost: 4321 })
    expect((await estimator.get(`/api/cutters/${id}`)).body).toMatchObject({ unitCost: 4321 })
    const hidden = await machinist.get(`/api/cutters/${id}`)
    expect(hidden.status).toBe(200)
    expect(hidden.body).not.toHaveProperty('unitCost')
    expect(hidden.body).not.toHaveProperty('currency')
    const list = await machinist.get('/api/cutters?limit=5')
    for (const row of list.body.rows) expect(row).not.toHaveProperty('unitCost')
  })

  it('are neither sorted nor filtered by for those who may not see them', async () => {
    for (const query of ['sort=unitCost', 'sort=code,-unitCost', 'unitCost.min=1', 'unitCost=5']) {
      expect((await machinist.get(`/api/cutters?${query}`)).status, query).toBe(403)
      expect((await estimator.get(`/api/cutters?${query}`)).status, query).toBe(200)
    }
  })
})
