import type { Knex } from 'knex'
import { fixedBoreToleranceMm } from '@/core/holding/holds'
import type { ToolingKind } from '@/core/stock/kinds'
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

/** The series of which some collet in use takes this shank. Asked once for all chucks, not once for each. */
const seriesThatTake = (shank: string) => `(
  select ${plain('collets.series')} from collets join items as collet_item on collet_item.id = collets.item_id
  where collet_item.archived_at is null and ${colletTakes(shank)})`

const shankBetween = 'cutters.shank_diameter_mm between ?::double precision and ?::double precision'

interface Condition {
  sql: string
  values: (string | number)[]
}

type Conditions = Partial<Record<ToolingKind, Condition>>

/** Under what condition the items of each kind fit; a kind that is not named never does. */
async function conditionsFor(db: Knex, fitting: Fitting): Promise<Conditions> {
  if ('shankMm' in fitting) {
    const { shankMm } = fitting
    const bored = (table: string): Condition => ({
      sql: `case ${table}.bore_kind when 'fixed' then ${boreTakes(`${table}.bore_diameter_mm`, '?::double precision')}
        else ${plain(`${table}.bore_series`)} in ${seriesThatTake('?::double precision')} end`,
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
        sql: shankBetween,
        values: [minimumMm - roundingMm, maximumMm + roundingMm],
      },
      holder: bored('holders'),
      extension: bored('extensions'),
    }
  }
  return conditionsForBore(db, fitting.bore)
}

async function conditionsForBore(db: Knex, bore: Bore): Promise<Conditions> {
  if (bore.kind === 'fixed') {
    return {
      cutter: {
        sql: boreTakes('?::double precision', 'cutters.shank_diameter_mm'),
        values: [bore.diameterMm],
      },
    }
  }
  const ranges = await readShankRanges(db, bore.series)
  return {
    collet: { sql: `${plain('collets.series')} = ${plain('?::text')}`, values: [bore.series] },
    cutter: {
      sql: ['false', ...ranges.map(() => shankBetween)].join(' or '),
      values: ranges.flatMap(({ minimumMm, maximumMm }) => [minimumMm, maximumMm]),
    },
  }
}

/** What the collets of a series take together: a full set is one range or a few, however many collets there are. */
async function readShankRanges(
  db: Knex,
  series: string,
): Promise<{ minimumMm: number; maximumMm: number }[]> {
  const rows = await db('collets')
    .join('items', 'items.id', 'collets.item_id')
    .whereNull('items.archived_at')
    .whereRaw(`${plain('collets.series')} = ${plain('?::text')}`, [series])
    .orderBy('collets.minimum_mm')
    .select('collets.minimum_mm', 'collets.maximum_mm')
  const ranges: { minimumMm: number; maximumMm: number }[] = []
  for (const row of rows) {
    const [minimumMm, maximumMm] = [row.minimum_mm - roundingMm, row.maximum_mm + roundingMm]
    const last = ranges.at(-1)
    if (last && minimumMm <= last.maximumMm) last.maximumMm = Math.max(last.maximumMm, maximumMm)
    else ranges.push({ minimumMm, maximumMm })
  }
  return ranges
}

const geometryTable: Record<ToolingKind, string> = {
  cutter: 'cutters',
  holder: 'holders',
  collet: 'collets',
  extension: 'extensions',
}

/** One block of the ids of what fits, kind by kind and by code; archived items are left out. */
export async function readFitsKeys(
  db: Knex,
  fitting: Fitting,
  query: PageQuery & { kind?: ToolingKind[] | undefined },
): Promise<KeyPage> {
  const conditions = Object.entries(await conditionsFor(db, fitting)) as [ToolingKind, Condition][]
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
