import type { Bore } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'

/** `ER16 collet` or `⌀6 mm bore`. */
export function boreWords(bore: Bore, unit: LengthUnit): string {
  return bore.kind === 'collet'
    ? `${bore.series} collet`
    : `⌀${formatLength(bore.diameterMm, unit, { fractions: true })} bore`
}
