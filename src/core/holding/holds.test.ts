import { describe, expect, it } from 'vitest'
import { colletFitsBore, colletHolds, fixedBoreHolds } from './holds'

const collet = { series: 'ER20', minimumMm: 6, maximumMm: 7 }

describe('what holds what', () => {
  it.each([
    [5.99, false],
    [6, true],
    [6.35, true],
    [7, true],
    [7.01, false],
  ])('a 6 to 7 mm collet and a shank of %d mm: %s', (shankMm, holds) => {
    expect(colletHolds(collet, shankMm).holds).toBe(holds)
  })

  it('it places the shank in the range, 0 at the small end', () => {
    expect(colletHolds(collet, 6).positionRatio).toBe(0)
    expect(colletHolds(collet, 6.35).positionRatio).toBeCloseTo(0.35, 12)
    expect(colletHolds({ ...collet, minimumMm: 7 }, 7).positionRatio).toBe(1)
  })

  it.each([
    [6, 6.35, false],
    [6, 6.03, true],
    [6, 5.97, true],
    [6, 6.031, false],
    [6, 5.969, false],
    [6.35, 6.35, true],
  ])('a fixed bore of %d mm and a shank of %d mm: %s', (boreMm, shankMm, holds) => {
    expect(fixedBoreHolds(boreMm, shankMm)).toBe(holds)
  })

  it('it knows a series however it is written, and that a fixed bore takes no collet', () => {
    expect(colletFitsBore({ kind: 'collet', series: 'ER-20' }, 'er 20')).toBe(true)
    expect(colletFitsBore({ kind: 'collet', series: 'ER16' }, 'ER20')).toBe(false)
    expect(colletFitsBore({ kind: 'fixed', diameterMm: 20 }, 'ER20')).toBe(false)
  })
})
