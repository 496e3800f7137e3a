import { beforeAll, describe, expect, it } from 'vitest'
import { ballSpeedAnswer } from '@/core/ball-end/ball-speed-answer'
import { type ApiClient, asNobody, faultPaths, signedInAs } from '../support/api'

const path = '/api/ball-speed'
const ball = { cuttingDiameterMm: 6, depthOfCutMm: 0.3, tiltDeg: 0 }

let machinist: ApiClient

beforeAll(async () => {
  machinist = await signedInAs('machinist')
})

describe('a ball-end speed that can be', () => {
  /** By hand in the definitions: DC 6, ap 0.3, no tilt at 20 000 rpm. */
  it('answers the hand case in the fixed form', async () => {
    const answer = await machinist.post(path, { ...ball, spindleRpm: 20_000, stepoverMm: 0.5 })
    expect(answer.status).toBe(200)
    expect(answer.body).toEqual({
      tiltDeg: 0,
      effectiveDiameterMm: { largest: expect.closeTo(2.6153, 4), smallest: 0 },
      tipInCut: true,
      tiltToClearTipDeg: expect.closeTo(25.8419, 4),
      speedMPerMin: { largest: expect.closeTo(164.3, 1), smallest: 0 },
      nominalSpeedMPerMin: expect.closeTo(377, 1),
      spindleRpm: 20_000,
      spindleLimited: false,
      scallopHeightMm: expect.closeTo(0.010435, 6),
      chipThinningFactor: expect.closeTo(1.2715, 4),
    })
  })

  it('is the very figures the page works out in the browser', async () => {
    const request = {
      ...ball,
      tiltDeg: 20,
      leadDeg: 30,
      wantedSpeedMPerMin: 300,
      maximumRpm: 18_000,
      stepoverMm: 0.2,
    }
    const answer = await machinist.post(path, request)
    expect(answer.body).toEqual(JSON.parse(JSON.stringify(ballSpeedAnswer(request))))
    expect(answer.body).toMatchObject({ tiltDeg: expect.closeTo(35.531, 3), spindleLimited: true })
  })

  it('takes absent and null alike for not given', async () => {
    const bare = await machinist.post(path, ball)
    const nulls = await machinist.post(path, {
      ...ball,
      cornerRadiusMm: null,
      leadDeg: null,
      stepoverMm: null,
      spindleRpm: null,
      wantedSpeedMPerMin: null,
      maximumRpm: null,
    })
    expect(nulls.status).toBe(200)
    expect(nulls.body).toEqual(bare.body)
    expect(bare.body).toMatchObject({ speedMPerMin: null, spindleRpm: null, scallopHeightMm: null })
  })

  it('cuts with the whole diameter deeper than the radius', async () => {
    const answer = await machinist.post(path, { ...ball, depthOfCutMm: 4 })
    expect(answer.body.effectiveDiameterMm).toEqual({ largest: 6, smallest: 0 })
  })
})

describe('a ball-end speed that cannot be', () => {
  it.each([
    [{ depthOfCutMm: 0 }, 'depthOfCutMm'],
    [{ cuttingDiameterMm: -6 }, 'cuttingDiameterMm'],
    [{ cornerRadiusMm: 3.5 }, 'cornerRadiusMm'],
    [{ cornerRadiusMm: 1, tiltDeg: 10 }, 'tiltDeg'],
    [{ tiltDeg: 95 }, 'tiltDeg'],
    [{ stepoverMm: 6.5 }, 'stepoverMm'],
    [{ spindleRpm: 1000, wantedSpeedMPerMin: 100 }, 'wantedSpeedMPerMin'],
    [{ maximumRpm: 0 }, 'maximumRpm'],
  ])('is refused with 422 at its field: %j', async (change, field) => {
    const answer = await machinist.post(path, { ...ball, ...change })
    expect(answer.status).toBe(422)
    expect(answer.headers.get('content-type')).toContain('application/problem+json')
    expect(answer.body.code).toBe('impossible')
    expect(faultPaths(answer)).toEqual([field])
  })

  it.each([
    [{ ...ball, depthOfCutMm: '0.3' }, 'depthOfCutMm'],
    [{ cuttingDiameterMm: 6, depthOfCutMm: 0.3 }, 'tiltDeg'],
    [{ ...ball, stepoverMm: [0.5] }, 'stepoverMm'],
  ])('is refused with 400 where the shape is wrong: %j', async (body, field) => {
    const answer = await machinist.post(path, body)
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toEqual([field])
  })
})

describe('a ball-end speed for nobody', () => {
  it('is refused with 401', async () => {
    expect((await asNobody().post(path, ball)).status).toBe(401)
  })
})
