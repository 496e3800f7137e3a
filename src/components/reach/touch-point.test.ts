import { describe, expect, it } from 'vitest'
import { reachAnswer } from '@/core/reach/reach-answer'
import { defaultReachSettings, type Feature } from '@/core/reach/types'
import type { CutterGeometry, HolderGeometry } from '@/core/tooling'
import { sectionScene } from './section-scene'
import { limitPoint, touchPoint } from './touch-point'

const clearances = { shankMm: 0.025, holderMm: 0.5 }

const holder: HolderGeometry = {
  gaugeLengthMm: 100,
  boreDepthMm: 75,
  minimumGripMm: 10,
  segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }],
}
const necked: CutterGeometry = {
  form: 'square',
  cuttingDiameterMm: 3.175,
  lengthOfCutMm: 6.35,
  fluteLengthMm: 6.35,
  neckDiameterMm: 3,
  reachLengthMm: 38.1,
  shankDiameterMm: 3.175,
  overallLengthMm: 76.2,
}
const ball: CutterGeometry = {
  form: 'ball',
  cuttingDiameterMm: 6,
  lengthOfCutMm: 12,
  fluteLengthMm: 12,
  shankDiameterMm: 6,
  overallLengthMm: 80,
}

function sceneOf(feature: Feature, cutter: CutterGeometry, stickOutMm: number) {
  const scene = sectionScene({ feature, cutter, holder, extension: null, stickOutMm, clearances })
  if (!scene) throw new Error('There is no scene.')
  const answer = reachAnswer({ feature, cutter, holder, stickOutMm, settings: defaultReachSettings })
  return { scene, answer }
}

describe('the cross of the first touch', () => {
  it('stands on the wall’s line at the height the core says', () => {
    const { scene, answer } = sceneOf({ kind: 'wall', depthMm: 25 }, necked, 39.5)
    const point = limitPoint(scene, answer.limitedBy, answer.reachMm)
    expect(point?.uMm).toBeCloseTo(0, 9)
    expect(point?.hMm).toBeCloseTo(38.1625, 9)
  })

  it('stands where the widened face of a leaning nut crosses the wall’s line, as worked by hand', () => {
    const { scene, answer } = sceneOf({ kind: 'wall', depthMm: 30, tiltDeg: 15 }, ball, 40)
    const point = limitPoint(scene, answer.limitedBy, answer.reachMm)
    // The face lies 36.5 along the axis from the ball's centre, which is 3 before the wall and 3 above the floor:
    // it passes the wall's line at (3 + 36.5·sin 15°)/cos 15° from the axis.
    const tilt = (15 * Math.PI) / 180
    const radiusMm = (3 + 36.5 * Math.sin(tilt)) / Math.cos(tilt)
    expect(point?.uMm).toBeCloseTo(0, 9)
    expect(point?.hMm).toBeCloseTo(3 + 36.5 * Math.cos(tilt) + radiusMm * Math.sin(tilt), 9)
    expect(point?.hMm).toBeCloseTo(41.591, 3)
  })

  it('is found for every part the core says touches', () => {
    const features: Feature[] = [
      { kind: 'wall', depthMm: 25 },
      { kind: 'wall', depthMm: 25, draftDeg: 7 },
      { kind: 'hole', depthMm: 20, diameterMm: 8 },
    ]
    for (const feature of features) {
      const { scene, answer } = sceneOf(feature, necked, 45)
      const touching = answer.firstTouch.filter(({ depthMm }) => depthMm !== null)
      expect(touching.length).toBeGreaterThan(2)
      for (const { part, depthMm } of touching) {
        const point = touchPoint(scene, part, depthMm ?? 0)
        expect(point?.hMm, `${part} at ${feature.kind}`).toBeCloseTo(depthMm ?? 0, 6)
      }
    }
  })

  it('shows at an obstacle’s edge what strikes it', () => {
    const feature: Feature = { kind: 'wall', depthMm: 40, obstacles: [{ setbackMm: 5, riseMm: 12 }] }
    const { scene, answer } = sceneOf(feature, necked, 45)
    expect(answer.limitedBy).toBe('nut')
    expect(limitPoint(scene, answer.limitedBy, answer.reachMm)).toEqual({ uMm: 5, hMm: 52 })
  })

  it('is at the obstacle that is struck, not at a nearer one that is not', () => {
    const obstacles = [
      { setbackMm: 3, riseMm: 2 },
      { setbackMm: 8, riseMm: 20 },
    ]
    const { scene, answer } = sceneOf({ kind: 'wall', depthMm: 15, obstacles }, necked, 45)
    // The nut, 0.5 wider and lower, stands 44.5 above the tip: 24.5 deep on the one rising 20, 42.5 on the other.
    expect(answer).toMatchObject({ limitedBy: 'nut', reachMm: 24.5 })
    expect(limitPoint(scene, answer.limitedBy, answer.reachMm)).toEqual({ uMm: 8, hMm: 35 })
  })

  it('is not drawn for a length that ends without touching', () => {
    const { scene } = sceneOf({ kind: 'wall', depthMm: 25 }, necked, 45)
    expect(limitPoint(scene, 'usableLength', 20)).toBeNull()
    expect(limitPoint(scene, null, null)).toBeNull()
  })
})
