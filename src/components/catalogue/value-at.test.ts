import { get, set } from 'react-hook-form'
import { describe, expect, it } from 'vitest'
import { putAt, valueAt } from './value-at'

const values = () => ({
  code: 'CC-1',
  cost: null,
  bore: { kind: 'fixed', diameterMm: 6 },
  segments: [{ lengthMm: '20' }, { lengthMm: '40' }],
})

describe('valueAt', () => {
  it.each([
    'code',
    'cost',
    'bore',
    'bore.diameterMm',
    'bore.series',
    'segments',
    'segments.1.lengthMm',
    'segments.2.lengthMm',
    'cost.minor',
    'code.length.x',
    'nothing.at.all',
  ])('finds at %s what the form’s own library finds', (path) => {
    expect(valueAt(values(), path)).toEqual(get(values(), path))
  })
})

describe('putAt', () => {
  it.each(['code', 'bore.diameterMm', 'segments.1.lengthMm', 'taper.name', 'cost.minor', 'taper.of.name'])(
    'puts at %s as the form’s own library does',
    (path) => {
      const [ours, theirs] = [values(), values()]
      putAt(ours, path, 7)
      set(theirs, path, 7)
      expect(ours).toEqual(theirs)
    },
  )
})
