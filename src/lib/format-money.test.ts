import { describe, expect, it } from 'vitest'
import { formatAngle } from './format-angle'
import { currencyDecimals, formatMoney } from './format-money'
import { formatRpm, formatSpeed } from './format-speed'

describe('formatMoney', () => {
  /** ISO 4217's minor units, from memory. */
  it.each([
    ['USD', 2],
    ['EUR', 2],
    ['GBP', 2],
    ['CAD', 2],
    ['JPY', 0],
    ['KRW', 0],
    ['KWD', 3],
    ['CLF', 4],
  ])('knows that %s has %d decimals', (currency, decimals) => {
    expect(currencyDecimals(currency)).toBe(decimals)
  })

  it('writes minor units with their currency', () => {
    expect(formatMoney(185000, 'USD')).toBe('$1,850.00')
    expect(formatMoney(5, 'USD')).toBe('$0.05')
    expect(formatMoney(1200, 'JPY')).toBe('¥1,200')
  })
})

describe('formatSpeed and formatAngle', () => {
  it('write the unit a person works in', () => {
    expect(formatSpeed(164.328, 'mm')).toBe('164.3 m/min')
    expect(formatSpeed(376.99, 'in')).toBe('1237 SFM')
    expect(formatSpeed(152.4, 'in')).toBe('500 SFM')
    expect(formatAngle(35.5312)).toBe('35.53°')
    expect(formatAngle(30)).toBe('30°')
    expect(formatRpm(999.6)).toBe('1\u00a0000 rpm')
    expect(formatRpm(120)).toBe('120 rpm')
  })
})
