import { positive } from '@/core/outline/checked-number'

/** Up to the caution, from there on, and past what the shop sets as its limit. */
export type StickOutBand = 'plain' | 'caution' | 'over'

export interface StickOutBands {
  /** Stick-out over cutting diameter above which to take care. */
  stickOutCautionRatio: number
  /** Above which the shop does not go without asking. */
  stickOutLimitRatio: number
}

/**
 * In which of the shop's caution bands a ratio of stick-out to diameter lies.
 *
 * No standard sets a limit and makers differ by a factor of two; the shop's own figures decide.
 *
 * Units      A plain ratio.
 * Result     A ratio exactly at a band's end is still below it.
 * Errors     CoreInputError `not-given`, `not-finite`, `not-positive`.
 * Source     Rules of thumb: test/reference/cutting/cutting-force.md, section 5.
 *
 * @example
 * stickOutBand(4.1, { stickOutCautionRatio: 4, stickOutLimitRatio: 8 }) // => 'caution'
 */
export function stickOutBand(stickOutToDiameter: number, bands: StickOutBands): StickOutBand {
  const ratio = positive(stickOutToDiameter, 'stickOutToDiameter', 'The ratio')
  if (ratio > bands.stickOutLimitRatio) return 'over'
  return ratio > bands.stickOutCautionRatio ? 'caution' : 'plain'
}
