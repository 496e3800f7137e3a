import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cutterForm } from '@/components/cutters/cutter-form'
import { holderForm } from '@/components/holders/holder-form'
import { createCutterRequestSchema } from '@/schemas/cutter'
import { blankValues, type Manner, readTyped, typedRow } from './typed-values'

const metric: Manner = { unit: 'mm', decimalComma: false, currency: 'USD' }
const inch: Manner = { ...metric, unit: 'in' }

function typedCutter(changes: Record<string, string>) {
  return {
    ...blankValues(cutterForm),
    code: 'EM-1',
    cuttingDiameterMm: '6',
    lengthOfCutMm: '12',
    shankDiameterMm: '6',
    overallLengthMm: '57',
    ...changes,
  }
}

describe('readTyped', () => {
  it('reads a bare number in the person’s unit and a written unit as written', () => {
    const typed = typedCutter({ cuttingDiameterMm: '1/8', lengthOfCutMm: '0.5', overallLengthMm: '60 mm' })
    expect(readTyped(cutterForm, typed, inch).body).toMatchObject({
      cuttingDiameterMm: 3.175,
      lengthOfCutMm: 12.7,
      overallLengthMm: 60,
    })
    expect(readTyped(cutterForm, typed, metric).body).toMatchObject({
      cuttingDiameterMm: 3.175,
      lengthOfCutMm: 0.5,
    })
  })

  it('clears what this form of a cutter does not have', () => {
    const typed = typedCutter({ form: 'square', taperHalfAngleDeg: '3', tipDiameterMm: '1' })
    expect(readTyped(cutterForm, typed, metric).body).toMatchObject({
      taperHalfAngleDeg: null,
      tipDiameterMm: null,
    })
  })

  it('puts a text that is no length at its own field, and reads the others all the same', () => {
    const read = readTyped(cutterForm, typedCutter({ reachLengthMm: 'long' }), metric)
    expect(read.problems.map((problem) => problem.path)).toEqual(['reachLengthMm'])
    expect(read.body).toMatchObject({ cuttingDiameterMm: 6 })
  })

  it('leaves out an empty field that must be there, so that the schema asks for it', () => {
    const { body } = readTyped(cutterForm, typedCutter({ shankDiameterMm: ' ' }), metric)
    const issues = createCutterRequestSchema.safeParse(body).error?.issues
    expect(issues?.map((issue) => [issue.path.join('.'), issue.message])).toEqual([
      ['shankDiameterMm', 'Give the shank diameter.'],
    ])
  })

  it('names the segment a fault is in', () => {
    const typed = {
      ...blankValues(holderForm),
      segments: [
        { part: 'nut', lengthMm: '20', noseDiameterMm: '28', spindleDiameterMm: '28' },
        { part: 'holder', lengthMm: '30', noseDiameterMm: '-3', spindleDiameterMm: '40' },
      ],
    }
    expect(readTyped(holderForm, typed, metric).problems.map((problem) => problem.path)).toEqual([
      'segments.1.noseDiameterMm',
    ])
  })

  it('reads back every length it shows, in either unit and with either decimal sign', () => {
    const length = fc.integer({ min: 1, max: 500_000_000_000 }).map((steps) => steps / 1e9)
    fc.assert(
      fc.property(length, fc.constantFrom('mm', 'in'), fc.boolean(), (mm, unit, decimalComma) => {
        const manner: Manner = { unit: unit as Manner['unit'], decimalComma, currency: 'EUR' }
        const shown = typedRow(cutterForm, { cuttingDiameterMm: mm, unitCost: 12_345 }, manner)
        const { body } = readTyped(cutterForm, { ...typedCutter({}), ...shown }, manner)
        expect(body.cuttingDiameterMm).toBe(mm)
        expect(body.unitCost).toBe(12_345)
      }),
    )
  })
})
