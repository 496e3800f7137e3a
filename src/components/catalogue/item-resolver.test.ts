import { describe, expect, it } from 'vitest'
import { holderForm } from '@/components/holders/holder-form'
import { itemResolver } from './item-resolver'
import { blankValues } from './typed-values'

const manner = { unit: 'mm', decimalComma: false, currency: 'USD' } as const
const options = { fields: {}, shouldUseNativeValidation: false }

const holder = {
  ...blankValues(holderForm),
  code: 'CC-1',
  gaugeLengthMm: '100',
  bore: { kind: 'collet', series: 'ER16', diameterMm: '' },
  segments: [{ part: 'nut', lengthMm: '20', noseDiameterMm: '28', spindleDiameterMm: '28' }],
}

describe('itemResolver', () => {
  it('hands on what the server is sent, in millimetres', async () => {
    const resolved = await itemResolver('holder', holderForm, manner)(holder, undefined, options)
    expect(resolved.errors).toEqual({})
    expect(resolved.values).toMatchObject({ gaugeLengthMm: 100, bore: { kind: 'collet', series: 'ER16' } })
  })

  it('puts the fault of an inner field at that field', async () => {
    const typed = { ...holder, bore: { kind: 'fixed', series: '', diameterMm: 'six' } }
    const { errors } = await itemResolver('holder', holderForm, manner)(typed, undefined, options)
    expect(errors).toMatchObject({ bore: { diameterMm: { message: expect.stringContaining('six') } } })
  })

  it('says a missing segment beside the segments, not in one of them', async () => {
    const { errors } = await itemResolver('holder', holderForm, manner)(
      { ...holder, segments: [] },
      undefined,
      options,
    )
    expect(errors).toMatchObject({ segments: { root: { message: 'Give at least one segment.' } } })
  })

  it('refuses segments longer than the gauge length, as the server would', async () => {
    const { errors } = await itemResolver('holder', holderForm, manner)(
      { ...holder, gaugeLengthMm: '10' },
      undefined,
      options,
    )
    expect(JSON.stringify(errors)).toContain('longer than the gauge length')
  })
})
