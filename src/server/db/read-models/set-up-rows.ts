import type { Knex } from 'knex'
import type { MachineSpace } from '@/core/machine/set-up-window'
import type { SetUpsRow } from '../row-types'
import type { RotaryStockRecord } from '../stores/set-up-store'

export interface SetUpFixture {
  itemId: string
  code: string
  description: string
  heightMm: number
  baseMm: number
}

/** A set-up with all that its window is worked out from. */
export interface SetUpRow {
  id: string
  version: number
  machineId: string
  machineCode: string
  machineName: string
  machine: MachineSpace & { taper: string }
  name: string
  highestMm: number
  lowestTipMm: number
  retractClearanceMm: number
  rotaryStock: RotaryStockRecord | null
  fixtures: SetUpFixture[]
  note: string
}

interface JoinedRow extends SetUpsRow {
  machine_code: string
  machine_name: string
  taper: string
  gauge_line_to_table_mm: number
  z_travel_mm: number
  longest_tool_mm: number | null
}

/** By machine and name; of all machines in use where none is named. */
export async function readSetUps(
  db: Knex,
  which: { id?: string; machineId?: string | undefined },
): Promise<SetUpRow[]> {
  const query = db('set_ups')
    .join('machines', 'machines.id', 'set_ups.machine_id')
    .select(
      'set_ups.*',
      'machines.code as machine_code',
      'machines.name as machine_name',
      'machines.taper',
      'machines.gauge_line_to_table_mm',
      'machines.z_travel_mm',
      'machines.longest_tool_mm',
    )
    .orderByRaw('lower(machines.code), machines.id, lower(set_ups.name), set_ups.id')
  if (which.id !== undefined) query.where('set_ups.id', which.id)
  else if (which.machineId !== undefined) query.where('set_ups.machine_id', which.machineId)
  else query.whereNull('machines.archived_at')
  const rows: JoinedRow[] = await query
  const fixtures = await readFixtures(
    db,
    rows.map((row) => row.id),
  )
  return rows.map((row) => fromRow(row, fixtures.get(row.id) ?? []))
}

async function readFixtures(db: Knex, setUpIds: string[]): Promise<Map<string, SetUpFixture[]>> {
  const rows = await db('set_up_fixtures')
    .join('items', 'items.id', 'set_up_fixtures.item_id')
    .join('fixtures', 'fixtures.item_id', 'items.id')
    .whereRaw('set_up_fixtures.set_up_id = any(?::bigint[])', [setUpIds])
    .orderBy(['set_up_fixtures.set_up_id', 'set_up_fixtures.position'])
    .select(
      'set_up_fixtures.set_up_id',
      'set_up_fixtures.base_mm',
      'items.id',
      'items.code',
      'items.description',
      'fixtures.height_mm',
    )
  const bySetUp = new Map<string, SetUpFixture[]>()
  for (const row of rows) {
    const held = bySetUp.get(row.set_up_id) ?? []
    held.push({
      itemId: row.id,
      code: row.code,
      description: row.description,
      heightMm: row.height_mm,
      baseMm: row.base_mm,
    })
    bySetUp.set(row.set_up_id, held)
  }
  return bySetUp
}

function fromRow(row: JoinedRow, fixtures: SetUpFixture[]): SetUpRow {
  return {
    id: row.id,
    version: row.version,
    machineId: row.machine_id,
    machineCode: row.machine_code,
    machineName: row.machine_name,
    machine: {
      taper: row.taper,
      gaugeLineToTableMm: row.gauge_line_to_table_mm,
      zTravelMm: row.z_travel_mm,
      longestToolMm: row.longest_tool_mm,
    },
    name: row.name,
    highestMm: row.highest_mm,
    lowestTipMm: row.lowest_tip_mm,
    retractClearanceMm: row.retract_clearance_mm,
    rotaryStock: rotaryStockOf(row),
    fixtures,
    note: row.note,
  }
}

function rotaryStockOf(row: SetUpsRow): RotaryStockRecord | null {
  if (row.stock_width_mm === null || row.stock_height_mm === null || row.axis_height_mm === null) return null
  return {
    widthMm: row.stock_width_mm,
    heightMm: row.stock_height_mm,
    offsetXMm: row.stock_offset_x_mm,
    offsetYMm: row.stock_offset_y_mm,
    axisHeightMm: row.axis_height_mm,
    chuckRadiusMm: row.chuck_radius_mm,
    partDiameterMm: row.part_diameter_mm,
    centringErrorMm: row.centring_error_mm,
  }
}
