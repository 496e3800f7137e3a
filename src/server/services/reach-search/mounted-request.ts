import type { Feature, ReachRequest } from '@/core/reach/types'
import type { SearchTables } from '@/core/search/search-tables'
import type { AssemblyParts } from '@/core/search/types'
import { askedFeature } from '@/lib/asked-feature'
import type { ReachSearchRequest } from '@/schemas/reach-search'
import type { MachineLimits } from './machine-limits'

/** The reach check of an assembly of the tables, before a stick-out is set; null where a part is not among them. */
export function asMounted(
  parts: AssemblyParts,
  feature: Feature,
  { tooling, settings }: Pick<SearchTables, 'tooling' | 'settings'>,
  body: ReachSearchRequest,
  limits: Pick<MachineLimits, 'spindleNoseDiameterMm'>,
): ReachRequest | null {
  const cutter = tooling.cutters[parts.cutterIndex]
  const holder = tooling.holders[parts.holderIndex]
  if (!cutter || !holder) return null
  const collet = parts.colletIndex === null ? null : (tooling.collets[parts.colletIndex] ?? null)
  const extension = parts.extensionIndex === null ? null : (tooling.extensions[parts.extensionIndex] ?? null)
  const { shankMm, holderMm } = body.clearances ?? {}
  return {
    feature: askedFeature(feature, body.purpose ?? null),
    cutter: cutter.geometry,
    holder: { ...holder.geometry, spindleNoseDiameterMm: limits.spindleNoseDiameterMm },
    collet: collet?.geometry ?? null,
    extension: extension?.geometry ?? null,
    bore: (extension ?? holder).bore,
    clearances: {
      ...(shankMm == null ? {} : { shankMm }),
      ...(holderMm == null ? {} : { holderMm }),
    },
    sideLoadN: body.sideLoadN ?? null,
    settings,
  }
}
