import type { Bore } from '@/core/tooling'
import type { LengthUnit } from '@/core/units/length-unit'
import type { ItemSize } from '@/schemas/item-size'
import { cutterFormNames } from './cutter-words'
import { formatLength } from './format-length'

/** What an item is in a few words, in the reader's unit: `Square end mill 6 mm`. */
export function sizeWords(size: ItemSize, unit: LengthUnit): string {
  const length = (mm: number) => formatLength(mm, unit, { fractions: true })
  switch (size.kind) {
    case 'cutter':
      return `${cutterFormNames[size.form]} ${length(size.cuttingDiameterMm)}`
    case 'holder':
      return [size.taper, 'holder', boreText(size.bore, length), `gauge length ${length(size.gaugeLengthMm)}`]
        .filter(Boolean)
        .join(', ')
        .replace(', holder', ' holder')
        .replace(/^holder/, 'Holder')
    case 'collet':
      return `${size.series} collet ${formatLength(size.minimumMm, unit, { withUnit: false })} to ${formatLength(size.maximumMm, unit)}`
    case 'extension':
      return `Extension, ${boreText(size.bore, length)}, projection ${length(size.projectionMm)}`
  }
}

function boreText(bore: Bore, length: (mm: number) => string): string {
  return bore.kind === 'collet' ? `${bore.series} collet` : `${length(bore.diameterMm)} bore`
}

/** The same with what else tells twins apart from others: for a cutter its corner, cut and overall length. */
export function fullSizeWords(size: ItemSize, unit: LengthUnit): string {
  if (size.kind !== 'cutter') return sizeWords(size, unit)
  const figures = [
    ['RE', size.cornerRadiusMm],
    ['APMX', size.lengthOfCutMm],
    ['OAL', size.overallLengthMm],
  ] as const
  return [
    sizeWords(size, unit),
    ...figures.flatMap(([name, mm]) =>
      mm === null ? [] : [`${name} ${formatLength(mm, unit, { withUnit: false })}`],
    ),
  ].join(' · ')
}
