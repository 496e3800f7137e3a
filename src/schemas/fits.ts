import { z } from 'zod'
import { catalogueKinds } from '@/core/stock/kinds'
import { listQuerySchema, listResponseSchema, setFilter } from './paging'

export const fitsItemSchema = z.object({
  id: z.string(),
  kind: z.enum(catalogueKinds),
  code: z.string(),
  maker: z.string().nullable(),
  partNumber: z.string().nullable(),
  description: z.string(),
  /** What makes it fit: a shank, a fixed bore, a collet's range, a series. */
  shankDiameterMm: z.number().nullable(),
  boreDiameterMm: z.number().nullable(),
  minimumMm: z.number().nullable(),
  maximumMm: z.number().nullable(),
  series: z.string().nullable(),
  /** Where in the collet's range the shank sits: 0 at its smallest, which grips worst, 1 at its largest. */
  placeInRange: z.number().nullable(),
  onHand: z.number(),
})
export type FitsItem = z.infer<typeof fitsItemSchema>

export const fitsListResponseSchema = listResponseSchema(fitsItemSchema)

export const fitsListQuerySchema = listQuerySchema({ kind: setFilter(catalogueKinds) })
