import type { Knex } from 'knex'
import { fixedBoreToleranceMm } from '@/core/holding/holds'
import type { CatalogueKind } from '@/core/stock/kinds'
import type { Bore } from '@/core/tooling'
import type { PageQuery } from '@/schemas/paging'
import { type KeyPage, readKeyPage } from '../key-page'

/** What of an item decides what it holds and what holds it. */
export type Fitting =
  | { shankMm: number }
  | { colletSeries: string; minimumMm: number; maximumMm: number }
  | { bore: Bore }

/** One rounding of a length: a shank of exactly the limit fits. */
const roundingMm = 1e-9

/** Capitals, spaces and hyphens do not count in a series, as `colletFitsBore` of the core has it. */
const plain = (series: string) => `upper(regexp_replace(${series}, '[[:space:]-]', '', 'g'))`

const colletTakes = (shank: string) =>
  `${shank} between collets.minimum_mm - ${roundingMm} and collets.maximum_mm + ${roundingMm}`

const boreTakes = (bore: string, shank: string) =>
  `abs(${bore} - ${shank}) <= ${fixedBoreToleranceMm} + ${roundingMm}`

/** A collet in use of this series that takes this shank. */
const someColletTakes = (series: string, shank: string) => `exists (
  select from collets join items as collet_item on collet_item.id = collets.item_id
  where collet_item.archived_at is null and ${plain('collets.series')} = ${plain(series)} and ${colletTakes(shank)})`

interface Condition {
  sql: string
  values: (string | number)[]
}

/** Under what condition the items of each kind fit; a kind that is not named never does. */
function conditionsFor(fitting: Fitting): Partial<Record<CatalogueKind, Condition>> {
  if ('shankMm' in fitting) {
    const { shankMm } = fitting
    const bored = (table: string): Condition => ({
      sql: `case ${table}.bore_kind when 'fixed' then ${boreTakes(`${table}.bore_diameter_mm`, '?::double precision')}
        else ${someColletTakes(`${table}.bore_series`, '?::double precision')} end`,
      values: [shankMm, shankMm],
    })
    return {
      collet: { sql: colletTakes('?::double precision'), values: [shankMm] },
      holder: bored('holders'),
      extension: bored('extensions'),
    }
  }
  if ('colletSeries' in fitting) {
    const { colletSeries, minimumMm, maximumMm } = fitting
    const bored = (table: string): Condition => ({
      sql: `${table}.bore_kind = 'collet' and ${plain(`${table}.bore_series`)} = ${plain('?::text')}`,
      values: [colletSeries],
    })
    return {
      cutter: {
        sql: `cutters.shank_diameter_mm between ?::double precision and ?::double precision`,
        values: [minimumMm - roundingMm, maximumMm + roundingMm],
      },
      holder: bored('holders'),
      extension: bored('extensions'),
    }
  }
  return conditionsForBore(fitting.bore)
}

function conditionsForBore(bore: Bore): Partial<Record<CatalogueKind, Condition>> {
  if (bore.kind === 'fixed') {
    return {
      cutter: {
        sql: boreTakes('?::double precision', 'cutters.shank_diameter_mm'),
        values: [bore.diameterMm],
      },
    }
  }
  return {
    collet: { sql: `${plain('collets.series')} = ${plain('?::text')}`, values: [bore.series] },
    cutter: { sql: someColletTakes('?::text', 'cutters.shank_diameter_mm'), values: [bore.series] },
  }
}

const geometryTable: Record<CatalogueKind, string> = {
  cutter: 'cutters',
  holder: 'holders',
  collet: 'collets',
  extension: 'extensions',
}

/** One block of the ids of what fits, kind by kind and by code; archived items are left out. */
export function readFitsKeys(
  db: Knex,
  fitting: Fitting,
  query: PageQuery & { kind?: CatalogueKind[] | undefined },
): Promise<KeyPage> {
  const conditions = Object.entries(conditionsFor(fitting)) as [CatalogueKind, Condition][]
  const matching = db('items')
    .whereNull('items.archived_at')
    .where((any) => {
      any.whereRaw('false')
      for (const [kind, condition] of conditions) {
        if (query.kind && !query.kind.includes(kind)) continue
        const table = geometryTable[kind]
        any.orWhereRaw(
          `items.id in (select ${table}.item_id from ${table} where ${condition.sql})`,
          condition.values,
        )
      }
    })
  if (query.q) matching.whereRaw('strpos(items.search_text, lower(?)) > 0', [query.q])
  const sort = [
    { sql: 'items.kind', isNumber: false, isDescending: false },
    { sql: 'lower(items.code)', isNumber: false, isDescending: false },
  ]
  return readKeyPage(db, matching, { sql: 'items.id' }, sort, query)
}
