import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import type { DuplicateItem, DuplicatesResponse } from '@/schemas/duplicate'
import { enumToDb } from '../enum-case'
import { type GeometryTable, geometryColumns, geometryTables } from '../geometry-tables'
import { readItemSizes } from './item-sizes'

const groupsAtMost = 100

/** Two figures that differ by less are one: a length that came by way of inches is the same length. */
const decimals = 6

/** A geometry as text: every column, and the outline's segments in their order. */
function geometrySql(table: GeometryTable): string {
  const columns = geometryColumns(table).map((column) =>
    /_(mm|deg)$/.test(column) ? `round(${column}::numeric, ${decimals})` : column,
  )
  if (!table.segments) return columns.join(', ')
  const parts = table.segments.fields
    .map(enumToDb)
    .map((field) => (field.endsWith('_mm') ? `round(${field}::numeric, ${decimals})` : field))
  return `${columns.join(', ')}, (select jsonb_agg(jsonb_build_array(${parts.join(', ')}) order by position)
    from ${table.segments.name} where item_id = items.id)`
}

/** Items in use of one geometry and different codes, the fullest groups first. */
export async function readDuplicateGroups(db: Knex, kind: CatalogueKind): Promise<DuplicatesResponse> {
  const table = geometryTables[kind]
  const { rows } = await db.raw<{ rows: { ids: string[]; total: string }[] }>(
    `select array_agg(items.id::text order by lower(items.code)) as ids, count(*) over () as total
      from items join ${table.name} on ${table.name}.item_id = items.id
      where items.archived_at is null
      group by ${geometrySql(table)}
      having count(*) > 1
      order by count(*) desc, min(lower(items.code))
      limit ${groupsAtMost}`,
  )
  const ids = rows.flatMap((row) => row.ids)
  const items = await readDuplicateItems(db, ids)
  const sizes = await readItemSizes(db, ids)
  return {
    groups: rows.flatMap(({ ids }) => {
      const size = sizes.get(ids[0] ?? '')
      const members = ids.flatMap((id) => items.get(id) ?? [])
      return size ? [{ size, items: members.toSorted(byWorth).map(({ item }) => item) }] : []
    }),
    total: Number(rows[0]?.total ?? 0),
  }
}

interface Member {
  item: DuplicateItem
  movements: number
}

/** What the shop lives with comes first: most pieces, then a reorder point, then a history, then the older. */
function byWorth(one: Member, other: Member): number {
  return (
    other.item.onHand - one.item.onHand ||
    other.item.reorderPoints - one.item.reorderPoints ||
    other.movements - one.movements ||
    Number(one.item.id) - Number(other.item.id)
  )
}

async function readDuplicateItems(db: Knex, ids: string[]): Promise<Map<string, Member>> {
  const rows = await db('items')
    .whereRaw('id = any(?::bigint[])', [ids])
    .select('id', 'code', 'maker', 'part_number', 'description', 'is_tracked_by_piece')
    .select(
      db.raw(`(select coalesce(sum(on_hand), 0)::int from stock_levels where item_id = items.id) as on_hand`),
      db.raw(`(select count(*)::int from reorder_points where item_id = items.id) as reorder_points`),
      db.raw(`(select count(*)::int from movements where item_id = items.id) as movements`),
    )
  return new Map(
    rows.map((row) => [
      row.id,
      {
        item: {
          id: row.id,
          code: row.code,
          maker: row.maker,
          partNumber: row.part_number,
          description: row.description,
          isTrackedByPiece: row.is_tracked_by_piece,
          onHand: row.on_hand,
          reorderPoints: row.reorder_points,
        },
        movements: row.movements,
      },
    ]),
  )
}

/** Whether two items of a kind have one geometry, as the groups have it. */
export async function haveSameGeometry(
  db: Knex,
  kind: CatalogueKind,
  ids: readonly [string, string],
): Promise<boolean> {
  const table = geometryTables[kind]
  const { rows } = await db.raw(
    `select count(*) from items join ${table.name} on ${table.name}.item_id = items.id
      where items.id = any(?::bigint[]) group by ${geometrySql(table)}`,
    [[...ids]],
  )
  return rows.length === 1 && Number(rows[0].count) === ids.length
}
