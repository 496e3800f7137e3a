import type { Knex } from 'knex'
import { enumToDb } from '../enum-case'
import type { MachineSpindlePointsRow, MachinesRow } from '../row-types'

export interface SpindlePointRecord {
  rpm: number
  powerKw: number | null
  torqueNm: number | null
}

interface MachineColumns {
  code: string
  name: string
  taper: string
  gaugeLineToTableMm: number
  xTravelMm: number | null
  yTravelMm: number | null
  zTravelMm: number
  spindleNoseDiameterMm: number | null
  longestToolMm: number | null
  widestToolMm: number | null
  heaviestToolKg: number | null
  pocketCount: number | null
  minimumRpm: number | null
  maximumRpm: number
  efficiency: number
  note: string
}

export interface MachineRecord extends MachineColumns {
  id: string
  version: number
  locationId: string
  spindlePoints: SpindlePointRecord[]
  archivedAt: string | null
}

/** What is absent is left alone. */
export type MachineChange = { [Field in keyof MachineColumns]?: MachineColumns[Field] | undefined } & {
  spindlePoints?: SpindlePointRecord[] | undefined
}

const columnFields = [
  'code',
  'name',
  'taper',
  'gaugeLineToTableMm',
  'xTravelMm',
  'yTravelMm',
  'zTravelMm',
  'spindleNoseDiameterMm',
  'longestToolMm',
  'widestToolMm',
  'heaviestToolKg',
  'pocketCount',
  'minimumRpm',
  'maximumRpm',
  'efficiency',
  'note',
] as const satisfies readonly (keyof MachineColumns)[]

/** By code. */
export async function listMachines(db: Knex, archived: 'no' | 'only' | 'all'): Promise<MachineRecord[]> {
  const query = db('machines').select('*').orderByRaw('lower(code), id')
  if (archived === 'no') query.whereNull('archived_at')
  if (archived === 'only') query.whereNotNull('archived_at')
  return withPoints(db, await query)
}

export async function findMachine(db: Knex, id: string): Promise<MachineRecord | null> {
  const [machine] = await withPoints(db, await db('machines').where({ id }).select('*'))
  return machine ?? null
}

/** Held until the transaction ends, against other changes of it. */
export async function findLockedMachine(trx: Knex, id: string): Promise<MachineRecord | null> {
  await trx('machines').where({ id }).forNoKeyUpdate().first('id')
  return findMachine(trx, id)
}

/** The database gives it its location. */
export async function createMachine(trx: Knex, machine: MachineChange): Promise<string> {
  const [row] = await trx('machines').insert(columnsOf(machine)).returning('id')
  await insertPoints(trx, row.id, machine.spindlePoints ?? [])
  return row.id
}

/** The points of the curve are replaced all together, and count as a change of the machine. */
export async function updateMachine(trx: Knex, id: string, change: MachineChange): Promise<void> {
  const { spindlePoints } = change
  const columns = columnsOf(change)
  if (spindlePoints !== undefined) {
    await trx('machine_spindle_points').where('machine_id', id).delete()
    await insertPoints(trx, id, spindlePoints)
  }
  if (Object.keys(columns).length === 0 && spindlePoints === undefined) return
  await trx('machines')
    .where({ id })
    .update({ ...columns, updated_at: trx.raw('clock_timestamp()') })
}

export async function setMachineArchived(trx: Knex, id: string, isArchived: boolean): Promise<void> {
  await trx('machines')
    .where({ id })
    .update({ archived_at: isArchived ? trx.fn.now() : null })
}

function columnsOf(change: MachineChange): Record<string, unknown> {
  return Object.fromEntries(
    columnFields
      .filter((field) => change[field] !== undefined)
      .map((field) => [enumToDb(field), change[field]]),
  )
}

async function insertPoints(trx: Knex, machineId: string, points: SpindlePointRecord[]): Promise<void> {
  if (points.length === 0) return
  await trx('machine_spindle_points').insert(
    points.map(({ rpm, powerKw, torqueNm }) => ({
      machine_id: machineId,
      rpm,
      power_kw: powerKw,
      torque_nm: torqueNm,
    })),
  )
}

async function withPoints(db: Knex, rows: MachinesRow[]): Promise<MachineRecord[]> {
  const points: MachineSpindlePointsRow[] = await db('machine_spindle_points')
    .whereRaw('machine_id = any(?::bigint[])', [rows.map((row) => row.id)])
    .orderBy('rpm')
    .select('*')
  return rows.map((row) =>
    fromRow(
      row,
      points.filter((point) => point.machine_id === row.id),
    ),
  )
}

function fromRow(row: MachinesRow, points: MachineSpindlePointsRow[]): MachineRecord {
  return {
    id: row.id,
    version: row.version,
    code: row.code,
    name: row.name,
    locationId: row.location_id,
    taper: row.taper,
    gaugeLineToTableMm: row.gauge_line_to_table_mm,
    xTravelMm: row.x_travel_mm,
    yTravelMm: row.y_travel_mm,
    zTravelMm: row.z_travel_mm,
    spindleNoseDiameterMm: row.spindle_nose_diameter_mm,
    longestToolMm: row.longest_tool_mm,
    widestToolMm: row.widest_tool_mm,
    heaviestToolKg: row.heaviest_tool_kg,
    pocketCount: row.pocket_count,
    minimumRpm: row.minimum_rpm,
    maximumRpm: row.maximum_rpm,
    efficiency: row.efficiency,
    note: row.note,
    spindlePoints: points.map((point) => ({
      rpm: point.rpm,
      powerKw: point.power_kw,
      torqueNm: point.torque_nm,
    })),
    archivedAt: row.archived_at?.toISOString() ?? null,
  }
}
