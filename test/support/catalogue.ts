import type { Knex } from 'knex'
import { createItem } from './books'

type Row = Record<string, unknown>

/** A square end mill of 6 mm that can be; a test changes what it asks about. */
export const soundCutter: Row = {
  form: 'square',
  cutting_diameter_mm: 6,
  length_of_cut_mm: 12,
  flute_length_mm: 15,
  shank_diameter_mm: 6,
  overall_length_mm: 60,
}

export const soundHolder: Row = {
  taper: 'BT30',
  gauge_length_mm: 60,
  bore_kind: 'collet',
  bore_series: 'ER16',
}
export const soundCollet: Row = { series: 'ER16', minimum_mm: 5, maximum_mm: 6 }
export const soundExtension: Row = { projection_mm: 80, bore_kind: 'fixed', bore_diameter_mm: 6 }

let serial = 0

/** An item with its geometry; the answer is the item's id. */
async function createGeometry(db: Knex, kind: string, row: Row): Promise<string> {
  serial += 1
  return db.transaction(async (trx) => {
    const itemId = await createItem(trx, { kind, code: `${kind}-${serial}` })
    await trx(`${kind}s`).insert({ item_id: itemId, ...row })
    return itemId
  })
}

export const createCutter = (db: Knex, change: Row = {}) =>
  createGeometry(db, 'cutter', { ...soundCutter, ...change })
export const createHolder = (db: Knex, change: Row = {}) =>
  createGeometry(db, 'holder', { ...soundHolder, ...change })
export const createCollet = (db: Knex, change: Row = {}) =>
  createGeometry(db, 'collet', { ...soundCollet, ...change })
export const createExtension = (db: Knex, change: Row = {}) =>
  createGeometry(db, 'extension', { ...soundExtension, ...change })
