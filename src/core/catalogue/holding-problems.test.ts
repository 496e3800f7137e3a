import { describe, expect, it } from 'vitest'
import type { GeometryProblem } from './geometry-problem'
import { colletProblems, extensionProblems, holderProblems } from './holding-problems'

const segment = { lengthMm: 30, noseDiameterMm: 20, spindleDiameterMm: 30 }
const holder = {
  gaugeLengthMm: 60,
  bore: { kind: 'fixed', diameterMm: 6 } as const,
  boreDepthMm: 40,
  segments: [
    { ...segment, part: 'nut' as const },
    { ...segment, part: 'holder' as const },
  ],
}
const extension = { projectionMm: 60, bore: holder.bore, boreDepthMm: 40, segments: [segment, segment] }
const collet = { series: 'ER16', minimumMm: 5, maximumMm: 6, lengthMm: 27.5 }
const paths = (problems: GeometryProblem[]) => problems.map((problem) => problem.path.join('.'))

describe('holderProblems', () => {
  it('takes segments as long as the gauge length and nothing beyond', () => {
    expect(paths(holderProblems(holder))).toEqual([])
    expect(paths(holderProblems({ ...holder, gaugeLengthMm: 60 - 1e-8 }))).toEqual(['segments.1.lengthMm'])
  })

  it('takes a grip, with where it begins, as deep as the bore and nothing beyond', () => {
    expect(paths(holderProblems({ ...holder, minimumGripMm: 40 }))).toEqual([])
    expect(paths(holderProblems({ ...holder, minimumGripMm: 40 + 1e-8 }))).toEqual(['minimumGripMm'])
    expect(paths(holderProblems({ ...holder, minimumGripMm: 30, gripStartMm: 10 }))).toEqual([])
    expect(paths(holderProblems({ ...holder, minimumGripMm: 30, gripStartMm: 10 + 1e-8 }))).toEqual([
      'gripStartMm',
    ])
  })

  it('takes a side-lock as deep as its fixed bore, and none in a collet chuck', () => {
    expect(paths(holderProblems({ ...holder, sideLockInsertionMm: 40 }))).toEqual([])
    expect(paths(holderProblems({ ...holder, sideLockInsertionMm: 40 + 1e-8 }))).toEqual([
      'sideLockInsertionMm',
    ])
    const chuck = { ...holder, bore: { kind: 'collet', series: 'ER16' } as const }
    expect(paths(holderProblems({ ...chuck, sideLockInsertionMm: 10 }))).toEqual(['sideLockInsertionMm'])
  })

  it('refuses a nut behind the body', () => {
    const [nut, body] = holder.segments
    if (!nut || !body) throw new Error('The holder of this test has two segments.')
    expect(paths(holderProblems({ ...holder, segments: [body, nut] }))).toEqual(['segments.1.part'])
    expect(paths(holderProblems({ ...holder, segments: [nut, nut] }))).toEqual([])
  })
})

describe('extensionProblems', () => {
  it('takes segments as long as the projection and nothing beyond', () => {
    expect(paths(extensionProblems(extension))).toEqual([])
    expect(paths(extensionProblems({ ...extension, projectionMm: 60 - 1e-8 }))).toEqual([
      'segments.1.lengthMm',
    ])
  })
})

describe('colletProblems', () => {
  it('takes one size alone, and no range turned round', () => {
    expect(paths(colletProblems({ ...collet, minimumMm: 6 }))).toEqual([])
    expect(paths(colletProblems({ ...collet, minimumMm: 6.001 }))).toEqual(['maximumMm'])
  })

  it('takes a grip over its whole length and nothing beyond', () => {
    expect(paths(colletProblems({ ...collet, minimumGripMm: 27.5 }))).toEqual([])
    expect(paths(colletProblems({ ...collet, minimumGripMm: 27.5 + 1e-8 }))).toEqual(['minimumGripMm'])
  })
})
