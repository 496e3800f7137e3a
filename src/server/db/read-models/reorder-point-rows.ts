import type { Knex } from 'knex'
import { AppError } from '@/lib/app-error'
import type { PageQuery } from '@/schemas/paging'
import type { ReorderPointRow } from '@/schemas/reordering'
import type { ReorderPointsRow } from '../row-types'
import { reorderPoint } from '../stores/reorder-point-store'
import { catalogueKindOf } from './alert-rows'

interface Selection {
  cribId?: string | undefined
  itemId?: string | undefined
  supplierId?: string | undefined
}

type JoinedRow = ReorderPointsRow & {
  supplier_name: string | null
  item_code: string
  item_kind: string
  description: string
  crib_code: string
  on_hand: number
  position: number
}

/** Reorder points by code and crib, a block at a time; those of archived items rest. */
export async function readReorderPointBlock(
  db: Knex,
  query: PageQuery & Selection,
): Promise<{ rows: ReorderPointRow[]; nextCursor: string | null; total?: number }> {
  const from = firstOf(query)
  const matching = db('reorder_points as point')
    .join('items', 'items.id', 'point.item_id')
    .join('cribs', 'cribs.id', 'point.crib_id')
    .whereNull('items.archived_at')
  if (query.cribId) matching.where('point.crib_id', query.cribId)
  if (query.itemId) matching.where('point.item_id', query.itemId)
  if (query.supplierId) matching.where('point.supplier_id', query.supplierId)
  if (query.q) matching.whereRaw('strpos(items.search_text, lower(?)) > 0', [query.q])
  const rows: JoinedRow[] = await matching
    .clone()
    .leftJoin('stock_levels as level', function byPair() {
      this.on('level.item_id', 'point.item_id').andOn('level.crib_id', 'point.crib_id')
    })
    .leftJoin('suppliers', 'suppliers.id', 'point.supplier_id')
    .select('point.*', {
      supplier_name: 'suppliers.name',
      item_code: 'items.code',
      item_kind: 'items.kind',
      description: 'items.description',
      crib_code: 'cribs.code',
      on_hand: db.raw('coalesce(level.on_hand, 0)'),
      position: db.raw('coalesce(level.on_hand - level.reserved + level.coming, 0)'),
    })
    .orderByRaw('lower(items.code), lower(cribs.code), point.item_id, point.crib_id')
    .limit(query.limit + 1)
    .offset(from)
  const counted = from > 0 ? undefined : await matching.clone().first(db.raw('count(*)::int as total'))
  return {
    rows: rows.slice(0, query.limit).map(row),
    nextCursor: rows.length > query.limit ? String(from + query.limit) : null,
    ...(counted ? { total: counted.total } : {}),
  }
}

/** A point has the two ids of its pair, so a cursor here is a place in the list. */
function firstOf({ cursor, offset }: PageQuery): number {
  if (cursor === undefined) return offset ?? 0
  if (/^\d{1,8}$/.test(cursor)) return Number(cursor)
  throw new AppError('wrong-shape', 'This cursor belongs to another list.', {
    errors: [{ path: 'cursor', message: 'Use the nextCursor of an answer of this list.' }],
  })
}

function row(joined: JoinedRow): ReorderPointRow {
  return {
    ...reorderPoint(joined),
    id: `${joined.item_id}-${joined.crib_id}`,
    itemCode: joined.item_code,
    itemKind: catalogueKindOf(joined.item_kind),
    description: joined.description,
    cribCode: joined.crib_code,
    onHand: joined.on_hand,
    position: joined.position,
  }
}
