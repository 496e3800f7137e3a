import type { Feature } from '@/core/reach/types'
import type { SearchQuestion } from './types'

/**
 * What of a feature a purpose asks: a roughing cutter needs the depth and the opening; corner and floor are the finishing
 * cutter's.
 *
 * @example
 * askedFeature({ feature: { kind: 'wall', depthMm: 5, floorRadiusMm: 1 }, purpose: 'roughing' }).floorRadiusMm // => null
 */
export function askedFeature({ feature, purpose }: Pick<SearchQuestion, 'feature' | 'purpose'>): Feature {
  if (purpose !== 'roughing' || feature.kind === 'hole') return feature
  return { ...feature, insideCornerRadiusMm: null, floorRadiusMm: null }
}
