import type { MergePreview } from '@/schemas/duplicate'

type CribOutcome = MergePreview['cribs'][number]

export interface MergedCodes {
  kept: string
  merged: string
}

const namedAtMost = 6

/** Where pieces are, as the preview lists it: a bin by its crib, hands by whose they are. */
export function heldPlace(place: MergePreview['held'][number]): string {
  switch (place.locationKind) {
    case 'person':
      return `With ${place.locationName}`
    case 'machine':
      return `On ${place.locationName}`
    case 'regrind':
      return `Being reground, ${place.locationName}`
    case 'inTransit':
      return `On the way, ${place.locationName}`
    default:
      return [place.cribCode, place.locationCode].filter(Boolean).join(' · ')
  }
}

/** What becomes of reorder points and alerts, a sentence for each crib that has one. */
export function reorderingSentences(cribs: readonly CribOutcome[], codes: MergedCodes): string[] {
  return cribs.map((crib) =>
    [pointSentence(crib, codes), alertSentence(crib, codes)].filter(Boolean).join(' '),
  )
}

function pointSentence({ cribCode, kept, merged }: CribOutcome, codes: MergedCodes): string {
  const words = (rule: { reorderPoint: number; orderUpTo: number }) =>
    `${rule.reorderPoint}, up to ${rule.orderUpTo}`
  if (kept && merged)
    return `${cribCode}: ${codes.kept} keeps its reorder point (${words(kept)}); that of ${codes.merged} (${words(merged)}) counts no more.`
  if (merged) return `${cribCode}: ${codes.kept} takes over the reorder point (${words(merged)}).`
  return kept ? `${cribCode}: ${codes.kept} keeps its reorder point (${words(kept)}).` : ''
}

function alertSentence(crib: CribOutcome, codes: MergedCodes): string {
  const { closesAlert, isLowBefore, isLowAfter, positionAfter } = crib
  const closes = closesAlert ? `The open alert of ${codes.merged} closes. ` : ''
  const stand = `With ${positionAfter} in position, ${codes.kept}`
  if (isLowAfter)
    return `${closes}${stand} ${isLowBefore ? 'stays low, and its alert open' : 'is low, so an alert opens and mail goes out'}.`
  return `${closes}${stand} ${isLowBefore ? 'is no longer low: its alert closes' : 'is not low'}.`
}

/** `T-1, T-2 and 4 more`. */
export function namedTags(tags: readonly string[]): string {
  const named = tags.slice(0, namedAtMost)
  return tags.length > named.length
    ? `${named.join(', ')} and ${tags.length - named.length} more`
    : named.join(', ')
}
