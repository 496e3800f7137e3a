import { describe, expect, test } from 'vitest'
import {
  ballCutter,
  handHolder,
  neckedCutter,
  reachRequest,
  squareCutter,
} from '../../../test/support/reach-requests'
import { reachAnswer } from '../reach/reach-answer'
import type { CutterGeometry } from '../tooling'
import { usableDepth } from './usable-depth'

const clearanceMm = 0.025
const slim = { part: 'holder' as const, lengthMm: 100, noseDiameterMm: 3.1, spindleDiameterMm: 3.1 }

describe('how deep a cutter works a straight wall', () => {
  /* The first two are the hand cases of the definitions: reach 12.7 and 38.1625, of which the neck makes 38.1. */
  const cases: [string, CutterGeometry, number, string][] = [
    ['its length of cut', squareCutter, 12.7, 'lengthOfCut'],
    ['its reach length where it is necked', neckedCutter, 38.1, 'neck'],
    [
      'its fluted length where that alone is known',
      { ...squareCutter, lengthOfCutMm: null },
      12.7,
      'lengthOfCut',
    ],
    ['no deeper where the neck rubs', { ...neckedCutter, neckDiameterMm: 3.15 }, 6.35, 'lengthOfCut'],
    ['to the neck where it just clears', { ...neckedCutter, neckDiameterMm: 3.125 }, 38.1, 'neck'],
    ['no deeper where a run-out comes first', { ...neckedCutter, fluteLengthMm: 8 }, 6.35, 'lengthOfCut'],
    ['no deeper where the neck widens', { ...neckedCutter, neckTaperHalfAngleDeg: 1 }, 6.35, 'lengthOfCut'],
  ]
  test.each(cases)('it is %s', (_, cutter, depthMm, endsWith) => {
    expect(usableDepth(cutter, clearanceMm)).toEqual({ depthMm, endsWith })
  })

  test('it is not known where neither length is', () => {
    const { lengthOfCutMm: _, fluteLengthMm: __, ...bare } = squareCutter
    expect(usableDepth(bare, clearanceMm)).toBeNull()
  })

  test.each([squareCutter, neckedCutter, ballCutter])(
    'the reach check of a slim holder agrees: case %#',
    (cutter) => {
      const usable = usableDepth(cutter, clearanceMm)
      const holder = { ...handHolder, segments: [slim] }
      const answer = reachAnswer(
        reachRequest({ cutter, holder, feature: { kind: 'wall', depthMm: usable?.depthMm ?? 0 } }),
      )
      expect(['flute', 'runOut', 'neck', 'transition', 'shank']).toContain(answer.limitedBy)
      expect(answer.reachMm).toBeGreaterThanOrEqual(usable?.depthMm ?? Number.POSITIVE_INFINITY)
    },
  )
})
