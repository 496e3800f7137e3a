import type { Knex } from 'knex'
import type { AssemblyPartKind, AssemblyState, Finding } from '@/core/assemblies/types'
import type { ReachAnswer } from '@/core/reach/types'
import type { Condition } from '@/core/stock/kinds'
import { enumFromDb, enumToDb } from '../enum-case'
import type { AssembliesRow } from '../row-types'

export interface AssemblyRecord {
  id: string
  version: number
  number: number
  state: AssemblyState
  stickOutMm: number
  gaugeLengthMm: number
  machineId: string | null
  isArchived: boolean
}

export interface NewAssembly {
  name: string
  note: string
  stickOutMm: number
  gaugeLengthMm: number
  toolNumber: number | null
  lengthOffsetNumber: number | null
  diameterOffsetNumber: number | null
  createdBy: string
}

export interface NewAssemblyPart {
  kind: AssemblyPartKind
  itemId: string
  pieceId: string | null
  geometry: object
}

export interface NewAssemblyCheck {
  feature: object
  clearances: object | null
  answer: ReachAnswer
  createdBy: string
}

export interface AssemblyChange {
  name?: string | undefined
  note?: string | undefined
  stickOutMm?: number | undefined
  gaugeLengthMm?: number | undefined
  toolNumber?: number | null | undefined
  lengthOffsetNumber?: number | null | undefined
  diameterOffsetNumber?: number | null | undefined
}

export interface PartPlace {
  kind: AssemblyPartKind
  pieceId: string | null
  homeLocationId: string
  locationId: string
  condition: Condition
}

export interface MachineSpot {
  machineId: string | null
  pocket: number | null
}

export interface NewMeasurement {
  assemblyId: string
  gaugeLengthMm: number
  diameterMm: number | null
  expectedGaugeLengthMm: number
  expectedDiameterMm: number
  source: 'byHand' | 'presetter'
  actorId: string
}

/** The id of the new assembly; its number is the next one. */
export async function createAssembly(
  trx: Knex,
  assembly: NewAssembly,
  parts: readonly NewAssemblyPart[],
  check: NewAssemblyCheck,
): Promise<string> {
  const [row] = await trx('assemblies')
    .insert({ ...changedColumns(assembly), created_by: assembly.createdBy })
    .returning('id')
  await trx('assembly_parts').insert(
    parts.map((part) => ({
      assembly_id: row.id,
      kind: enumToDb(part.kind),
      item_id: part.itemId,
      piece_id: part.pieceId,
      geometry: JSON.stringify(part.geometry),
    })),
  )
  await createAssemblyCheck(trx, row.id, check)
  return row.id
}

export async function createAssemblyCheck(
  trx: Knex,
  assemblyId: string,
  check: NewAssemblyCheck,
): Promise<void> {
  const answer = JSON.stringify(check.answer)
  await trx('assembly_checks').insert({
    assembly_id: assemblyId,
    feature: JSON.stringify(check.feature),
    clearances: check.clearances === null ? null : JSON.stringify(check.clearances),
    kept_answer: answer,
    answer,
    created_by: check.createdBy,
  })
}

/** Held until the transaction ends, against every other change of it. */
export async function findLockedAssembly(trx: Knex, id: string): Promise<AssemblyRecord | null> {
  const row: AssembliesRow | undefined = await trx('assemblies').where({ id }).forNoKeyUpdate().first()
  if (!row) return null
  return {
    id: row.id,
    version: row.version,
    number: row.number,
    state: enumFromDb(row.state) as AssemblyState,
    stickOutMm: row.stick_out_mm,
    gaugeLengthMm: row.gauge_length_mm,
    machineId: row.machine_id,
    isArchived: row.archived_at !== null,
  }
}

/** What is absent is left alone; an assembly that stays as it was keeps its version. */
export async function updateAssembly(trx: Knex, id: string, change: AssemblyChange): Promise<void> {
  const columns = changedColumns(change)
  if (change.stickOutMm !== undefined) columns.stick_out_set_at = trx.fn.now()
  if (Object.keys(columns).length > 0) await trx('assemblies').where({ id }).update(columns)
}

