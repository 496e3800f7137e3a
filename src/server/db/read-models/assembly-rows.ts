import type { Knex } from 'knex'
import { type AssemblyPartKind, type AssemblyState, assemblyPartKinds } from '@/core/assemblies/types'
import type { ShopLocationKind } from '@/core/stock/kinds'
import type { AssemblyListQuery, AssemblyMeasurement, AssemblyPlace, AssemblyRow } from '@/schemas/assembly'
import { enumFromDb, enumToDb } from '../enum-case'
import { type KeyPage, readKeyPage, type SortKey } from '../key-page'
import type { AssembliesRow } from '../row-types'

const partCode = (kind: AssemblyPartKind) => `(select lower(items.code) from assembly_parts as part
  join items on items.id = part.item_id where part.assembly_id = assemblies.id and part.kind = '${kind}')`

const sortColumns: Record<string, Omit<SortKey, 'isDescending'>> = {
  number: { sql: 'assemblies.number', isNumber: true },
  name: { sql: 'lower(assemblies.name)', isNumber: false },
  toolNumber: { sql: 'assemblies.tool_number', isNumber: true },
  state: { sql: 'assemblies.state', isNumber: false },
  cutter: { sql: partCode('cutter'), isNumber: false },
  gaugeLength: { sql: 'assemblies.gauge_length_mm', isNumber: true },
  machine: {
    sql: '(select lower(machines.code) from machines where machines.id = assemblies.machine_id)',
    isNumber: false,
  },
  pocket: { sql: 'assemblies.pocket', isNumber: true },
}

const isMarkedSql = `exists (select from assembly_findings as finding
  where finding.assembly_id = assemblies.id and finding.resolved_at is null and finding.is_fault)`

/** The ids of one block of the shop's assemblies. */
export function readAssemblyKeys(db: Knex, query: AssemblyListQuery): Promise<KeyPage> {
  const matching = db('assemblies')
  if (query.state) matching.whereIn('assemblies.state', query.state.map(enumToDb))
  if (query.marked !== undefined) matching.whereRaw(query.marked ? isMarkedSql : `not ${isMarkedSql}`)
  if (query.machineId) matching.where('assemblies.machine_id', query.machineId)
  if (query.inMachine === true) matching.whereNotNull('assemblies.machine_id')
  if (query.inMachine === false) matching.whereNull('assemblies.machine_id')
  if (query.number !== undefined) matching.where('assemblies.number', query.number)
  if (query.archived === 'no') matching.whereNull('assemblies.archived_at')
  if (query.archived === 'only') matching.whereNotNull('assemblies.archived_at')
  if (query.itemId) {
    matching.whereRaw(
      'exists (select from assembly_parts as part where part.assembly_id = assemblies.id and part.item_id = ?)',
      [query.itemId],
    )
  }
  for (const word of query.q?.split(/\s+/).filter(Boolean) ?? []) whereHolds(matching, word)
  const sort = (query.sort?.length ? query.sort : [{ field: 'number', isDescending: false }]).map(
    ({ field, isDescending }): SortKey => ({
      ...(sortColumns[field] ?? { sql: 'assemblies.number', isNumber: true }),
      isDescending,
    }),
  )
  return readKeyPage(db, matching, { sql: 'assemblies.id' }, sort, query)
}

/** A word stands in the name, in a part's code or text, or is the number or the tool number. */
function whereHolds(matching: Knex.QueryBuilder, word: string): void {
  matching.where((any) => {
    any
      .whereRaw('strpos(lower(assemblies.name), lower(?)) > 0', [word])
      .orWhereRaw('assemblies.number::text = ? or assemblies.tool_number::text = ?', [word, word])
      .orWhereRaw(
        `exists (select from assembly_parts as part join items on items.id = part.item_id
          where part.assembly_id = assemblies.id and strpos(items.search_text, lower(?)) > 0)`,
        [word],
      )
  })
}

type JoinedRow = AssembliesRow & {
  created_by_name: string
  machine_code: string | null
  machine_name: string | null
  is_marked: boolean
  is_being_rechecked: boolean
}

/** What lists and the page of an assembly both show. */
export interface AssemblyWithRow extends AssemblyRow {
  note: string
  builtAt: string | null
  brokenDownAt: string | null
  createdAt: string
  createdByName: string
}

/** Assemblies in the order of their ids given. */
export async function readAssemblyRows(db: Knex, ids: readonly string[]): Promise<AssemblyWithRow[]> {
  const rows: JoinedRow[] = await db('assemblies')
    .join('users', 'users.id', 'assemblies.created_by')
    .leftJoin('machines', 'machines.id', 'assemblies.machine_id')
    .whereRaw('assemblies.id = any(?::bigint[])', [[...ids]])
    .select('assemblies.*', {
      created_by_name: 'users.name',
      machine_code: 'machines.code',
      machine_name: 'machines.name',
      is_marked: db.raw(isMarkedSql),
      is_being_rechecked: db.raw(
        'exists (select from assembly_rechecks as due where due.assembly_id = assemblies.id)',
      ),
    })
  const parts = await readPartCodes(db, ids)
  const measurements = await readMeasurements(db, ids)
  const byId = new Map(
    rows.map((row): [string, AssemblyWithRow] => [row.id, assemblyRow(row, parts, measurements)]),
  )
  return ids.flatMap((id) => byId.get(id) ?? [])
}

