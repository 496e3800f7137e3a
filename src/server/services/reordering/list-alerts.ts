import type { z } from 'zod'
import type { alertListQuerySchema } from '@/schemas/reordering'
import { db } from '../../db/connection'
import { readAlertPage } from '../../db/read-models/alert-rows'

export function listAlerts(query: z.output<typeof alertListQuerySchema>) {
  return readAlertPage(db(), query)
}
