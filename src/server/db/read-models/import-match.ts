import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import { geometryColumns, geometryTables } from '../geometry-tables'

/** How a row of a file names its item. */
export interface ItemKey {
  code: string | null
  maker: string | null
  partNumber: string | null
}

export interface MatchedItem {
  id: string
  kind: string
  version: number
  isArchived: boolean
  /** The code of the item that took it in, where it was merged. */
  mergedIntoCode: string | null
  isTrackedByPiece: boolean
  hasMovements: boolean
  /** The item by the columns of its tables, `segments` with it; empty for an item of another kind. */
  columns: Record<string, unknown>
}

export interface KeyMatches {
  byCode: MatchedItem | null
  /** Items in use with that maker and part number. */
  byNumber: MatchedItem[]
}

const itemColumns = ['code', 'maker', 'part_number', 'description', 'unit_cost_minor']

/**
 * The items that keys name, one answer a key in the same order. Capitals do not matter, as in the unique index of codes.
 * For `stock` (kind null) the geometry is left out and it is told whether the item has movements.
 */
export async function findImportMatches(
  db: Knex,
  kind: CatalogueKind | null,
  keys: readonly ItemKey[],
): Promise<KeyMatches[]> {
  const answers = keys.map((): KeyMatches => ({ byCode: null, byNumber: [] }))
  const { rows } = await db.raw(
    `with asked as (
        select * from unnest(?::text[], ?::text[], ?::text[]) with ordinality as asked (code, maker, part_number, place)
      ), found as (
        select asked.place, true as is_by_code, items.id
          from asked join items on lower(items.code) = lower(asked.code)
        union all
        select asked.place, false, items.id
          from asked join items on lower(items.maker) = lower(asked.maker)
            and lower(items.part_number) = lower(asked.part_number)
          where items.maker is not null and items.part_number is not null and items.archived_at is null
      )
      select found.place, found.is_by_code, items.id, items.kind, items.version, items.is_tracked_by_piece,
        items.archived_at is not null as is_archived,
        case when items.archived_at is not null then (
          select kept.code from item_merges join items as kept on kept.id = item_merges.kept_item_id
          where item_merges.item_id = items.id) end as merged_into_code, ${kind ? geometrySql(kind) : movementsSql}
      from found join items on items.id = found.id ${kind ? geometryJoin(kind) : ''}`,
    [texts(keys, 'code'), texts(keys, 'maker'), texts(keys, 'partNumber')],
  )
  for (const row of rows as MatchRow[]) {
    const answer = answers[Number(row.place) - 1]
    if (row.is_by_code && answer) answer.byCode = matchedItem(row)
    else answer?.byNumber.push(matchedItem(row))
  }
  return answers
}

const movementsSql = `exists (select from movements where movements.item_id = items.id) as has_movements,
  jsonb_build_object('code', items.code) as columns`

function geometrySql(kind: CatalogueKind): string {
  const table = geometryTables[kind]
  const names = [...itemColumns.map((column) => `items.${column}`), ...geometryColumns(table)]
  const pairs = names.map((name) => `'${name.split('.')[1]}', ${name}`).join(', ')
  const segments = table.segments
    ? `|| jsonb_build_object('segments', (
        select jsonb_agg(to_jsonb(piece) - '{item_id,position}'::text[] order by piece.position)
        from ${table.segments.name} as piece where piece.item_id = items.id))`
    : ''
  return `false as has_movements, case when items.kind = '${kind}' then jsonb_build_object(${pairs}) ${segments} end as columns`
}

function geometryJoin(kind: CatalogueKind): string {
  const { name } = geometryTables[kind]
  return `left join ${name} on ${name}.item_id = items.id`
}

/** Knex takes a list of texts for one parameter; that some may be null its types do not know. */
function texts(keys: readonly ItemKey[], member: keyof ItemKey): string[] {
  return keys.map((key) => key[member]) as string[]
}

interface MatchRow {
  place: string
  is_by_code: boolean
  id: string
  kind: string
  version: number
  is_archived: boolean
  merged_into_code: string | null
  is_tracked_by_piece: boolean
  has_movements: boolean
  columns: Record<string, unknown> | null
}

function matchedItem(row: MatchRow): MatchedItem {
  return {
    id: row.id,
    kind: row.kind,
    version: row.version,
    isArchived: row.is_archived,
    mergedIntoCode: row.merged_into_code,
    isTrackedByPiece: row.is_tracked_by_piece,
    hasMovements: row.has_movements,
    columns: row.columns ?? {},
  }
}
