import type { Feature } from '@/core/reach/types'
import type { SearchQuestion } from '@/core/search/types'
import { type ReachSearchRequest, type SearchPurpose, searchLimits } from '@/schemas/reach-search'
import type { SearchFilters } from './search-filters'

/** What a roughing cutter leaves of a feature, in words; null where nothing was asked that it would leave. */
export function leftToFinishing(feature: Feature, purpose: SearchPurpose | null): string | null {
  if (purpose !== 'roughing' || feature.kind === 'hole') return null
  const left = [
    feature.insideCornerRadiusMm == null ? null : 'the inside corner’s radius',
    feature.floorRadiusMm == null ? null : 'the floor’s radius',
  ].filter((words) => words !== null)
  if (left.length === 0) return null
  return `For roughing, ${left.join(' and ')} ${left.length === 1 ? 'is' : 'are'} left to the finishing cutter.`
}

/** The question as the search takes it. */
export function searchQuestion(
  feature: Feature,
  body: ReachSearchRequest,
  { masks, penalties, limits }: Pick<SearchFilters, 'masks' | 'penalties' | 'limits'>,
): SearchQuestion {
  const { shankMm, holderMm } = body.clearances ?? {}
  return {
    feature,
    purpose: body.purpose ?? null,
    scallop: body.scallop ?? null,
    clearances: {
      ...(shankMm == null ? {} : { shankMm }),
      ...(holderMm == null ? {} : { holderMm }),
    },
    masks,
    penalties,
    longestStickOutToDiameter: body.where?.longestStickOutToDiameter ?? null,
    gaugeLengthMm: limits.gaugeLengthMm,
    spindleNoseDiameterMm: limits.spindleNoseDiameterMm,
    perCutter: body.perCutter ?? null,
    ...searchLimits(body),
  }
}