function assemblyRow(
  row: JoinedRow,
  parts: Map<string, PartCode[]>,
  measurements: Map<string, AssemblyMeasurement[]>,
): AssemblyWithRow {
  const own = parts.get(row.id) ?? []
  return {
    id: row.id,
    version: row.version,
    number: row.number,
    name: row.name,
    note: row.note,
    state: enumFromDb(row.state) as AssemblyState,
    stickOutMm: row.stick_out_mm,
    gaugeLengthMm: row.gauge_length_mm,
    toolNumber: row.tool_number,
    lengthOffsetNumber: row.length_offset_number,
    diameterOffsetNumber: row.diameter_offset_number,
    archivedAt: row.archived_at?.toISOString() ?? null,
    builtAt: row.built_at?.toISOString() ?? null,
    brokenDownAt: row.broken_down_at?.toISOString() ?? null,
    createdAt: row.created_at.toISOString(),
    createdByName: row.created_by_name,
    parts: own.map(({ kind, itemId, code }) => ({ kind, itemId, code })),
    place: own.find(({ place }) => place !== null)?.place ?? null,
    machine:
      row.machine_id === null
        ? null
        : { id: row.machine_id, code: row.machine_code ?? '', name: row.machine_name ?? '' },
    pocket: row.pocket,
    isMarked: row.is_marked,
    isBeingRechecked: row.is_being_rechecked,
    measurement: measurements.get(row.id)?.find(({ isCurrent }) => isCurrent) ?? null,
  }
}

interface PartCode {
  kind: AssemblyPartKind
  itemId: string
  code: string
  place: AssemblyPlace | null
}

async function readPartCodes(db: Knex, ids: readonly string[]): Promise<Map<string, PartCode[]>> {
  const rows = await db('assembly_parts as part')
    .join('items', 'items.id', 'part.item_id')
    .leftJoin('locations as place', 'place.id', 'part.location_id')
    .whereRaw('part.assembly_id = any(?::bigint[])', [[...ids]])
    .orderByRaw('array_position(?::text[], part.kind)', [assemblyPartKinds.map(enumToDb)])
    .select('part.assembly_id', 'part.kind', 'part.item_id', 'items.code', ...placeColumns('place'))
  return grouped(rows, (row) => ({
    kind: enumFromDb(row.kind) as AssemblyPartKind,
    itemId: row.item_id,
    code: row.code,
    place: placeOf(row, 'place'),
  }))
}

/** The measurements of assemblies, the newest of each first. */
export async function readMeasurements(
  db: Knex,
  ids: readonly string[],
): Promise<Map<string, AssemblyMeasurement[]>> {
  const rows = await db('assembly_measurements as measured')
    .join('assemblies', 'assemblies.id', 'measured.assembly_id')
    .join('users', 'users.id', 'measured.actor_id')
    .whereRaw('measured.assembly_id = any(?::bigint[])', [[...ids]])
    .orderBy('measured.id', 'desc')
    .select('measured.*', {
      actor_name: 'users.name',
      is_current: db.raw(
        "assemblies.state = 'built' and measured.measured_at >= assemblies.stick_out_set_at",
      ),
    })
  return grouped(rows, (row) => ({
    id: row.id,
    gaugeLengthMm: row.gauge_length_mm,
    diameterMm: row.diameter_mm,
    expectedGaugeLengthMm: row.expected_gauge_length_mm,
    expectedDiameterMm: row.expected_diameter_mm,
    source: enumFromDb(row.source) as AssemblyMeasurement['source'],
    actorName: row.actor_name,
    measuredAt: row.measured_at.toISOString(),
    isCurrent: row.is_current,
  }))
}

function grouped<Row extends { assembly_id: string }, Value>(
  rows: readonly Row[],
  read: (row: Row) => Value,
): Map<string, Value[]> {
  const groups = new Map<string, Value[]>()
  for (const row of rows) groups.set(row.assembly_id, [...(groups.get(row.assembly_id) ?? []), read(row)])
  return groups
}

/** A joined location's columns, under names of their own. */
export function placeColumns(table: string): string[] {
  return ['id', 'kind', 'code', 'name'].map((column) => `${table}.${column} as ${table}_${column}`)
}

/** The place of a joined row; null where there is none. */
export function placeOf(row: Record<string, unknown>, table: string): AssemblyPlace | null {
  const id = row[`${table}_id`]
  if (id === null || id === undefined) return null
  return {
    locationId: String(id),
    kind: enumFromDb(String(row[`${table}_kind`])) as ShopLocationKind,
    code: String(row[`${table}_code`]),
    name: String(row[`${table}_name`]),
    cribCode: (row[`${table}_crib_code`] as string | null | undefined) ?? null,
  }
}
