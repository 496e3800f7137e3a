/**
 * Whether two tapers are written as one: capitals, spaces and hyphens do not count. Nothing more is known of them: BT30
 * and SK30 have the same cone and another flange, and count as two.
 *
 * @example
 * isSameTaper('BT 30', 'bt-30') // => true
 * isSameTaper('BT30', 'SK30') // => false
 */
export function isSameTaper(one: string, other: string): boolean {
  return plainTaper(one) === plainTaper(other)
}

function plainTaper(taper: string): string {
  return taper.replace(/[\s-]/g, '').toUpperCase()
}
