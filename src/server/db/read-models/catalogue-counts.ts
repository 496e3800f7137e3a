import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import { enumFromDb, enumToDb } from '../enum-case'
import { geometryTables } from '../geometry-tables'
import { type CatalogueSelection, matchingCatalogue, piecesSql } from './catalogue-keys'
import { isLowSql } from './stock-summaries'

export interface Choice {
  value: string
  label?: string
  count: number
}

interface Asked {
  db: Knex
  kind: CatalogueKind
  query: CatalogueSelection
  facet: string
}

/** Choices worth offering; whoever looks for a rarer one types it. */
const listedChoices = 200
const listedSizes = 30

/** What is counted in its own way; any other facet is a column of the kind's geometry. */
const ownWays: Readonly<Record<string, (asked: Asked) => Promise<Choice[]>>> = {
  maker: countMakers,
  condition: countConditions,
  locationId: countPlaces,
  stockState: countStockStates,
  cribId: countCribs,
}

/**
 * For each facet asked for, how many items of the list each of its choices would leave; the facet itself is taken as
 * open, the other filters as they are. The questions go out at once: each is one pass over what matches.
 */
export async function readCatalogueCounts(
  db: Knex,
  kind: CatalogueKind,
  { of: facets, ...query }: CatalogueSelection & { of: readonly string[] },
): Promise<Record<string, Choice[]>> {
  const counts = await Promise.all(
    facets.map(async (facet) => {
      const count = ownWays[facet] ?? (facet.endsWith('Mm') ? countSizes : countValues)
      return [facet, await count({ db, kind, query, facet })] as const
    }),
  )
  return Object.fromEntries(counts)
}

/** The items a list would show with one of its filters open; in a member, since a bare builder would be awaited. */
async function foundOpen({ db, kind, query: { sort: _, ...query }, facet }: Asked) {
  const open = { ...query, [facet]: undefined, [`${facet}.min`]: undefined, [`${facet}.max`]: undefined }
  const { matching } = await matchingCatalogue(db, kind, open)
  return { matching, found: matching.clone().select('items.id').as('found') }
}

/** Each value of a column of the geometry: a form, a taper, a series. */
async function countValues(asked: Asked): Promise<Choice[]> {
  const { name, enums } = geometryTables[asked.kind]
  const column = geometryColumn(asked)
  const { found } = await foundOpen(asked)
  const isEnum = enums.includes(asked.facet)
  const rows = await asked
    .db(`${name} as geometry`)
    .join(found, 'found.id', 'geometry.item_id')
    .whereNotNull(column)
    .groupBy(column)
    .orderByRaw('count(*) desc, 1')
    .limit(listedChoices)
    .select(asked.db.raw('?? as value, count(*)::int as count', [column]))
  return rows.map(({ value, count }) => ({ value: isEnum ? enumFromDb(value) : value, count }))
}

/** The commonest sizes, smallest first. */
async function countSizes(asked: Asked): Promise<Choice[]> {
  const column = geometryColumn(asked)
  const { found } = await foundOpen(asked)
  const rows: { value: number; count: number }[] = await asked
    .db(`${geometryTables[asked.kind].name} as geometry`)
    .join(found, 'found.id', 'geometry.item_id')
    .whereNotNull(column)
    .groupBy(column)
    .orderByRaw('count(*) desc, 1')
    .limit(listedSizes)
    .select(asked.db.raw('?? as value, count(*)::int as count', [column]))
  return rows
    .sort((one, other) => one.value - other.value)
    .map(({ value, count }) => ({ value: String(value), count }))
}

function geometryColumn({ kind, facet }: Asked): string {
  const isBoreSeries = facet === 'series' && geometryTables[kind].hasBore
  return `geometry.${isBoreSeries ? 'bore_series' : enumToDb(facet)}`
}

async function countMakers(asked: Asked): Promise<Choice[]> {
  const { matching } = await foundOpen(asked)
  const rows: Choice[] = await matching
    .whereNotNull('items.maker')
    .groupBy('items.maker')
    .select(asked.db.raw('items.maker as value, count(*)::int as count'))
    .orderByRaw('count(*) desc, items.maker')
    .limit(listedChoices)
  return rows.map(({ value, count }) => ({ value, count }))
}

