import { describe, expect, it } from 'vitest'
import type { ReachMessage } from '@/core/reach/message-codes'
import type { ReachAnswer } from '@/core/reach/types'
import { messageKinds, messageSentence, sentenceLength, verdictSentence } from './reach-sentences'

const wall = { kind: 'wall' as const, depthMm: 25 }

/** The necked square of the definitions' hand cases at 39.5 mm, as far as a sentence needs it. */
const held: ReachAnswer = {
  verdict: 'reaches',
  shortfallMm: 0,
  reachMm: 38.1625,
  limitedBy: 'transition',
  firstTouch: [],
  reachAtBestMm: 38.1625,
  stickOut: {
    requiredMm: 39.5,
    minimumMm: 39.1875,
    maximumMm: 56.2,
    usedMm: 39.5,
    gripMm: 20,
    boundBy: 'neck',
    upperBoundBy: 'grip',
  },
  gaugeLengthMm: 139.5,
  maximumAxialStepMm: 6.35,
  stiffness: { complianceUmPerN: 8.8, stickOutToDiameter: 12.4, deflectionUm: null },
  uncutAtFootMm: null,
  messages: [],
}

describe('a length in a sentence', () => {
  it.each([
    [38.1625, 'mm', '38.16 mm'],
    [39.5, 'mm', '39.5 mm'],
    [25, 'mm', '25 mm'],
    [0.025, 'mm', '0.025 mm'],
    [38.1625, 'in', '1.502 in'],
    [0.635, 'in', '0.025 in'],
  ] as const)('%d in %s reads %s', (mm, unit, text) => {
    expect(sentenceLength(mm, unit)).toBe(text)
  })

  it('does not let the rounding of a difference show', () => {
    expect(3.175 - 3).toBeLessThan(0.175)
    expect(sentenceLength(3.175 - 3, 'mm')).toBe(sentenceLength(0.175, 'mm'))
  })
})

describe('a verdict', () => {
  it('says the depth, the stick-out and what touches next', () => {
    expect(verdictSentence(held, wall, 'mm')).toBe(
      'Reaches 25 mm at 39.5 mm stick-out. The transition touches next, at 38.16 mm.',
    )
  })

  it('says the depth asked for in full, since rounded up it would be more than was checked', () => {
    expect(verdictSentence(held, { ...wall, depthMm: 28.575 }, 'mm')).toContain(
      'Reaches 28.575 mm at 39.5 mm',
    )
    const short: ReachAnswer = { ...held, verdict: 'short', limitedBy: 'nut', shortfallMm: 1 }
    expect(verdictSentence(short, { ...wall, depthMm: 28.575 }, 'mm')).toContain('short of 28.575 mm at')
  })

  it('speaks inches to a person who works in them', () => {
    expect(verdictSentence(held, { ...wall, depthMm: 25.4 }, 'in')).toBe(
      'Reaches 1.000 in at 1.555 in stick-out. The transition touches next, at 1.502 in.',
    )
  })

  it('counts a wall’s through allowance with its depth, since the tip has to go there too', () => {
    const short: ReachAnswer = { ...held, verdict: 'short', limitedBy: 'shank', reachMm: 12, shortfallMm: 10 }
    expect(verdictSentence(short, { kind: 'wall', depthMm: 20, throughMm: 2 }, 'mm')).toBe(
      'Falls 10 mm short of 20 mm and 2 mm through at 39.5 mm stick-out. The shank touches first, at 12 mm.',
    )
  })

  it('says so where nothing ever touches', () => {
    const free = { ...held, reachMm: null, limitedBy: null }
    expect(verdictSentence(free, wall, 'mm')).toBe(
      'Reaches 25 mm at 39.5 mm stick-out. Nothing touches at any depth.',
    )
  })

  it('says where a drill’s flutes end', () => {
    const drill = { ...held, limitedBy: 'usableLength' as const, reachMm: 28.2 }
    expect(verdictSentence(drill, wall, 'mm')).toContain('The usable length ends next, at 28.2 mm.')
  })

  it('says by how much it falls short, what stops it and the stick-out that would do', () => {
    const short: ReachAnswer = {
      ...held,
      verdict: 'short',
      limitedBy: 'nut',
      reachMm: 22.5,
      shortfallMm: 2.5,
      stickOut: { ...held.stickOut, usedMm: 23 },
      messages: [{ code: 'longer-stick-out-reaches', values: { stickOutMm: 23, requiredMm: 39.5 } }],
    }
    expect(verdictSentence(short, wall, 'mm')).toBe(
      'Falls 2.5 mm short of 25 mm at 23 mm stick-out. The nut touches first, at 22.5 mm. A stick-out of 39.5 mm would reach.',
    )
  })

  it('never calls a tool in the floor 0 mm short', () => {
    const floor: ReachAnswer = { ...held, verdict: 'short', limitedBy: 'floor' }
    expect(verdictSentence(floor, wall, 'mm')).toBe(
      'Doesn’t reach 25 mm at 39.5 mm stick-out. The far side of the tilted tool stands in the floor.',
    )
  })

  it('names the first reason where it is impossible, before any note', () => {
    const impossible: ReachAnswer = {
      ...held,
      verdict: 'impossible',
      messages: [
        { code: 'substrate-assumed', values: {} },
        { code: 'corner-too-tight', values: { insideCornerRadiusMm: 1, toolRadiusMm: 3, shortfallMm: 2 } },
      ],
    }
    expect(verdictSentence(impossible, wall, 'mm')).toBe(
      'Impossible. The inside corner of 1 mm is tighter than the tool’s radius of 3 mm.',
    )
  })
})

