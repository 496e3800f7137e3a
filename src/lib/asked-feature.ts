import type { Feature } from '@/core/reach/types'
import type { SearchPurpose } from '@/core/search/types'

/**
 * What of a feature is asked of one cutter. A roughing cutter leaves inside corner and floor radius to the finishing one;
 * depth and opening it needs.
 *
 * @example
 * askedFeature({ kind: 'wall', depthMm: 9, floorRadiusMm: 0 }, 'roughing') // => { kind: 'wall', depthMm: 9, insideCornerRadiusMm: null, floorRadiusMm: null }
 */
export function askedFeature(feature: Feature, purpose: SearchPurpose | null): Feature {
  if (purpose !== 'roughing' || feature.kind === 'hole') return feature
  return { ...feature, insideCornerRadiusMm: null, floorRadiusMm: null }
}
