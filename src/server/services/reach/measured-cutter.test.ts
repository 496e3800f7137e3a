import { expect, it } from 'vitest'
import { measuredCutter } from './measured-cutter'

const catalogue = {
  form: 'square' as const,
  cuttingDiameterMm: 6,
  lengthOfCutMm: 13,
  fluteLengthMm: 16,
  shankDiameterMm: 6,
  overallLengthMm: 57,
}
const unmeasured = {
  cuttingDiameterMm: null,
  cornerRadiusMm: null,
  lengthOfCutMm: null,
  reachLengthMm: null,
  overallLengthMm: null,
}

it('it takes the catalogue where nothing was measured', () => {
  expect(measuredCutter(catalogue, unmeasured)).toMatchObject(catalogue)
})

it('it takes what was measured before the catalogue', () => {
  const piece = { ...unmeasured, cuttingDiameterMm: 5.9, overallLengthMm: 55 }
  expect(measuredCutter(catalogue, piece)).toMatchObject({
    cuttingDiameterMm: 5.9,
    overallLengthMm: 55,
    lengthOfCutMm: 13,
  })
})

it('it keeps the run-out of a cutter ground back, up to the end of the piece', () => {
  expect(measuredCutter(catalogue, { ...unmeasured, lengthOfCutMm: 10 }).fluteLengthMm).toBe(13)
  const stub = { ...unmeasured, lengthOfCutMm: 13, overallLengthMm: 14 }
  expect(measuredCutter(catalogue, stub).fluteLengthMm).toBe(14)
})