/**
 * Holds what an assembly goes by until the transaction ends: whoever changes a size waits, and their trigger then sees
 * the assembly.
 */
export async function lockSizes(
  trx: Knex,
  itemIds: readonly string[],
  pieceIds: readonly string[],
): Promise<void> {
  await trx('shop_settings').where('id', 1).forShare().select('id')
  await trx('items')
    .whereRaw('id = any(?::bigint[])', [[...itemIds]])
    .orderBy('id')
    .forShare()
    .select('id')
  await trx('pieces')
    .whereRaw('id = any(?::bigint[])', [[...pieceIds]])
    .orderBy('id')
    .forShare()
    .select('id')
}

export async function archiveAssembly(trx: Knex, id: string): Promise<void> {
  await trx('assemblies').where({ id }).whereNull('archived_at').update({ archived_at: trx.fn.now() })
  await trx('assembly_rechecks').where('assembly_id', id).delete()
}

/** The parts have a place each now, and the assembly is built. */
export async function markAssemblyBuilt(
  trx: Knex,
  id: string,
  places: readonly PartPlace[],
  spot: MachineSpot,
): Promise<void> {
  for (const place of places) {
    await trx('assembly_parts')
      .where({ assembly_id: id, kind: enumToDb(place.kind) })
      .update({
        piece_id: place.pieceId,
        home_location_id: place.homeLocationId,
        location_id: place.locationId,
        condition: place.condition,
      })
  }
  await trx('assemblies').where({ id }).update({
    state: 'built',
    machine_id: spot.machineId,
    pocket: spot.pocket,
    built_at: trx.fn.now(),
    stick_out_set_at: trx.fn.now(),
    broken_down_at: null,
  })
}

/** None of its parts is with it any more. */
export async function markAssemblyBrokenDown(trx: Knex, id: string): Promise<void> {
  await trx('assembly_parts')
    .where('assembly_id', id)
    .update({ home_location_id: null, location_id: null, condition: null })
  await trx('assemblies')
    .where({ id })
    .update({ state: 'broken_down', broken_down_at: trx.fn.now(), machine_id: null, pocket: null })
}

/** The whole assembly is somewhere else now, as a piece. */
export async function moveAssembly(
  trx: Knex,
  id: string,
  spot: MachineSpot & { locationId: string },
): Promise<void> {
  await trx('assembly_parts').where('assembly_id', id).update({ location_id: spot.locationId })
  await trx('assemblies').where({ id }).update({ machine_id: spot.machineId, pocket: spot.pocket })
}

/** A machine in use, with the place its stock is at; null where there is none. */
export async function findMachinePlace(
  trx: Knex,
  machineId: string,
): Promise<{ code: string; taper: string; locationId: string; pocketCount: number | null } | null> {
  const row = await trx('machines').where('id', machineId).whereNull('archived_at').forShare().first()
  if (!row) return null
  return { code: row.code, taper: row.taper, locationId: row.location_id, pocketCount: row.pocket_count }
}

/** What goes into the spindle, and its taper where it was entered. */
export async function findSpindleEnd(
  trx: Knex,
  assemblyId: string,
): Promise<{ code: string; taper: string | null } | null> {
  const row = await trx('assembly_parts')
    .join('items', 'items.id', 'assembly_parts.item_id')
    .join('holders', 'holders.item_id', 'assembly_parts.item_id')
    .where('assembly_parts.assembly_id', assemblyId)
    .first('items.code', 'holders.taper')
  return row ?? null
}

/** The sizes its parts have now are what everything about it goes by. */
export async function takeOverSizes(
  trx: Knex,
  id: string,
  parts: readonly { kind: AssemblyPartKind; geometry: object }[],
): Promise<void> {
  for (const { kind, geometry } of parts)
    await trx('assembly_parts')
      .where({ assembly_id: id, kind: enumToDb(kind) })
      .update({ geometry: JSON.stringify(geometry) })
}

