import { z } from 'zod'

export const firstDaySteps = ['settings', 'bins', 'catalogue', 'stock', 'people'] as const
export type FirstDayStep = (typeof firstDaySteps)[number]

/** What the shop has of what its first day brings, told from the data itself. */
export const firstDayResponseSchema = z.object({
  isDone: z.record(z.enum(firstDaySteps), z.boolean()),
  cribs: z.number(),
  bins: z.number(),
  cutters: z.number(),
  holders: z.number(),
  collets: z.number(),
  extensions: z.number(),
  piecesInBins: z.number(),
  people: z.number(),
})
export type FirstDay = z.infer<typeof firstDayResponseSchema>