describe('a message', () => {
  it.each<[ReachMessage, string]>([
    [
      {
        code: 'bounds-crossed',
        values: { lowerBound: 'flutes', lowerMm: 61, upperBound: 'grip', upperMm: 56, overlapMm: 5 },
      },
      'No stick-out is allowed. It must be at least 61 mm (the end of the flutes: only full shank is clamped) and at most 56 mm (the least grip): 5 mm are missing.',
    ],
    [
      {
        code: 'stick-out-breaks-bound',
        values: { stickOutMm: 60, bound: 'grip', boundMm: 56, overlapMm: 4 },
      },
      'A stick-out of 60 mm is 4 mm too long: it must be at most 56 mm (the least grip).',
    ],
    [
      {
        code: 'stick-out-breaks-bound',
        values: { stickOutMm: 10, bound: 'bore', boundMm: 16.2, overlapMm: 6.2 },
      },
      'A stick-out of 10 mm is 6.2 mm too short: it must be at least 16.2 mm (the bottom of the bore).',
    ],
    [
      {
        code: 'stick-out-breaks-bound',
        values: { stickOutMm: 39.186, bound: 'neck', boundMm: 39.1875, overlapMm: 0.0015 },
      },
      'A stick-out of 39.186 mm is 0.002 mm too short: it must be at least 39.188 mm (the end of the neck: only full shank is clamped).',
    ],
    [
      { code: 'longer-stick-out-reaches', values: { stickOutMm: 30, requiredMm: 39.187 } },
      'A stick-out of 39.187 mm would reach.',
    ],
    [
      { code: 'floor-radius-too-small', values: { floorRadiusMm: 0, cornerRadiusMm: 0.5, shortfallMm: 0.5 } },
      'The floor asks for a square end; this cutter has a corner radius of 0.5 mm.',
    ],
    [
      {
        code: 'collet-range-position',
        values: { minimumMm: 3, maximumMm: 4, shankDiameterMm: 3.175, positionRatio: 0.175 },
      },
      'The shank of 3.175 mm sits in the small third of the collet’s range, 3 mm to 4 mm; the small end grips worst.',
    ],
    [
      { code: 'flute-length-assumed', values: { fluteLengthMm: 12, runOutMm: 0 } },
      'The flutes are assumed to end with the length of cut, at 12 mm.',
    ],
  ])('%# reads as it should', (message, sentence) => {
    expect(messageSentence(message, 'mm')).toBe(sentence)
  })

  it('that stops the tool is told apart from one that only speaks of it', () => {
    expect(messageKinds['cutter-rubs']).toBe('stops')
    expect(messageKinds['depth-in-steps']).toBe('caution')
    expect(messageKinds['transition-angle-assumed']).toBe('assumed')
  })
})
