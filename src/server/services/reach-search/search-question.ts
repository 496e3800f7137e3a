import type { Feature } from '@/core/reach/types'
import type { SearchQuestion } from '@/core/search/types'
import { type ReachSearchRequest, type SearchPurpose, searchLimits } from '@/schemas/reach-search'
import type { MachineLimits } from './machine-limits'
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

/** What of the question is asked of every assembly, whatever else of the crib there is. */
export function assemblyQuestion(
  feature: Feature,
  body: ReachSearchRequest,
  { spindleNoseDiameterMm }: Pick<MachineLimits, 'spindleNoseDiameterMm'>,
): Pick<SearchQuestion, 'feature' | 'purpose' | 'clearances' | 'spindleNoseDiameterMm'> {
  const { shankMm, holderMm } = body.clearances ?? {}
  return {
    feature,
    purpose: body.purpose ?? null,
    clearances: {
      ...(shankMm == null ? {} : { shankMm }),
      ...(holderMm == null ? {} : { holderMm }),
    },
    spindleNoseDiameterMm,
  }
}

/** The question as the search takes it. */
export function searchQuestion(
  feature: Feature,
  body: ReachSearchRequest,
  { masks, penalties, limits }: Pick<SearchFilters, 'masks' | 'penalties' | 'limits'>,
): SearchQuestion {
  return {
    ...assemblyQuestion(feature, body, limits),
    scallop: body.scallop ?? null,
    masks,
    penalties,
    longestStickOutToDiameter: body.where?.longestStickOutToDiameter ?? null,
    gaugeLengthMm: limits.gaugeLengthMm,
    perCutter: body.perCutter ?? null,
    ...searchLimits(body),
  }
}
