import { z } from 'zod'
import { colletListQuerySchema } from './collet'
import { cutterListQuerySchema } from './cutter'
import { extensionListQuerySchema } from './extension'
import { fixtureListQuerySchema } from './fixture'
import { holderListQuerySchema } from './holder'

const paging = { limit: true, offset: true, cursor: true, sort: true } as const

/** Asked as the list is, without paging and sorting. */
export const countsQuerySchemas = {
  cutter: cutterListQuerySchema.omit(paging),
  holder: holderListQuerySchema.omit(paging),
  collet: colletListQuerySchema.omit(paging),
  extension: extensionListQuerySchema.omit(paging),
  fixture: fixtureListQuerySchema.omit(paging),
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
