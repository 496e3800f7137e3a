import type { z } from 'zod'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'
import type { reorderPointCountsQuerySchema } from '@/schemas/reordering'
import { db } from '../../db/connection'
import { readReorderPointCounts } from '../../db/read-models/reorder-point-rows'

/** How many reorder points each choice of the filters would leave. */
export async function countReorderPoints(
  query: z.output<typeof reorderPointCountsQuerySchema>,
): Promise<{ counts: CatalogueCounts }> {
  return { counts: await readReorderPointCounts(db(), query) }
}
