import type { Knex } from 'knex'
import { AppError } from '@/lib/app-error'
import type { CatalogueCounts } from '@/schemas/catalogue-counts'
import type { PageQuery } from '@/schemas/paging'
import {
  noSupplier,
  type ReorderPointRow,
  type ReorderPointSelection,
  type reorderPointSortFields,
} from '@/schemas/reordering'
import type { ReorderPointsRow } from '../row-types'
import { type ItemInCrib, pairKey, reorderPoint } from '../stores/reorder-point-store'
import { catalogueKindOf } from './alert-rows'

type JoinedRow = ReorderPointsRow & {
  supplier_name: string | null
  item_code: string
  item_kind: string
  description: string
  crib_code: string
  on_hand: number
  position: number
}

const onHandSql = 'coalesce(level.on_hand, 0)'
const positionSql = 'coalesce(level.on_hand - level.reserved + level.coming, 0)'
const isLowSql = `${positionSql} <= point.reorder_point`

const sortSql: Readonly<Record<(typeof reorderPointSortFields)[number], string>> = {
  itemCode: 'lower(items.code)',
  description: 'lower(items.description)',
  cribCode: 'lower(cribs.code)',
  onHand: onHandSql,
  position: positionSql,
  reorderPoint: 'point.reorder_point',
  orderUpTo: 'point.order_up_to',
  packSize: 'point.pack_size',
  minimumOrder: 'point.minimum_order',
  supplierId: 'lower(suppliers.name)',
  supplierPartNumber: 'lower(point.supplier_part_number)',
  leadTimeDays: 'point.lead_time_days',
}

const stateSql = { low: isLowSql, above: `not (${isLowSql})`, out: `${onHandSql} = 0` } as const

/** A block of the list, by code and crib unless sorted otherwise; the points of archived items rest. */
export async function readReorderPointBlock(
  db: Knex,
  query: PageQuery & ReorderPointSelection,
): Promise<{ rows: ReorderPointRow[]; nextCursor: string | null; total?: number }> {
  const from = firstOf(query)
  const keys = await keysOf(db, query)
    .limit(query.limit + 1)
    .offset(from)
  const counted = from > 0 ? undefined : await matching(db, query).first(db.raw('count(*)::int as total'))
  return {
    rows: await readReorderPointRows(db, keys.slice(0, query.limit)),
    nextCursor: keys.length > query.limit ? String(from + query.limit) : null,
    ...(counted ? { total: counted.total } : {}),
  }
}

/** Which rows a list shows, and in what order. */
export async function readAllReorderPointKeys(db: Knex, query: ReorderPointSelection): Promise<ItemInCrib[]> {
  return keysOf(db, query)
}

/** The rows of these keys in their order; one that was taken away meanwhile is left out. */
export async function readReorderPointRows(
  db: Knex,
  keys: readonly ItemInCrib[],
): Promise<ReorderPointRow[]> {
  const rows: JoinedRow[] = await joined(db)
    .whereIn(
      ['point.item_id', 'point.crib_id'],
      keys.map(({ itemId, cribId }) => [itemId, cribId]),
    )
    .select('point.*', {
      supplier_name: 'suppliers.name',
      item_code: 'items.code',
      item_kind: 'items.kind',
      description: 'items.description',
      crib_code: 'cribs.code',
      on_hand: db.raw(onHandSql),
      position: db.raw(positionSql),
    })
  const byKey = new Map(rows.map(row).map((point) => [point.id, point]))
  return keys.flatMap((key) => byKey.get(pairKey(key)) ?? [])
}

/**
 * For each filter with choices, how many points of the list each would leave; the filter itself is taken as open, the
 * others as they are.
 */
export async function readReorderPointCounts(
  db: Knex,
  query: ReorderPointSelection,
): Promise<CatalogueCounts> {
  const [cribId, supplierId, stockState] = await Promise.all([
    matching(db, { ...query, cribId: undefined })
      .groupBy('cribs.id')
      .orderByRaw('lower(cribs.code)')
      .select({ value: 'cribs.id', label: db.raw(`cribs.code || ' · ' || cribs.name`) }, countSql(db)),
    matching(db, { ...query, supplierId: undefined })
      .groupBy('suppliers.id')
      .orderByRaw('lower(suppliers.name) nulls first')
      .select({ value: db.raw('coalesce(suppliers.id::text, ?)', [noSupplier]) }, countSql(db), {
        label: db.raw(`coalesce(suppliers.name, 'None named')`),
      }),
    matching(db, { ...query, stockState: undefined }).first(
      Object.entries(stateSql).map(([state, sql]) =>
        db.raw(`(count(*) filter (where ${sql}))::int as ${state}`),
      ),
    ),
  ])
  return {
    cribId,
    supplierId,
    stockState: Object.keys(stateSql).map((value) => ({ value, count: stockState[value] })),
  }
}

function countSql(db: Knex): Knex.Raw {
  return db.raw('count(*)::int as count')
}

function joined(db: Knex): Knex.QueryBuilder {
  return db('reorder_points as point')
    .join('items', 'items.id', 'point.item_id')
    .join('cribs', 'cribs.id', 'point.crib_id')
    .leftJoin('stock_levels as level', function byPair() {
      this.on('level.item_id', 'point.item_id').andOn('level.crib_id', 'point.crib_id')
    })
    .leftJoin('suppliers', 'suppliers.id', 'point.supplier_id')
}

function matching(db: Knex, query: ReorderPointSelection): Knex.QueryBuilder {
  const found = joined(db).whereNull('items.archived_at')
  const { cribId, itemId, supplierId, stockState, q } = query
  if (cribId) found.where('point.crib_id', cribId)
  if (itemId) found.where('point.item_id', itemId)
  if (supplierId === noSupplier) found.whereNull('point.supplier_id')
  else if (supplierId) found.where('point.supplier_id', supplierId)
  if (stockState) found.whereRaw(`(${stockState.map((state) => stateSql[state]).join(' or ')})`)
  if (q) found.whereRaw('strpos(items.search_text, lower(?)) > 0', [q])
  return found
}

function keysOf(db: Knex, query: ReorderPointSelection): Knex.QueryBuilder {
  const sorted = (query.sort ?? []).map(({ field, isDescending }) => {
    const sql = sortSql[field as keyof typeof sortSql]
    return `${sql} ${isDescending ? 'desc' : 'asc'} nulls last`
  })
  const order = [...sorted, 'lower(items.code)', 'lower(cribs.code)', 'point.item_id', 'point.crib_id']
  return matching(db, query)
    .select({ itemId: 'point.item_id', cribId: 'point.crib_id' })
    .orderByRaw(order.join(', '))
}

/** A point has the two ids of its pair, so a cursor here is a place in the list. */
function firstOf({ cursor, offset }: PageQuery): number {
  if (cursor === undefined) return offset ?? 0
  if (/^\d{1,8}$/.test(cursor)) return Number(cursor)
  throw new AppError('wrong-shape', 'This cursor belongs to another list.', {
    errors: [{ path: 'cursor', message: 'Use the nextCursor of an answer of this list.' }],
  })
}

function row(found: JoinedRow): ReorderPointRow {
  const point = reorderPoint(found)
  return {
    ...point,
    id: pairKey(point),
    itemCode: found.item_code,
    itemKind: catalogueKindOf(found.item_kind),
    description: found.description,
    cribCode: found.crib_code,
    onHand: found.on_hand,
    position: found.position,
  }
}
