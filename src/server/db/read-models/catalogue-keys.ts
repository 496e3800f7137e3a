import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import type { PageQuery } from '@/schemas/paging'
import { enumToDb } from '../enum-case'
import { type GeometryTable, geometryTables } from '../geometry-tables'
import { type KeyPage, readAllKeys, readKeyPage, type SortKey } from '../key-page'
import { whereMatchesSearch } from '../search-predicate'
import { findKeptOfCode } from '../stores/merge-store'
import { pocketFilterColumns } from './pocket-figures'
import { isLowSql } from './stock-summaries'

/** A list as it is asked for: paging, and filters by the name of their field. */
export type CatalogueQuery = PageQuery & Record<string, unknown>
/** The same without the paging. */
export type CatalogueSelection = Pick<PageQuery, 'q' | 'sort'> & Record<string, unknown>

/** Two lengths that differ by less are the same to a filter. */
const filterToleranceMm = 1e-6

const itemTextColumns: Record<string, string> = {
  code: 'items.code',
  maker: 'items.maker',
  partNumber: 'items.part_number',
  description: 'items.description',
}

/** The ids of one block of the catalogue's items of a kind. */
export async function readCatalogueKeys(
  db: Knex,
  kind: CatalogueKind,
  query: CatalogueQuery,
): Promise<KeyPage> {
  const { matching, sort } = matchingItems(db, kind, query, await readKeptIds(db, kind, query))
  return readKeyPage(db, matching, { sql: 'items.id' }, sort, query)
}

/** The ids of all items of a kind that a list would show, in its order. */
export async function readAllCatalogueKeys(
  db: Knex,
  kind: CatalogueKind,
  query: CatalogueSelection,
): Promise<string[]> {
  const { matching, sort } = matchingItems(db, kind, query, await readKeptIds(db, kind, query))
  return readAllKeys(db, matching, { sql: 'items.id' }, sort)
}

/** The items (of the table `items`) that a list shows, to be counted; in a member, since a bare builder would be awaited. */
export async function matchingCatalogue(
  db: Knex,
  kind: CatalogueKind,
  query: Omit<CatalogueSelection, 'sort'>,
): Promise<{ matching: Knex.QueryBuilder }> {
  const { matching } = matchingItems(db, kind, query, await readKeptIds(db, kind, query))
  return { matching }
}

/** The ids and versions of all items a list would show, by id: what it found, and how it was. */
export async function readFoundVersions(
  db: Knex,
  kind: CatalogueKind,
  query: Omit<CatalogueSelection, 'sort'>,
): Promise<{ id: string; version: number }[]> {
  const { matching } = await matchingCatalogue(db, kind, query)
  return matching.select('items.id', 'items.version').orderBy('items.id')
}

/** Who searches by the code of an item that was merged means the one that took it in. */
async function readKeptIds(db: Knex, kind: CatalogueKind, query: CatalogueSelection): Promise<string[]> {
  return query.q ? findKeptOfCode(db, kind, query.q) : []
}

function matchingItems(
  db: Knex,
  kind: CatalogueKind,
  query: CatalogueSelection,
  keptIds: readonly string[],
): { matching: Knex.QueryBuilder; sort: SortKey[] } {
  const table = geometryTables[kind]
  const sort = (query.sort?.length ? query.sort : [{ field: 'code', isDescending: false }]).map(
    (term): SortKey => ({ ...sortColumn(table, term.field), isDescending: term.isDescending }),
  )
  const matching = db('items').where('items.kind', kind)
  joinWhatIsAsked(db, matching, table, query, sort)
  whereArchived(matching, query.archived)
  if (query.q) whereSearched(matching, query.q, keptIds)
  whereFields(matching, table, query)
  whereStockState(matching, query)
  wherePieces(matching, query)
  return { matching, sort }
}

/** The ids stand in the query only where there are any, so that the usual search keeps its index. */
function whereSearched(matching: Knex.QueryBuilder, text: string, keptIds: readonly string[]): void {
  if (keptIds.length === 0) whereMatchesSearch(matching, text)
  else {
    matching.where((any) => {
      any.where((found) => whereMatchesSearch(found, text)).orWhereIn('items.id', [...keptIds])
    })
  }
}

function sortColumn(table: GeometryTable, field: string): Omit<SortKey, 'isDescending'> {
  const text = itemTextColumns[field]
  if (text) return { sql: `lower(${text})`, isNumber: false }
  if (field === 'unitCost') return { sql: 'items.unit_cost_minor', isNumber: true }
  if (field === 'onHand') return { sql: 'coalesce(level.on_hand, 0)', isNumber: true }
  if (field === 'available') return { sql: 'coalesce(level.available, 0)', isNumber: true }
  const isNumber = /(Mm|Deg|Count|Rpm)$/.test(field)
  const column = geometryColumn(table, field)
  return { sql: isNumber ? column : `lower(${column})`, isNumber }
}

function geometryColumn(table: GeometryTable, field: string): string {
  const worked = pocketFilterColumns[field]
  if (worked) return worked
  return `${table.name}.${field === 'series' && table.hasBore ? 'bore_series' : enumToDb(field)}`
}

