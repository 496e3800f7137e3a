import { z } from 'zod'
import type { CatalogueKind } from '@/core/stock/kinds'
import { colletListQuerySchema } from './collet'
import { cutterListQuerySchema } from './cutter'
import { extensionListQuerySchema } from './extension'
import { fixtureListQuerySchema } from './fixture'
import { holderListQuerySchema } from './holder'

const itemFacets = ['maker', 'condition', 'locationId', 'stockState', 'cribId'] as const

/** Of each list, the filters whose choices can be counted. A length's choices are the sizes there are most of. */
export const facetNames = {
  cutter: [
    'form',
    'cuttingDiameterMm',
    'lengthOfCutMm',
    'reachLengthMm',
    'shankDiameterMm',
    'cornerRadiusMm',
    'substrate',
    ...itemFacets,
  ],
  holder: ['boreKind', 'taper', 'series', 'gaugeLengthMm', 'boreDiameterMm', ...itemFacets],
  collet: ['series', 'minimumMm', 'maximumMm', ...itemFacets],
  extension: ['boreKind', 'series', 'projectionMm', 'boreDiameterMm', ...itemFacets],
  fixture: ['heightMm', ...itemFacets],
} as const satisfies Record<CatalogueKind, readonly string[]>

const paging = { limit: true, offset: true, cursor: true, sort: true } as const

/** A list’s filters without its paging and sorting. */
export const catalogueFilterSchemas = {
  cutter: cutterListQuerySchema.omit(paging),
  holder: holderListQuerySchema.omit(paging),
  collet: colletListQuerySchema.omit(paging),
  extension: extensionListQuerySchema.omit(paging),
  fixture: fixtureListQuerySchema.omit(paging),
}

/** Asked as the list is, for the facets named; each costs a pass over what is found, so none is counted unasked. */
export const countsQuerySchemas = {
  cutter: catalogueFilterSchemas.cutter.extend({ of: askedFacets(facetNames.cutter) }),
  holder: catalogueFilterSchemas.holder.extend({ of: askedFacets(facetNames.holder) }),
  collet: catalogueFilterSchemas.collet.extend({ of: askedFacets(facetNames.collet) }),
  extension: catalogueFilterSchemas.extension.extend({ of: askedFacets(facetNames.extension) }),
  fixture: catalogueFilterSchemas.fixture.extend({ of: askedFacets(facetNames.fixture) }),
}

function askedFacets<const Name extends string>(names: readonly Name[]) {
  return z
    .string(`Name what to count: ${names.join(', ')}.`)
    .transform((text) => text.split(','))
    .pipe(z.array(z.enum(names, `Only ${names.join(', ')}.`)))
}

const choicesSchema = z.array(
  z.object({
    /** As the filter takes it. */
    value: z.string(),
    /** Where the value alone says nothing to a person. */
    label: z.string().optional(),
    count: z.number(),
  }),
)

/** By the name of the filter; each is counted as if it alone were open. */
export const catalogueCountsResponseSchema = z.object({ counts: z.record(z.string(), choicesSchema) })
export type CatalogueCounts = z.infer<typeof catalogueCountsResponseSchema>['counts']
