import type { Knex } from 'knex'

export interface BinKey {
  cribCode: string | null
  locationCode: string | null
}

export interface BinMatch {
  /** The crib named, or the only one there is where none is named. */
  cribCode: string | null
  location: { id: string; kind: string; isArchived: boolean; bins: BinSpan | null } | null
}

/** The bins in use under a place that holds none itself. */
export interface BinSpan {
  count: number
  first: string
  last: string
}

/** The places that rows of opening stock name, one answer a key in the same order. */
export async function findImportPlaces(db: Knex, keys: readonly BinKey[]): Promise<BinMatch[]> {
  const { rows } = await db.raw(
    `with asked as (
        select * from unnest(?::text[], ?::text[]) with ordinality as asked (crib, location, place)
      ), only_crib as (
        select min(id) as id from cribs having count(*) = 1
      )
      select asked.place, cribs.code as crib_code, locations.id, locations.kind,
        locations.archived_at is not null as is_archived, within.count, within.first, within.last
      from asked
      left join cribs on lower(cribs.code) = lower(asked.crib)
        or (asked.crib is null and cribs.id = (select id from only_crib))
      left join locations on locations.crib_id = cribs.id and lower(locations.code) = lower(asked.location)
      left join lateral (
        with recursive below as (
          select id, kind, code, archived_at from locations as top where top.id = locations.id and top.kind <> 'bin'
          union all
          select child.id, child.kind, child.code, child.archived_at
          from locations as child join below on child.parent_id = below.id
        )
        select count(*)::int as count, min(code) as first, max(code) as last
        from below where kind = 'bin' and archived_at is null
      ) as within on true
      order by asked.place`,
    [texts(keys, 'cribCode'), texts(keys, 'locationCode')],
  )
  return (rows as PlaceRow[]).map((row) => ({
    cribCode: row.crib_code,
    location: row.id
      ? {
          id: row.id,
          kind: row.kind ?? '',
          isArchived: row.is_archived,
          bins:
            row.count && row.first !== null && row.last !== null
              ? { count: row.count, first: row.first, last: row.last }
              : null,
        }
      : null,
  }))
}

function texts(keys: readonly BinKey[], member: keyof BinKey): string[] {
  return keys.map((key) => key[member]) as string[]
}

interface PlaceRow {
  crib_code: string | null
  id: string | null
  kind: string | null
  is_archived: boolean
  count: number | null
  first: string | null
  last: string | null
}
