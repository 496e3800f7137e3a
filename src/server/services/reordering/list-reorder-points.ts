import type { z } from 'zod'
import type { reorderPointListQuerySchema } from '@/schemas/reordering'
import { db } from '../../db/connection'
import { readReorderPointBlock } from '../../db/read-models/reorder-point-rows'

export function listReorderPoints(query: z.output<typeof reorderPointListQuerySchema>) {
  return readReorderPointBlock(db(), query)
}
