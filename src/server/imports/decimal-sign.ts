import type { DecimalSign } from '@/schemas/import-mapping'

/** The last separator of a number and the digits around it: `12,50 €` has a comma, `1,234.50` a point. */
const lastSeparator = /^\D*?(\d*(?:[.,]\d+)*?)([.,])(\d+)\D*$/

/**
 * The decimal sign a written number leaves no doubt of; null where it has none, or where the separator may be one of
 * thousands (`1,234`).
 */
export function certainSign(cell: string): DecimalSign | null {
  const [, whole = '', sign, part = ''] = lastSeparator.exec(cell.trim()) ?? []
  if (sign === undefined) return null
  const other = sign === ',' ? '.' : ','
  if (whole.includes(sign)) return null
  if (!whole.includes(other) && looksGrouped(whole, part)) return null
  return sign === ',' ? 'comma' : 'point'
}

/** Whether a number's only separator may be its decimal sign or one of thousands. */
export function isDoubtful(cell: string): boolean {
  const [, whole = '', sign, part = ''] = lastSeparator.exec(cell.trim()) ?? []
  return sign !== undefined && /^\d*$/.test(whole) && looksGrouped(whole, part)
}

function looksGrouped(whole: string, part: string): boolean {
  return part.length === 3 && whole.length <= 3 && /^[1-9]/.test(whole)
}

/** Gathers the signs of a file's numbers. */
export class SeenSigns {
  private readonly seen = new Set<DecimalSign>()

  add(cell: string): void {
    const sign = certainSign(cell)
    if (sign) this.seen.add(sign)
  }

  /** The sign of all numbers that leave no doubt; null where there are none, or both kinds stand in the file. */
  guess(): DecimalSign | null {
    const [first] = this.seen
    return this.seen.size === 1 && first ? first : null
  }
}
