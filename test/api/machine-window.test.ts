import { beforeAll, describe, expect, it } from 'vitest'
import { machineWindow } from '@/core/machine/machine-window'
import { type ApiClient, asNobody, faultPaths, signedInAs } from '../support/api'

const path = '/api/machine-window'
/** Cases of test/reference/machine/machine-window.md. */
const first = {
  gaugeLineToTableMm: 600,
  zTravelMm: 450,
  highestMm: 220,
  lowestTipMm: 60,
  retractClearanceMm: 25,
}
const bar = { widthMm: 80, heightMm: 80, offsetXMm: 0, offsetYMm: 0, axisHeightMm: 120 }
const turned = {
  gaugeLineToTableMm: 500,
  zTravelMm: 350,
  highestMm: 150,
  lowestTipMm: 100,
  retractClearanceMm: 25,
  rotaryStock: bar,
}

let machinist: ApiClient

beforeAll(async () => {
  machinist = await signedInAs('machinist')
})

describe('a machine window that can be', () => {
  it('answers the hand cases in the fixed form', async () => {
    const answer = await machinist.post(path, first)
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({
      gaugeLengthMm: { shortest: 90, longest: 355 },
      sweptRadiusMm: null,
      highestMm: 220,
      tableClearanceMm: null,
      possible: true,
    })
    const changer = await machinist.post(path, { ...first, longestToolMm: 250 })
    expect(changer.body).toMatchObject({ gaugeLengthMm: { shortest: 90, longest: 250 }, possible: true })
  })

  it('is as high as a rotary stock sweeps', async () => {
    const answer = await machinist.post(path, turned)
    expect(answer.body).toMatchObject({
      sweptRadiusMm: expect.closeTo(56.569, 3),
      highestMm: expect.closeTo(176.569, 3),
      gaugeLengthMm: { shortest: 50, longest: expect.closeTo(298.431, 3) },
      tableClearanceMm: expect.closeTo(63.431, 3),
      possible: true,
    })
  })

  it('is the very figures the page works out in the browser', async () => {
    const request = { ...turned, rotaryStock: { ...bar, offsetXMm: 5, offsetYMm: -3, chuckRadiusMm: 70 } }
    const answer = await machinist.post(path, request)
    expect(answer.body).toEqual(JSON.parse(JSON.stringify(machineWindow(request))))
  })

  it('takes absent and null alike for not given', async () => {
    const bare = await machinist.post(path, first)
    const nulls = await machinist.post(path, { ...first, longestToolMm: null, rotaryStock: null })
    expect(nulls.status).toBe(200)
    expect(nulls.body).toEqual(bare.body)
  })
})

describe('a machine window that is none', () => {
  it('says by how much its ends cross', async () => {
    const answer = await machinist.post(path, {
      gaugeLineToTableMm: 500,
      zTravelMm: 300,
      highestMm: 330,
      lowestTipMm: 20,
      retractClearanceMm: 30,
    })
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({
      gaugeLengthMm: { shortest: 180, longest: 140 },
      shortfallMm: 40,
      possible: false,
    })
  })

  it('says by how much the stock strikes the table', async () => {
    const answer = await machinist.post(path, {
      ...turned,
      lowestTipMm: 40,
      rotaryStock: { ...bar, axisHeightMm: 50 },
    })
    expect(answer.body).toMatchObject({
      tableClearanceMm: expect.closeTo(-6.569, 3),
      tableStrikeMm: expect.closeTo(31.569, 3),
      possible: false,
    })
  })
})

describe('bad input', () => {
  it('refuses a missing gauge line and a text for a number with 400 at the field', async () => {
    const { gaugeLineToTableMm: _, ...without } = first
    const missing = await machinist.post(path, without)
    expect(missing.status).toBe(400)
    expect(faultPaths(missing)).toEqual(['gaugeLineToTableMm'])
    const text = await machinist.post(path, { ...first, zTravelMm: '450' })
    expect(text.status).toBe(400)
    expect(faultPaths(text)).toEqual(['zTravelMm'])
  })

  it('refuses a member it does not know, since a misspelt height would let a tool through', async () => {
    const answer = await machinist.post(path, { ...first, longestTool: 250 })
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toEqual(['longestTool'])
  })

  it.each([
    [{ gaugeLineToTableMm: -600 }, 'gaugeLineToTableMm'],
    [{ zTravelMm: 0 }, 'zTravelMm'],
    [{ highestMm: -1 }, 'highestMm'],
    [{ lowestTipMm: 300 }, 'lowestTipMm'],
    [{ retractClearanceMm: -5 }, 'retractClearanceMm'],
    [{ longestToolMm: 0 }, 'longestToolMm'],
    [{ rotaryStock: { ...bar, heightMm: 0 } }, 'rotaryStock.heightMm'],
    [{ rotaryStock: { ...bar, axisHeightMm: -120 } }, 'rotaryStock.axisHeightMm'],
  ])('refuses %j with 422 at the field', async (change, field) => {
    const answer = await machinist.post(path, { ...first, ...change })
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual([field])
  })

  it('refuses who is not signed in', async () => {
    expect((await asNobody().post(path, first)).status).toBe(401)
  })
})
