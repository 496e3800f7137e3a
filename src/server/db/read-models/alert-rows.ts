import type { Knex } from 'knex'
import { type CatalogueKind, catalogueKinds } from '@/core/stock/kinds'
import { suggestedOrder } from '@/core/stock/suggested-order'
import type { ItemSize } from '@/schemas/item-size'
import type { PageQuery } from '@/schemas/paging'
import type { AlertResponse } from '@/schemas/reordering'
import { type KeyPage, readKeyPage } from '../key-page'
import { readItemSizes } from './item-sizes'

interface AlertSelection {
  state?: readonly ('open' | 'closed')[] | undefined
  cribId?: string | undefined
  itemId?: string | undefined
}

interface JoinedRow {
  id: string
  item_id: string
  crib_id: string
  opened_at: Date
  closed_at: Date | null
  item_code: string
  item_kind: string
  description: string
  crib_code: string
  places: string[]
  on_hand: number
  position: number
  reorder_point: number | null
  order_up_to: number | null
  pack_size: number | null
  minimum_order: number | null
  supplier_name: string | null
  supplier_part_number: string | null
  lead_time_days: number | null
}

/** Alerts, newest first. */
export async function readAlertPage(
  db: Knex,
  query: PageQuery & AlertSelection,
): Promise<KeyPage & { rows: AlertResponse[] }> {
  const matching = db('alerts')
  const [state, ...others] = query.state ?? []
  if (state === 'open' && others.length === 0) matching.whereNull('alerts.closed_at')
  if (state === 'closed' && others.length === 0) matching.whereNotNull('alerts.closed_at')
  if (query.cribId) matching.where('alerts.crib_id', query.cribId)
  if (query.itemId) matching.where('alerts.item_id', query.itemId)
  if (query.q) {
    matching
      .join('items', 'items.id', 'alerts.item_id')
      .whereRaw('strpos(items.search_text, lower(?)) > 0', [query.q])
  }
  const page = await readKeyPage(db, matching, { sql: 'alerts.id', isDescending: true }, [], query)
  const rows: JoinedRow[] = await joined(db).whereIn('alerts.id', page.ids).orderBy('alerts.id', 'desc')
  return { ...page, rows: await alertsOf(db, rows) }
}

/** What one transaction brought low in a crib and is still of it: what one mail tells of. */
export async function readAlertsOfEvent(db: Knex, eventId: string, cribId: string): Promise<AlertResponse[]> {
  const rows: JoinedRow[] = await joined(db)
    .where({ 'alerts.opened_event': eventId, 'alerts.crib_id': cribId })
    .orderByRaw('lower(items.code), alerts.id')
  return alertsOf(db, rows)
}

async function alertsOf(db: Knex, rows: readonly JoinedRow[]): Promise<AlertResponse[]> {
  const sizes = await readItemSizes(
    db,
    rows.map((row) => row.item_id),
  )
  return rows.map((row) => alert(row, sizes.get(row.item_id) ?? null))
}

/** An empty shelf is told by the bins that held the item. */
function joined(db: Knex): Knex.QueryBuilder {
  return db('alerts')
    .join('items', 'items.id', 'alerts.item_id')
    .join('cribs', 'cribs.id', 'alerts.crib_id')
    .leftJoin('stock_levels as level', function byPair() {
      this.on('level.item_id', 'alerts.item_id').andOn('level.crib_id', 'alerts.crib_id')
    })
    .leftJoin('reorder_points as point', function byPair() {
      this.on('point.item_id', 'alerts.item_id').andOn('point.crib_id', 'alerts.crib_id')
    })
    .leftJoin('suppliers', 'suppliers.id', 'point.supplier_id')
    .select('alerts.id', 'alerts.item_id', 'alerts.crib_id', 'alerts.opened_at', 'alerts.closed_at', {
      item_code: 'items.code',
      item_kind: 'items.kind',
      description: 'items.description',
      crib_code: 'cribs.code',
      reorder_point: 'point.reorder_point',
      order_up_to: 'point.order_up_to',
      pack_size: 'point.pack_size',
      minimum_order: 'point.minimum_order',
      supplier_name: 'suppliers.name',
      supplier_part_number: 'point.supplier_part_number',
      lead_time_days: db.raw('coalesce(point.lead_time_days, suppliers.lead_time_days)'),
      on_hand: db.raw('coalesce(level.on_hand, 0)'),
      position: db.raw('coalesce(level.on_hand - level.reserved + level.coming, 0)'),
      places: db.raw(`array(
        select place.code from balances
        join locations as place on place.id = balances.location_id and place.kind = 'bin'
          and place.crib_id = alerts.crib_id
        where balances.item_id = alerts.item_id
        group by place.code order by sum(balances.quantity) desc, place.code limit 3)`),
    })
}

function alert(row: JoinedRow, size: ItemSize | null): AlertResponse {
  const { order_up_to: orderUpTo, pack_size: packSize, minimum_order: minimumOrder } = row
  const hasRule = orderUpTo !== null && packSize !== null && minimumOrder !== null
  return {
    id: row.id,
    itemId: row.item_id,
    cribId: row.crib_id,
    openedAt: row.opened_at.toISOString(),
    closedAt: row.closed_at?.toISOString() ?? null,
    itemCode: row.item_code,
    itemKind: catalogueKindOf(row.item_kind),
    description: row.description,
    size,
    cribCode: row.crib_code,
    places: row.places,
    onHand: row.on_hand,
    position: row.position,
    reorderPoint: row.reorder_point,
    orderUpTo,
    suggestedQuantity: hasRule ? suggestedOrder(row.position, { orderUpTo, packSize, minimumOrder }) : null,
    supplierName: row.supplier_name,
    supplierPartNumber: row.supplier_part_number,
    leadTimeDays: row.lead_time_days,
  }
}

/** Null for what has no page of its own in the catalogue. */
export function catalogueKindOf(kind: string): CatalogueKind | null {
  return catalogueKinds.find((known) => known === kind) ?? null
}
