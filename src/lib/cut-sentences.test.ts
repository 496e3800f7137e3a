import { describe, expect, it } from 'vitest'
import { defaultCuttingSettings } from '@/core/cutting/cut-answer'
import { findWorkMaterial } from '@/core/cutting/work-materials'
import { type CutAssembly, type CutInput, cutEstimate } from './cut-estimate'
import { bandSentence, driveSentence, formatFeed } from './cut-sentences'

const material = findWorkMaterial(2)
if (!material) throw new Error('the table has this row')

const assembly: CutAssembly = {
  cutter: {
    form: 'square',
    cuttingDiameterMm: 12,
    lengthOfCutMm: 26,
    shankDiameterMm: 12,
    overallLengthMm: 83,
    fluteCount: 4,
    maximumRpm: null,
  },
  complianceUmPerN: 0.05,
  stickOutToDiameter: 3,
}
const input: CutInput = {
  material,
  cuttingSpeedMPerMin: 180,
  feedMm: 0.06,
  depthOfCutMm: 6,
  stepoverMm: 6,
  fluteCount: null,
  spindle: null,
}

function estimated(change: Partial<CutInput> = {}, of: CutAssembly = assembly) {
  return cutEstimate(of, { ...input, ...change }, defaultCuttingSettings)
}

describe('an estimate of a cut', () => {
  it('holds the speed to cutter and holder', () => {
    expect(estimated().answer?.spindleRpm).toBeCloseTo(4774.6, 1)
    const held = { ...assembly, cutter: { ...assembly.cutter, maximumRpm: 4000 }, holderMaximumRpm: 3000 }
    expect(estimated({}, held).answer).toMatchObject({
      spindleRpm: 3000,
      assumptions: expect.arrayContaining(['speed-limited']),
    })
  })

  it('is a sentence where it cannot be made', () => {
    expect(estimated({ stepoverMm: null })).toEqual({ answer: null, sentence: 'The stepover is needed.' })
    const unknown = { ...assembly, cutter: { ...assembly.cutter, fluteCount: null } }
    expect(estimated({}, unknown).sentence).toBe('The number of flutes is needed.')
    expect(estimated({ fluteCount: 4 }, unknown).answer).toEqual(estimated().answer)
  })

  it('says what the spindle gives and whether that is enough', () => {
    const spindle = (powerKw: number) => ({
      points: [
        { rpm: 4000, powerKw },
        { rpm: 10_000, powerKw },
      ],
      maximumRpm: 10_000,
      efficiency: 0.8,
    })
    const { answer } = estimated({ spindle: spindle(5) })
    // 2.12 kW at the cutter by hand (4.23 Nm at 4774.6 rpm), over 0.8.
    expect(answer && driveSentence(answer)).toMatch(
      /^The spindle drives it at 4.775 rpm: 2\.6 of 5 kW, 4\.2 of 10 Nm\.$/,
    )
    const weak = estimated({ spindle: spindle(2) }).answer
    expect(weak && driveSentence(weak)).toContain('does not drive it')
    const none = estimated().answer
    expect(none && driveSentence(none)).toBeNull()
  })

  it('says a long stick-out in the shop’s own bands', () => {
    expect(bandSentence('plain', 3, defaultCuttingSettings)).toBeNull()
    expect(bandSentence('caution', 5.25, defaultCuttingSettings)).toContain('5.3 × diameter')
    expect(bandSentence('over', 9, defaultCuttingSettings)).toContain('over the shop’s limit of 8')
  })

  it('writes a feed in the person’s unit', () => {
    expect(formatFeed(1145.9, 'mm')).toBe('1146 mm/min')
    expect(formatFeed(1145.9, 'in')).toBe('45.1 in/min')
  })
})