async function countConditions(asked: Asked): Promise<Choice[]> {
  const { found } = await foundOpen(asked)
  const place = piecesSql({ locationId: asked.query.locationId })
  const rows = await asked
    .db('balances as piece')
    .join(found, 'found.id', 'piece.item_id')
    .whereRaw(`piece.quantity > 0 and piece.location_id in (select id from locations where kind = 'bin')`)
    .whereRaw(`true ${place.sql}`, place.bindings)
    .groupBy('piece.condition')
    .select(asked.db.raw('piece.condition as value, count(distinct piece.item_id)::int as count'))
  return rows.map(({ value, count }) => ({ value, count }))
}

/** Cribs and their cabinets; each counts what lies anywhere in it. */
async function countPlaces(asked: Asked): Promise<Choice[]> {
  const { db } = asked
  const { found } = await foundOpen(asked)
  const condition = piecesSql({ condition: asked.query.condition })
  const rows = await db
    .withRecursive('above', db.raw(aboveSql))
    .from('balances as piece')
    .join(found, 'found.id', 'piece.item_id')
    .join('above', 'above.bin_id', 'piece.location_id')
    .join('locations as place', 'place.id', 'above.place_id')
    .join('cribs', 'cribs.id', 'place.crib_id')
    .whereIn('above.kind', ['crib', 'cabinet'])
    .whereRaw(`piece.quantity > 0 ${condition.sql}`, condition.bindings)
    .groupBy('place.id', 'cribs.code')
    .orderByRaw(`cribs.code, place.kind <> 'crib', place.code`)
    .select(
      db.raw(`place.id as value, count(distinct piece.item_id)::int as count,
        case place.kind when 'crib' then place.name else cribs.code || ' ' || place.code end as label`),
    )
  return rows.map(({ value, label, count }) => ({ value: String(value), label, count }))
}

/** Of every bin all it stands in, up to the crib. */
const aboveSql = `
  select id as bin_id, id as place_id, parent_id, kind from locations where kind = 'bin'
  union all
  select above.bin_id, outer_place.id, outer_place.parent_id, outer_place.kind
  from above join locations as outer_place on outer_place.id = above.parent_id`

async function countStockStates(asked: Asked): Promise<Choice[]> {
  const { db } = asked
  const { found } = await foundOpen(asked)
  const cribId = (asked.query.cribId as string | undefined) ?? null
  const inStock = db('stock_levels').distinct('item_id').where('on_hand', '>', 0)
  if (cribId) inStock.where('crib_id', cribId)
  const low = db('reorder_points')
    .distinct('item_id')
    .whereRaw(isLowSql('reorder_points.item_id'), [cribId, cribId])
  const row = await db
    .from(found)
    .leftJoin(inStock.as('stocked'), 'stocked.item_id', 'found.id')
    .leftJoin(low.as('low'), 'low.item_id', 'found.id')
    .first(
      db.raw(`count(stocked.item_id)::int as in_stock, (count(*) - count(stocked.item_id))::int as out,
        count(low.item_id)::int as low`),
    )
  return [
    { value: 'inStock', count: row.in_stock },
    { value: 'low', count: row.low },
    { value: 'out', count: row.out },
  ]
}

/** Every crib, with the items in stock there: a crib is what the figures are of, so choosing one leaves all rows. */
async function countCribs(asked: Asked): Promise<Choice[]> {
  const { db } = asked
  const { found } = await foundOpen(asked)
  const stocked = db('stock_levels as level')
    .join(found, 'found.id', 'level.item_id')
    .where('level.on_hand', '>', 0)
    .groupBy('level.crib_id')
    .select('level.crib_id', db.raw('count(*)::int as count'))
  const rows = await db('cribs')
    .leftJoin(stocked.as('stocked'), 'stocked.crib_id', 'cribs.id')
    .orderBy('cribs.code')
    .select('cribs.id as value', 'cribs.name as label', db.raw('coalesce(stocked.count, 0) as count'))
  return rows.map(({ value, label, count }) => ({ value, label, count }))
}
