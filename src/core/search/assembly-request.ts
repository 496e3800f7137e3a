import type { ReachRequest } from '@/core/reach/types'
import { askedFeature } from './asked-feature'
import type { SearchTables } from './search-tables'
import type { AssemblyParts, SearchQuestion } from './types'

/**
 * The reach request that asks about one assembly what the search asked: its answer is the option's.
 *
 * Assumes indexes of the tables' own crib.
 *
 * Units      Millimetres, degrees.
 * Result     Without a stick-out: the required one is used.
 *
 * @example
 * assemblyRequest(searchTables({ cutters: [{ id: 'a', geometry: squareCutter }], holders: [{ id: 'b', geometry: handHolder, bore: null, taper: null }], collets: [], extensions: [] }, defaultReachSettings), { feature: { kind: 'wall', depthMm: 5 } }, { cutterIndex: 0, holderIndex: 0, colletIndex: null, extensionIndex: null }).holder.gaugeLengthMm // => 100
 */
export function assemblyRequest(
  { tooling, settings }: Pick<SearchTables, 'tooling' | 'settings'>,
  question: Pick<SearchQuestion, 'feature' | 'purpose' | 'clearances' | 'spindleNoseDiameterMm'>,
  { cutterIndex, holderIndex, colletIndex, extensionIndex }: AssemblyParts,
): ReachRequest {
  const holder = tooling.holders[holderIndex]!
  const extension = extensionIndex === null ? null : tooling.extensions[extensionIndex]!
  return {
    feature: askedFeature(question),
    cutter: tooling.cutters[cutterIndex]!.geometry,
    holder:
      question.spindleNoseDiameterMm == null
        ? holder.geometry
        : { ...holder.geometry, spindleNoseDiameterMm: question.spindleNoseDiameterMm },
    collet: colletIndex === null ? null : tooling.collets[colletIndex]!.geometry,
    extension: extension?.geometry ?? null,
    bore: (extension ?? holder).bore,
    clearances: question.clearances ?? null,
    settings,
  }
}