export async function createMeasurement(trx: Knex, measurement: NewMeasurement): Promise<void> {
  await trx('assembly_measurements').insert({
    assembly_id: measurement.assemblyId,
    gauge_length_mm: measurement.gaugeLengthMm,
    diameter_mm: measurement.diameterMm,
    expected_gauge_length_mm: measurement.expectedGaugeLengthMm,
    expected_diameter_mm: measurement.expectedDiameterMm,
    source: enumToDb(measurement.source),
    actor_id: measurement.actorId,
  })
}

export async function writeCheckOutcome(
  trx: Knex,
  checkId: string,
  outcome: { holds: boolean; answer: ReachAnswer | null },
): Promise<void> {
  await trx('assembly_checks')
    .where('id', checkId)
    .update({
      holds: outcome.holds,
      answer: outcome.answer === null ? null : JSON.stringify(outcome.answer),
      checked_at: trx.fn.now(),
    })
}

export interface OpenFinding {
  id: string
  key: string
  isFault: boolean
  detail: unknown
}

export async function listOpenFindings(db: Knex, assemblyId: string): Promise<OpenFinding[]> {
  const rows = await db('assembly_findings')
    .where('assembly_id', assemblyId)
    .whereNull('resolved_at')
    .orderBy('id')
    .select('id', 'key', 'is_fault', 'detail')
  return rows.map((row) => ({ id: row.id, key: row.key, isFault: row.is_fault, detail: row.detail }))
}

export async function createFinding(
  trx: Knex,
  assemblyId: string,
  finding: Finding,
  movementId: string | null,
): Promise<void> {
  await trx('assembly_findings').insert({
    assembly_id: assemblyId,
    key: finding.key,
    code: enumToDb(finding.detail.code),
    check_id: finding.checkId,
    is_fault: finding.isFault,
    detail: JSON.stringify(finding.detail),
    movement_id: finding.detail.code === 'partGone' ? movementId : null,
  })
}

/** The same finding, with what it says now. */
export async function updateFinding(trx: Knex, id: string, finding: Finding): Promise<void> {
  await trx('assembly_findings')
    .where('id', id)
    .update({
      code: enumToDb(finding.detail.code),
      is_fault: finding.isFault,
      detail: JSON.stringify(finding.detail),
    })
}

export async function resolveFindings(trx: Knex, ids: readonly string[]): Promise<void> {
  await trx('assembly_findings').whereIn('id', ids).update({ resolved_at: trx.fn.now() })
}

/** Assemblies somebody asked to look at again, the longest waiting first. */
export async function listDueAssemblies(db: Knex): Promise<string[]> {
  const rows = await db('assembly_rechecks')
    .groupBy('assembly_id')
    .orderByRaw('min(id)')
    .select('assembly_id')
  return rows.map((row) => row.assembly_id)
}

export interface RecheckRequest {
  id: string
  movementId: string | null
}

/** Read before anything it asks about is, so that a request that comes meanwhile stays for another look. */
export async function listRecheckRequests(trx: Knex, assemblyId: string): Promise<RecheckRequest[]> {
  const rows = await trx('assembly_rechecks')
    .where('assembly_id', assemblyId)
    .orderBy('id')
    .select('id', 'movement_id')
  return rows.map((row) => ({ id: row.id, movementId: row.movement_id }))
}

export async function removeRecheckRequests(trx: Knex, ids: readonly string[]): Promise<void> {
  await trx('assembly_rechecks').whereIn('id', ids).delete()
}

function changedColumns(change: AssemblyChange): Record<string, unknown> {
  const columns = {
    name: change.name,
    note: change.note,
    stick_out_mm: change.stickOutMm,
    gauge_length_mm: change.gaugeLengthMm,
    tool_number: change.toolNumber,
    length_offset_number: change.lengthOffsetNumber,
    diameter_offset_number: change.diameterOffsetNumber,
  }
  return Object.fromEntries(Object.entries(columns).filter(([, value]) => value !== undefined))
}

/** The assemblies of these numbers, by number. */
export async function findAssemblyIds(db: Knex, numbers: readonly number[]): Promise<Map<number, string>> {
  const rows = await db('assemblies')
    .whereRaw('number = any(?::bigint[])', [[...numbers]])
    .select('id', 'number')
  return new Map(rows.map((row) => [row.number, row.id]))
}
