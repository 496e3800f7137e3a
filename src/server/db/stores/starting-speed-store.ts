import type { Knex } from 'knex'
import type { IsoGroup } from '@/core/speeds/iso-groups'
import { isoGroups } from '@/core/speeds/iso-groups'
import type { Substrate } from '@/core/tooling'
import type { StartingSpeedsRow } from '../row-types'

export interface StartingSpeedFields {
  isoGroup: IsoGroup
  material: string
  substrate: Substrate
  lowMPerMin: number
  highMPerMin: number
  sourceNote: string
}

export interface StartingSpeedRecord extends StartingSpeedFields {
  id: string
  version: number
}

export async function listStartingSpeeds(db: Knex): Promise<StartingSpeedRecord[]> {
  const rows = await db('starting_speeds')
    .select('*')
    .orderByRaw('array_position(?::text[], iso_group), lower(material), substrate desc, id', [[...isoGroups]])
  return rows.map(fromRow)
}

/** Held until the transaction ends, against other changes of it. */
export async function findLockedStartingSpeed(trx: Knex, id: string): Promise<StartingSpeedRecord | null> {
  const row = await trx('starting_speeds').where({ id }).forUpdate().first('*')
  return row ? fromRow(row) : null
}

export async function createStartingSpeed(
  trx: Knex,
  fields: StartingSpeedFields,
): Promise<StartingSpeedRecord> {
  const [row] = await trx('starting_speeds').insert(toColumns(fields)).returning('*')
  return fromRow(row)
}

export async function updateStartingSpeed(
  trx: Knex,
  id: string,
  fields: StartingSpeedFields,
): Promise<StartingSpeedRecord> {
  const [row] = await trx('starting_speeds').where({ id }).update(toColumns(fields)).returning('*')
  return fromRow(row)
}

export async function removeStartingSpeed(trx: Knex, id: string): Promise<void> {
  await trx('starting_speeds').where({ id }).delete()
}

function toColumns(fields: StartingSpeedFields) {
  return {
    iso_group: fields.isoGroup,
    material: fields.material,
    substrate: fields.substrate,
    low_m_per_min: fields.lowMPerMin,
    high_m_per_min: fields.highMPerMin,
    source_note: fields.sourceNote,
  }
}

function fromRow(row: StartingSpeedsRow): StartingSpeedRecord {
  return {
    id: row.id,
    version: row.version,
    isoGroup: row.iso_group as IsoGroup,
    material: row.material,
    substrate: row.substrate as Substrate,
    lowMPerMin: row.low_m_per_min,
    highMPerMin: row.high_m_per_min,
    sourceNote: row.source_note,
  }
}
