import { beforeAll, describe, expect, it } from 'vitest'
import { reachAnswer } from '@/core/reach/reach-answer'
import { defaultReachSettings } from '@/core/reach/types'
import { messageSentence } from '@/lib/reach-sentences'
import { type ApiClient, asNobody, faultPaths, signedInAs, uniqueCode } from '../support/api'
import { ballCutter, drillCutter, handHolder, neckedCutter, squareCutter } from '../support/reach-requests'

const path = '/api/reach'
/** Grips little, so that the hand cases' stick-outs are all allowed. */
const holder = { ...handHolder, minimumGripMm: 10, boreDepthMm: 75 }
const wall = { kind: 'wall', depthMm: 10 }
const check = { feature: wall, cutter: squareCutter, holder }

let machinist: ApiClient
let crib: ApiClient

beforeAll(async () => {
  ;[machinist, crib] = await Promise.all([signedInAs('machinist'), signedInAs('cribManager')])
})

function touches(body: Record<string, unknown>): Record<string, number | null> {
  const rows = body.firstTouch as { part: string; depthMm: number | null }[]
  return Object.fromEntries(rows.map(({ part, depthMm }) => [part, depthMm]))
}

/** The cases worked by hand in the definitions, one holder for all: A 100, a nut of 28, clearances 0.025 and 0.5. */
describe('the hand cases', () => {
  it.each([
    ['a straight wall stops the square end at its shank', squareCutter, wall, 20, 12.7, 'shank'],
    ['a neck carries it to the transition', neckedCutter, wall, 45, 38.1625, 'transition'],
    ['a ball stops at its shank without tilt', ballCutter, wall, 40, 12, 'shank'],
    ['tilt 5', ballCutter, { ...wall, tiltDeg: 5 }, 40, 39.902, 'nut'],
    ['tilt 15', ballCutter, { ...wall, tiltDeg: 15 }, 40, 41.591, 'nut'],
    ['tilt 30', ballCutter, { ...wall, tiltDeg: 30 }, 40, 162.349, 'spindle'],
    [
      'an obstacle stops the nut',
      neckedCutter,
      { ...wall, obstacles: [{ setbackMm: 5, riseMm: 12 }] },
      45,
      32.5,
      'nut',
    ],
  ])('%s', async (_, cutter, feature, stickOutMm, reachMm, limitedBy) => {
    const answer = await machinist.post(path, { feature, cutter, holder, stickOutMm })
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({ reachMm: expect.closeTo(reachMm, 3), limitedBy })
  })

  it('asks for the stick-out that clamps only full shank, rounded up, and lists every first touch', async () => {
    const answer = await machinist.post(path, {
      feature: { ...wall, depthMm: 25 },
      cutter: neckedCutter,
      holder,
    })
    expect(answer.body).toMatchObject({
      verdict: 'reaches',
      shortfallMm: 0,
      stickOut: {
        requiredMm: 39.5,
        minimumMm: expect.closeTo(39.1875, 9),
        usedMm: 39.5,
        boundBy: 'neck',
        upperBoundBy: 'grip',
      },
      gaugeLengthMm: 139.5,
    })
    expect(touches(answer.body)).toEqual({
      flute: null,
      neck: null,
      transition: expect.closeTo(38.1625, 9),
      shank: expect.closeTo(38.1875, 9),
      nut: 39,
      holder: 57,
      spindle: 139,
    })
  })
})

