import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import { enumFromDb } from '../enum-case'
import { geometryTables } from '../geometry-tables'
import { type CatalogueSelection, matchingCatalogue, piecesSql } from './catalogue-keys'
import { isLowSql } from './stock-summaries'

interface Choice {
  value: string
  label?: string
  count: number
}

/** The one field of each kind's geometry that is chosen from a few. */
const geometryChoices: Readonly<Record<CatalogueKind, 'form' | 'boreKind' | null>> = {
  cutter: 'form',
  holder: 'boreKind',
  collet: null,
  extension: 'boreKind',
  fixture: null,
}

/** Makers worth offering; whoever looks for a rarer one types its name. */
const listedMakers = 200

/**
 * For each filter with choices, how many items of the list each would leave; the filter itself is taken as open, the
 * others as they are. The questions go out at once: each is one pass over what matches.
 */
export async function readCatalogueCounts(
  db: Knex,
  kind: CatalogueKind,
  query: CatalogueSelection,
): Promise<Record<string, Choice[]>> {
  const geometryColumn = geometryChoices[kind]
  const [ofGeometry, maker, condition, locationId, stockState] = await Promise.all([
    geometryColumn ? countGeometry(db, kind, query, geometryColumn) : [],
    countMakers(db, kind, query),
    countConditions(db, kind, query),
    countPlaces(db, kind, query),
    countStockStates(db, kind, query),
  ])
  return {
    ...(geometryColumn ? { [geometryColumn]: ofGeometry } : {}),
    maker,
    condition,
    locationId,
    stockState,
  }
}

/** The items a list would show with one of its filters open. */
function itemsWithout(
  db: Knex,
  kind: CatalogueKind,
  { sort: _, ...query }: CatalogueSelection,
  open: string,
): Promise<{ matching: Knex.QueryBuilder }> {
  return matchingCatalogue(db, kind, { ...query, [open]: undefined })
}

async function idsWithout(...asked: Parameters<typeof itemsWithout>): Promise<{ found: Knex.QueryBuilder }> {
  const { matching } = await itemsWithout(...asked)
  return { found: matching.select('items.id').as('found') }
}

async function countGeometry(
  db: Knex,
  kind: CatalogueKind,
  query: CatalogueSelection,
  field: 'form' | 'boreKind',
): Promise<Choice[]> {
  const column = field === 'form' ? 'form' : 'bore_kind'
  const { found } = await idsWithout(db, kind, query, field)
  const rows = await db(`${geometryTables[kind].name} as geometry`)
    .join(found, 'found.id', 'geometry.item_id')
    .groupBy(`geometry.${column}`)
    .select(db.raw(`geometry.${column} as value, count(*)::int as count`))
  return rows.map(({ value, count }) => ({ value: enumFromDb(value), count }))
}

async function countMakers(db: Knex, kind: CatalogueKind, query: CatalogueSelection): Promise<Choice[]> {
  const { matching } = await itemsWithout(db, kind, query, 'maker')
  const rows: Choice[] = await matching
    .whereNotNull('items.maker')
    .groupBy('items.maker')
    .select(db.raw('items.maker as value, count(*)::int as count'))
    .orderByRaw('count(*) desc, items.maker')
    .limit(listedMakers)
  return rows.map(({ value, count }) => ({ value, count }))
}

async function countConditions(db: Knex, kind: CatalogueKind, query: CatalogueSelection): Promise<Choice[]> {
  const { found } = await idsWithout(db, kind, query, 'condition')
  const place = piecesSql({ locationId: query.locationId })
  const rows = await db('balances as piece')
    .join(found, 'found.id', 'piece.item_id')
    .whereRaw(`piece.quantity > 0 and piece.location_id in (select id from locations where kind = 'bin')`)
    .whereRaw(`true ${place.sql}`, place.bindings)
    .groupBy('piece.condition')
    .select(db.raw('piece.condition as value, count(distinct piece.item_id)::int as count'))
  return rows.map(({ value, count }) => ({ value, count }))
}

/** Cribs and their cabinets; each counts what lies anywhere in it. */
async function countPlaces(db: Knex, kind: CatalogueKind, query: CatalogueSelection): Promise<Choice[]> {
  const { found } = await idsWithout(db, kind, query, 'locationId')
  const asked = piecesSql({ condition: query.condition })
  const rows = await db
    .withRecursive(
      'above',
      db.raw(`
        select id as bin_id, id as place_id from locations where kind = 'bin'
        union all
        select above.bin_id, locations.parent_id from above join locations on locations.id = above.place_id
        where locations.parent_id is not null`),
    )
    .from('balances as piece')
    .join(found, 'found.id', 'piece.item_id')
    .join('above', 'above.bin_id', 'piece.location_id')
    .join('locations as place', 'place.id', 'above.place_id')
    .join('cribs', 'cribs.id', 'place.crib_id')
    .whereIn('place.kind', ['crib', 'cabinet'])
    .whereRaw(`piece.quantity > 0 ${asked.sql}`, asked.bindings)
    .groupBy('place.id', 'cribs.code')
    .orderByRaw(`cribs.code, place.kind <> 'crib', place.code`)
    .select(
      db.raw(`place.id as value, count(distinct piece.item_id)::int as count,
        case place.kind when 'crib' then place.name else cribs.code || ' ' || place.code end as label`),
    )
  return rows.map(({ value, label, count }) => ({ value: String(value), label, count }))
}

async function countStockStates(db: Knex, kind: CatalogueKind, query: CatalogueSelection): Promise<Choice[]> {
  const { found } = await idsWithout(db, kind, query, 'stockState')
  const cribId = (query.cribId as string | undefined) ?? null
  const levels = db('stock_levels').select('item_id').sum('on_hand as on_hand').groupBy('item_id')
  if (cribId) levels.where('crib_id', cribId)
  const low = db('reorder_points')
    .distinct('item_id')
    .whereRaw(isLowSql('reorder_points.item_id'), [cribId, cribId])
  const row = await db
    .from(found)
    .leftJoin(levels.as('level'), 'level.item_id', 'found.id')
    .leftJoin(low.as('low'), 'low.item_id', 'found.id')
    .first(
      db.raw(`count(*) filter (where coalesce(level.on_hand, 0) > 0)::int as in_stock,
        count(*) filter (where coalesce(level.on_hand, 0) = 0)::int as out, count(low.item_id)::int as low`),
    )
  return [
    { value: 'inStock', count: row.in_stock },
    { value: 'low', count: row.low },
    { value: 'out', count: row.out },
  ]
}