/** Joins cost time in a long list: only what a filter or the sorting looks at is joined. */
function joinWhatIsAsked(
  db: Knex,
  matching: Knex.QueryBuilder,
  table: GeometryTable,
  query: CatalogueSelection,
  sort: readonly SortKey[],
): void {
  const sorted = sort.map((key) => key.sql).join()
  const isGeometryFiltered = geometryFilters(table).some((name) => query[name] !== undefined)
  if (sorted.includes(`${table.name}.`) || isGeometryFiltered) {
    matching.join(table.name, `${table.name}.item_id`, 'items.id')
  }
  if (!sorted.includes('level.') && !query.stockState) return
  const levels = db('stock_levels')
    .select('item_id')
    .select(db.raw('sum(on_hand)::int as on_hand, sum(on_hand - reserved)::int as available'))
    .groupBy('item_id')
  if (query.cribId) levels.where('crib_id', query.cribId as string)
  matching.leftJoin(levels.as('level'), 'level.item_id', 'items.id')
}

function geometryFilters(table: GeometryTable): string[] {
  const fields = [
    ...table.fields,
    ...(table.hasBore ? ['series', 'boreKind', 'boreDiameterMm'] : []),
    ...(table.name === 'cutters' ? Object.keys(pocketFilterColumns) : []),
  ]
  return fields.flatMap((field) => [field, `${field}.min`, `${field}.max`])
}

function whereArchived(matching: Knex.QueryBuilder, archived: unknown): void {
  if (archived === 'no') matching.whereNull('items.archived_at')
  if (archived === 'only') matching.whereNotNull('items.archived_at')
}

function whereFields(matching: Knex.QueryBuilder, table: GeometryTable, query: CatalogueSelection): void {
  for (const [field, column] of Object.entries(itemTextColumns)) {
    const text = query[field]
    if (typeof text === 'string' && text) {
      matching.whereRaw(`strpos(lower(${column}), lower(?)) > 0`, [text])
    }
  }
  for (const filter of [...geometryFilters(table), 'unitCost', 'unitCost.min', 'unitCost.max']) {
    const [field = '', bound] = filter.split('.')
    const column = field === 'unitCost' ? 'items.unit_cost_minor' : geometryColumn(table, field)
    const value = query[filter]
    if (Array.isArray(value)) whereOneOf(matching, column, isEnumField(table, field), value.map(String))
    else if (typeof value === 'number') whereNumber(matching, column, bound, value)
  }
}

function isEnumField(table: GeometryTable, field: string): boolean {
  return field === 'boreKind' || table.enums.includes(field)
}

/** Enums are asked for as they stand: of a column itself the planner knows how many rows a value has, of `lower` nothing. */
function whereOneOf(matching: Knex.QueryBuilder, column: string, isEnum: boolean, values: string[]): void {
  if (isEnum) matching.whereRaw(`${column} = any(?)`, [values.map(enumToDb)])
  else matching.whereRaw(`lower(${column}) = any(?)`, [values.map((value) => value.toLowerCase())])
}

function whereNumber(
  matching: Knex.QueryBuilder,
  column: string,
  bound: string | undefined,
  value: number,
): void {
  if (bound !== 'max') matching.whereRaw(`${column} >= ?::double precision`, [value - filterToleranceMm])
  if (bound !== 'min') matching.whereRaw(`${column} <= ?::double precision`, [value + filterToleranceMm])
}

/** Any of the states asked for; an item that is out may be low as well. */
function whereStockState(matching: Knex.QueryBuilder, query: CatalogueSelection): void {
  const states = query.stockState
  if (!Array.isArray(states)) return
  const cribId = (query.cribId as string | undefined) ?? null
  matching.where((any) => {
    if (states.includes('inStock')) any.orWhereRaw('coalesce(level.on_hand, 0) > 0')
    if (states.includes('out')) any.orWhereRaw('coalesce(level.on_hand, 0) = 0')
    if (states.includes('low')) any.orWhereRaw(isLowSql('items.id'), [cribId, cribId])
  })
}

/** Has pieces of these conditions in a bin of this place, where either is asked for. */
function wherePieces(matching: Knex.QueryBuilder, query: CatalogueSelection): void {
  const { sql, bindings } = piecesSql(query)
  if (sql === '') return
  matching.whereRaw(
    `exists (select from balances as piece where piece.item_id = items.id and piece.quantity > 0 ${sql})`,
    bindings,
  )
}

/** What is asked of a balance called `piece`: its condition, and a place with all that stands in it. */
export function piecesSql({ condition, locationId }: Record<string, unknown>): {
  sql: string
  bindings: readonly (string | string[])[]
} {
  const conditions = Array.isArray(condition) ? [condition.map(String)] : []
  const places = typeof locationId === 'string' ? [locationId] : []
  if (conditions.length + places.length === 0) return { sql: '', bindings: [] }
  return {
    sql: `and piece.location_id in (select id from locations where kind = 'bin')
      ${conditions.length > 0 ? 'and piece.condition = any(?)' : ''}
      ${places.length > 0 ? `and piece.location_id in (${locationTreeSql})` : ''}`,
    bindings: [...conditions, ...places],
  }
}

const locationTreeSql = `
  with recursive below as (
    select id from locations where id = ?
    union all
    select inner_place.id from locations as inner_place join below on inner_place.parent_id = below.id)
  select id from below`