describe('an answer', () => {
  it('is the very one the page works out in the browser, its messages in words', async () => {
    const request = {
      feature: { kind: 'wall' as const, depthMm: 30, draftDeg: 3, openingWidthMm: 20 },
      cutter: neckedCutter,
      holder,
      extension: {
        projectionMm: 60,
        boreDepthMm: 40,
        minimumGripMm: 15,
        segments: [{ lengthMm: 60, noseDiameterMm: 12, spindleDiameterMm: 18 }],
      },
      stickOutMm: 46,
      clearances: { shankMm: 0.05, holderMm: 1 },
      sideLoadN: 25,
    }
    const answer = await machinist.post(path, request)
    const expected = reachAnswer({ ...request, settings: defaultReachSettings })
    const messages = expected.messages.map((message) => ({
      code: message.code,
      text: messageSentence(message, 'mm'),
    }))
    expect(answer.body).toEqual(JSON.parse(JSON.stringify({ ...expected, messages })))
    expect(answer.body.stiffness).toMatchObject({ deflectionUm: expect.any(Number) })
  })

  it('takes absent and null alike for not given', async () => {
    const bare = await machinist.post(path, check)
    const nulls = await machinist.post(path, {
      ...check,
      feature: { ...wall, draftDeg: null, openingWidthMm: null, obstacles: null },
      collet: null,
      extension: null,
      stickOutMm: null,
      clearances: null,
      sideLoadN: null,
    })
    expect(nulls.status).toBe(200)
    expect(nulls.body).toEqual(bare.body)
  })

  it('counts a drill to full diameter and ends where its usable length does', async () => {
    const feature = { kind: 'hole', depthMm: 20, diameterMm: 6, breakThroughMm: 1 }
    const answer = await machinist.post(path, { feature, cutter: drillCutter, holder })
    // 40 of flute, less 1.5 diameters for chips, the point 3/tan(59°) and the break-through.
    const usableMm = 40 - 9 - 3 / Math.tan((59 * Math.PI) / 180) - 1
    expect(answer.body).toMatchObject({
      verdict: 'reaches',
      limitedBy: 'usableLength',
      reachMm: expect.closeTo(usableMm, 9),
    })
  })

  it('says impossible, not an error, where the feature does not take the cutter', async () => {
    const answer = await machinist.post(path, { ...check, feature: { ...wall, openingWidthMm: 3 } })
    expect(answer.status).toBe(200)
    expect(answer.body).toMatchObject({
      verdict: 'impossible',
      messages: expect.arrayContaining([
        {
          code: 'opening-too-narrow',
          text: 'The opening of 3 mm is too narrow by 0.175 mm: this cutter needs 3.175 mm.',
        },
      ]),
    })
  })
})

describe('tools named from the crib', () => {
  it('answers as for the same tools written out, the collet giving the grip', async () => {
    const [cutter, chuck, collet, extension] = await Promise.all([
      crib.post('/api/cutters', { ...neckedCutter, code: uniqueCode('reach-cutter') }),
      crib.post('/api/holders', {
        code: uniqueCode('reach-holder'),
        gaugeLengthMm: 100,
        bore: { kind: 'collet', series: 'ER16' },
        boreDepthMm: 60,
        segments: handHolder.segments,
      }),
      crib.post('/api/collets', {
        code: uniqueCode('reach-collet'),
        series: 'ER16',
        minimumMm: 3,
        maximumMm: 4,
        lengthMm: 27,
      }),
      crib.post('/api/extensions', {
        code: uniqueCode('reach-extension'),
        projectionMm: 40,
        bore: { kind: 'collet', series: 'ER16' },
        boreDepthMm: 50,
        segments: [{ lengthMm: 40, noseDiameterMm: 20, spindleDiameterMm: 20 }],
      }),
    ])
    const feature = { ...wall, depthMm: 25 }
    const named = await machinist.post(path, {
      feature,
      cutter: { id: cutter.body.id },
      holder: { id: chuck.body.id },
      collet: { id: collet.body.id },
      extension: { id: extension.body.id },
    })
    expect(named.status).toBe(200)
    expect(named.body).toMatchObject({
      verdict: 'reaches',
      stickOut: { gripMm: expect.closeTo(18, 9), maximumMm: expect.closeTo(58.2, 9) },
      messages: expect.arrayContaining([expect.objectContaining({ code: 'collet-range-position' })]),
    })
    const written = await machinist.post(path, {
      feature,
      cutter: neckedCutter,
      holder: { ...handHolder, boreDepthMm: 60, minimumGripMm: null },
      collet: { series: 'ER16', minimumMm: 3, maximumMm: 4, lengthMm: 27 },
      extension: {
        projectionMm: 40,
        bore: { kind: 'collet', series: 'ER16' },
        boreDepthMm: 50,
        segments: [{ lengthMm: 40, noseDiameterMm: 20, spindleDiameterMm: 20 }],
      },
    })
    expect(named.body).toEqual(written.body)
  })

  it('does not let a 6 mm bore take a quarter-inch shank', async () => {
    const cutter = { ...ballCutter, shankDiameterMm: 6.35 }
    const bore = { kind: 'fixed', diameterMm: 6 }
    const answer = await machinist.post(path, { ...check, cutter, holder: { ...holder, bore } })
    expect(answer.body).toMatchObject({
      verdict: 'impossible',
      messages: expect.arrayContaining([expect.objectContaining({ code: 'bore-misses-shank' })]),
    })
  })

  it.each([
    ['cutter', { id: '999999999999' }, 'cutter.id'],
    ['cutter', { pieceId: '999999999999' }, 'cutter.pieceId'],
    ['holder', { id: '999999999999' }, 'holder.id'],
    ['collet', { id: '999999999999' }, 'collet.id'],
    ['extension', { id: '999999999999' }, 'extension.id'],
  ])('says which %s is not there: %j', async (slot, named, place) => {
    const answer = await machinist.post(path, { ...check, [slot]: named })
    expect(answer.status).toBe(404)
    expect(faultPaths(answer)).toEqual([place])
  })
})

