import type { Knex } from 'knex'

export interface RotaryStockRecord {
  widthMm: number
  heightMm: number
  offsetXMm: number | null
  offsetYMm: number | null
  axisHeightMm: number
  chuckRadiusMm: number | null
  partDiameterMm: number | null
  centringErrorMm: number | null
}

interface SetUpFields {
  name: string
  highestMm: number
  lowestTipMm: number
  retractClearanceMm: number
  rotaryStock: RotaryStockRecord | null
  fixtures: { itemId: string; baseMm: number }[]
  note: string
}

/** What is absent is left alone. */
export type SetUpChange = { [Field in keyof SetUpFields]?: SetUpFields[Field] | undefined }

export async function createSetUp(trx: Knex, machineId: string, fields: SetUpFields): Promise<string> {
  const [row] = await trx('set_ups')
    .insert({ machine_id: machineId, ...columnsOf(fields) })
    .returning('id')
  await insertFixtures(trx, row.id, fields.fixtures)
  return row.id
}

/** Fixtures are replaced all together, and count as a change of the set-up. */
export async function updateSetUp(trx: Knex, id: string, change: SetUpChange): Promise<void> {
  const columns = columnsOf(change)
  if (change.fixtures !== undefined) {
    await trx('set_up_fixtures').where('set_up_id', id).delete()
    await insertFixtures(trx, id, change.fixtures)
  }
  if (Object.keys(columns).length === 0 && change.fixtures === undefined) return
  await trx('set_ups')
    .where({ id })
    .update({ ...columns, updated_at: trx.raw('clock_timestamp()') })
}

/** Held until the transaction ends, against other changes of it; false where there is none. */
export async function lockSetUp(trx: Knex, id: string): Promise<boolean> {
  return (await trx('set_ups').where({ id }).forNoKeyUpdate().first('id')) !== undefined
}

export async function removeSetUp(trx: Knex, id: string): Promise<void> {
  await trx('set_ups').where({ id }).delete()
}

function columnsOf(change: SetUpChange): Record<string, unknown> {
  const columns = {
    name: change.name,
    highest_mm: change.highestMm,
    lowest_tip_mm: change.lowestTipMm,
    retract_clearance_mm: change.retractClearanceMm,
    note: change.note,
    ...(change.rotaryStock === undefined ? {} : rotaryColumns(change.rotaryStock)),
  }
  return Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined))
}

function rotaryColumns(stock: RotaryStockRecord | null) {
  return {
    stock_width_mm: stock?.widthMm ?? null,
    stock_height_mm: stock?.heightMm ?? null,
    stock_offset_x_mm: stock?.offsetXMm ?? null,
    stock_offset_y_mm: stock?.offsetYMm ?? null,
    axis_height_mm: stock?.axisHeightMm ?? null,
    chuck_radius_mm: stock?.chuckRadiusMm ?? null,
    part_diameter_mm: stock?.partDiameterMm ?? null,
    centring_error_mm: stock?.centringErrorMm ?? null,
  }
}

async function insertFixtures(
  trx: Knex,
  setUpId: string,
  fixtures: readonly { itemId: string; baseMm: number }[],
): Promise<void> {
  if (fixtures.length === 0) return
  await trx('set_up_fixtures').insert(
    fixtures.map(({ itemId, baseMm }, index) => ({
      set_up_id: setUpId,
      position: index + 1,
      item_id: itemId,
      base_mm: baseMm,
    })),
  )
}
