import type { Knex } from 'knex'
import type { Item } from './catalogue'
import type { Places } from './places'

/** How an item is kept in the main crib. */
export interface StockPlan {
  itemId: string
  reorderPoint: number
  orderUpTo: number
  packSize: number
  leadTimeDays: number
}

const suppliers = [
  { name: 'Tolliver Tool Supply', email: 'orders@tolliver.example', lead_time_days: 4 },
  { name: 'Midmarsh Industrial', email: 'sales@midmarsh.example', lead_time_days: 9 },
  { name: 'Brightmoor Direct', email: 'hello@brightmoor.example', lead_time_days: 15 },
]

/** Cutters have a reorder point; of holders, collets and extensions a shop buys one when it needs one. */
export async function loadReorderPoints(trx: Knex, items: Item[], places: Places): Promise<StockPlan[]> {
  const supplierIds = await trx('suppliers').insert(suppliers).returning('id')
  const plans = items
    .filter((item) => item.kind === 'cutter')
    .map((item, index) => {
      const supplier = index % suppliers.length
      const reorderPoint = Math.max(1, Math.round(item.use * (1 + supplier)))
      return {
        itemId: item.id,
        supplier,
        reorderPoint,
        orderUpTo: reorderPoint + Math.max(3, Math.round(item.use * 4)),
        packSize: item.use >= 3 ? 5 : 1,
        leadTimeDays: suppliers[supplier]!.lead_time_days,
      }
    })
  await trx('reorder_points').insert(
    plans.map((plan) => ({
      item_id: plan.itemId,
      crib_id: places.mainCribId,
      reorder_point: plan.reorderPoint,
      order_up_to: plan.orderUpTo,
      pack_size: plan.packSize,
      supplier_id: supplierIds[plan.supplier].id,
      lead_time_days: plan.leadTimeDays,
    })),
  )
  return plans
}