describe('what cannot be', () => {
  it.each([
    [{ cutter: { ...squareCutter, form: 'cornerRadius', cornerRadiusMm: 2 } }, 'cutter.cornerRadiusMm'],
    [{ cutter: { ...squareCutter, cuttingDiameterMm: 0 } }, 'cutter.cuttingDiameterMm'],
    [{ cutter: { ...squareCutter, form: 'chamfer', pointAngleDeg: 90 } }, 'cutter.form'],
    [{ cutter: drillCutter }, 'cutter.form'],
    [{ feature: { ...wall, depthMm: -1 } }, 'feature.depthMm'],
    [{ feature: { ...wall, draftDeg: 60 } }, 'feature.draftDeg'],
    [{ feature: { ...wall, tiltDeg: 5 } }, 'feature.tiltDeg'],
    [{ cutter: ballCutter, feature: { ...wall, tiltDeg: 5, openingWidthMm: 40 } }, 'feature.tiltDeg'],
    [{ feature: { ...wall, obstacles: [{ setbackMm: -1, riseMm: 3 }] } }, 'feature.obstacles.0.setbackMm'],
    [{ holder: { ...holder, boreDepthMm: null } }, 'holder.boreDepthMm'],
    [{ holder: { ...holder, minimumGripMm: null } }, 'holder.minimumGripMm'],
    [{ holder: { ...holder, gaugeLengthMm: 10 } }, 'holder.segments'],
    [{ holder: { ...holder, segments: [] } }, 'holder.segments'],
    [{ stickOutMm: 0 }, 'stickOutMm'],
    [{ clearances: { holderMm: -0.1 } }, 'clearances.holderMm'],
    [{ sideLoadN: 1e9 }, 'sideLoadN'],
  ])('is refused with 422 at its place: %j', async (change, place) => {
    const answer = await machinist.post(path, { ...check, ...change })
    expect(answer.status).toBe(422)
    expect(faultPaths(answer)).toEqual([place])
    expect(answer.body.errors?.[0]?.message).toMatch(/\.$/)
  })
})

describe('what has the wrong shape', () => {
  it.each([
    [{ feature: undefined }, 'feature'],
    [{ feature: { kind: 'slot', depthMm: 3 } }, 'feature.kind'],
    [{ feature: { kind: 'wall' } }, 'feature.depthMm'],
    [{ feature: { ...wall, depthMm: '10' } }, 'feature.depthMm'],
    [{ cutter: { ...squareCutter, form: 'round' } }, 'cutter.form'],
    [{ cutter: { id: 7 } }, 'cutter.id'],
    [{ cutter: { ...squareCutter, cornerRaduisMm: 1 } }, 'cutter.cornerRaduisMm'],
    [{ holder: 'BT30' }, 'holder'],
    [{ holder: { ...holder, segments: [{ part: 'flange', lengthMm: 3 }] } }, 'holder.segments.0.part'],
    [{ stickout: 3 }, 'stickout'],
  ])('is refused with 400 at its place: %j', async (change, place) => {
    const answer = await machinist.post(path, { ...check, ...change })
    expect(answer.status).toBe(400)
    expect(faultPaths(answer)).toContain(place)
  })

  it('is refused where it is no JSON', async () => {
    const answer = await machinist.send('POST', path, { text: '{"feature":' })
    expect(answer.status).toBe(400)
    expect(answer.body.code).toBe('unreadable-body')
  })
})

it('answers nobody who is not signed in', async () => {
  const answer = await asNobody().post(path, check)
  expect(answer.status).toBe(401)
  expect(answer.headers.get('content-type')).toContain('application/problem+json')
})
