/** Prices are written alike for everyone in a shop, whatever the browser is set to. */
const locale = 'en'

/**
 * How many decimals a currency has in ISO 4217, as the runtime's own table says: 2 for USD, 0 for JPY, 3 for KWD.
 * A code that is no currency's shape throws RangeError.
 *
 * @example
 * currencyDecimals('JPY') // => 0
 */
export function currencyDecimals(currency: string): number {
  const format = new Intl.NumberFormat(locale, { style: 'currency', currency })
  return format.resolvedOptions().maximumFractionDigits ?? 2
}

/**
 * An amount in minor units with its currency.
 *
 * @example
 * formatMoney(185000, 'USD') // => '$1,850.00'
 */
export function formatMoney(minor: number, currency: string): string {
  const amount = minor / 10 ** currencyDecimals(currency)
  return new Intl.NumberFormat(locale, { style: 'currency', currency }).format(amount)
}
