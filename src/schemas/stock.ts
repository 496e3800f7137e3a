import { z } from 'zod'
import { conditions, shopLocationKinds } from '@/core/stock/kinds'

export const balanceResponseSchema = z.object({
  locationId: z.string(),
  locationCode: z.string(),
  locationName: z.string(),
  locationKind: z.enum(shopLocationKinds),
  /** Null in hands, on machines and out for regrinding. */
  cribId: z.string().nullable(),
  cribCode: z.string().nullable(),
  condition: z.enum(conditions),
  quantity: z.number(),
})
export type BalanceResponse = z.infer<typeof balanceResponseSchema>

/** Over all cribs; the far ends of the books are not among the balances. */
export const itemStockResponseSchema = z.object({
  onHand: z.number(),
  reserved: z.number(),
  available: z.number(),
  coming: z.number(),
  balances: z.array(balanceResponseSchema),
})
export type ItemStockResponse = z.infer<typeof itemStockResponseSchema>
