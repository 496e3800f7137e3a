import { expect, it } from 'vitest'
import { sizeChanges, sizesOf } from './size-changes'

it('it takes only what a check goes by', () => {
  const row = {
    id: '7',
    code: 'EM-1',
    form: 'ball',
    cuttingDiameterMm: 6,
    fluteCount: 2,
    neckDiameterMm: null,
  }
  expect(sizesOf('cutter', row)).toEqual({ form: 'ball', cuttingDiameterMm: 6 })
})

it('it takes a size that is null and one that is absent for the same', () => {
  expect(sizeChanges('cutter', { neckDiameterMm: null }, {})).toEqual([])
  expect(sizeChanges('cutter', {}, { neckDiameterMm: 3 })).toEqual([
    { field: 'neckDiameterMm', before: null, after: 3 },
  ])
})

it('it calls no rounding a change', () => {
  expect(sizeChanges('collet', { maximumMm: 0.1 + 0.2 }, { maximumMm: 0.3 })).toEqual([])
  expect(sizeChanges('collet', { maximumMm: 0.3 }, { maximumMm: 0.301 })).toHaveLength(1)
})

it('it compares a bore and an outline by what they say, in whatever order their members stand', () => {
  const bore = { kind: 'collet', series: 'ER16' }
  const segments = [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }]
  const turned = [{ spindleDiameterMm: 28, noseDiameterMm: 28, lengthMm: 18, part: 'nut' }]
  const same = { bore: { series: 'ER16', kind: 'collet' }, segments: turned }
  expect(sizeChanges('holder', { bore, segments }, same)).toEqual([])
  expect(sizeChanges('holder', { segments }, { segments: [...segments, ...segments] })).toHaveLength(1)
  expect(
    sizeChanges('holder', { bore }, { bore: { kind: 'fixed', diameterMm: 6 } }).map(({ field }) => field),
  ).toEqual(['bore'])
})
