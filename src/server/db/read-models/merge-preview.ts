import type { Knex } from 'knex'
import type { MergePreview } from '@/schemas/duplicate'

type CribOutcome = MergePreview['cribs'][number]

interface CribRow {
  crib_code: string
  kept_point: number | null
  kept_up_to: number | null
  merged_point: number | null
  merged_up_to: number | null
  closes_alert: boolean
  position_before: number
  gained: number
}

/** What a merge does to reordering, for each crib where either item is reordered or low. */
export async function readMergedReordering(
  db: Knex,
  keptItemId: string,
  mergedItemId: string,
): Promise<CribOutcome[]> {
  const { rows } = await db.raw<{ rows: CribRow[] }>(
    `select cribs.code as crib_code,
        kept.reorder_point as kept_point, kept.order_up_to as kept_up_to,
        merged.reorder_point as merged_point, merged.order_up_to as merged_up_to,
        exists (select from alerts where (item_id, crib_id) = (:merged, cribs.id) and closed_at is null)
          as closes_alert,
        coalesce(level.on_hand - level.reserved + level.coming, 0) as position_before,
        coalesce(gain.on_hand + gain.coming, 0) as gained
      from cribs
      left join reorder_points as kept on (kept.item_id, kept.crib_id) = (:kept, cribs.id)
      left join reorder_points as merged on (merged.item_id, merged.crib_id) = (:merged, cribs.id)
      left join stock_levels as level on (level.item_id, level.crib_id) = (:kept, cribs.id)
      left join stock_levels as gain on (gain.item_id, gain.crib_id) = (:merged, cribs.id)
      where kept.item_id is not null or merged.item_id is not null
      order by lower(cribs.code)`,
    { kept: keptItemId, merged: mergedItemId },
  )
  return rows.map(cribOutcome)
}

function cribOutcome(row: CribRow): CribOutcome {
  const { kept_point, kept_up_to, merged_point, merged_up_to } = row
  const kept = kept_point === null || kept_up_to === null ? null : rule(kept_point, kept_up_to)
  const merged = merged_point === null || merged_up_to === null ? null : rule(merged_point, merged_up_to)
  const positionAfter = row.position_before + row.gained
  const reorderPoint = (kept ?? merged)?.reorderPoint ?? null
  return {
    cribCode: row.crib_code,
    kept,
    merged,
    closesAlert: row.closes_alert,
    positionAfter,
    isLowBefore: kept !== null && row.position_before <= kept.reorderPoint,
    isLowAfter: reorderPoint !== null && positionAfter <= reorderPoint,
  }
}

function rule(reorderPoint: number, orderUpTo: number) {
  return { reorderPoint, orderUpTo }
}

/** The codes that lead to an item by merges, however many lie between. */
export async function readEarlierCodes(db: Knex, itemId: string): Promise<string[]> {
  const { rows } = await db.raw<{ rows: { code: string }[] }>(
    `with recursive earlier as (
        select item_id from item_merges where kept_item_id = ?
        union
        select item_merges.item_id from earlier join item_merges on item_merges.kept_item_id = earlier.item_id)
      select code from earlier join items on items.id = earlier.item_id order by lower(code)`,
    [itemId],
  )
  return rows.map(({ code }) => code)
}
