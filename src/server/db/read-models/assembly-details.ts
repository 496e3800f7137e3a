import type { Knex } from 'knex'
import { type AssemblyPartKind, assemblyPartKinds, type FindingDetail } from '@/core/assemblies/types'
import type { Clearances, Feature, ReachAnswer } from '@/core/reach/types'
import type { Condition } from '@/core/stock/kinds'
import type { AssemblyCheck, AssemblyFinding, AssemblyPart } from '@/schemas/assembly'
import { enumFromDb, enumToDb } from '../enum-case'
import { placeColumns, placeOf } from './assembly-rows'

/** A part as the database keeps it, with what the books know of it now. */
export interface AssemblyPartRecord {
  kind: AssemblyPartKind
  itemId: string
  code: string
  description: string
  isTrackedByPiece: boolean
  isArchived: boolean
  pieceId: string | null
  pieceTag: string | null
  geometry: object
  homeLocationId: string | null
  locationId: string | null
  condition: Condition | null
  presence: { held: number; claimed: number } | null
  place: AssemblyPart['place']
  home: AssemblyPart['home']
}

/**
 * The parts of an assembly, in the order a person puts them together. Of a part without a tag nobody knows which of a
 * heap it is: so many pieces lie there, and so many assemblies take one of them for theirs.
 */
export async function readAssemblyParts(db: Knex, assemblyId: string): Promise<AssemblyPartRecord[]> {
  const rows = await db('assembly_parts as part')
    .join('items', 'items.id', 'part.item_id')
    .leftJoin('pieces', 'pieces.id', 'part.piece_id')
    .leftJoin('locations as place', 'place.id', 'part.location_id')
    .leftJoin('locations as home', 'home.id', 'part.home_location_id')
    .leftJoin('cribs', 'cribs.id', 'home.crib_id')
    .where('part.assembly_id', assemblyId)
    .orderByRaw('array_position(?::text[], part.kind)', [assemblyPartKinds.map(enumToDb)])
    .select('part.*', 'items.code', 'items.description', 'items.is_tracked_by_piece', 'items.archived_at', {
      piece_tag: 'pieces.tag',
      piece_location_id: 'pieces.location_id',
      home_crib_code: 'cribs.code',
      held: db.raw(`coalesce((select quantity from balances where (item_id, location_id, condition)
        = (part.item_id, part.location_id, part.condition)), 0)`),
      claimed:
        db.raw(`(select count(*)::int from assembly_parts as other where (item_id, location_id, condition)
        = (part.item_id, part.location_id, part.condition))`),
    })
    .select(placeColumns('place'))
    .select(placeColumns('home'))
  return rows.map((row) => ({
    kind: enumFromDb(row.kind) as AssemblyPartKind,
    itemId: row.item_id,
    code: row.code,
    description: row.description,
    isTrackedByPiece: row.is_tracked_by_piece,
    isArchived: row.archived_at !== null,
    pieceId: row.piece_id,
    pieceTag: row.piece_tag,
    geometry: row.geometry,
    homeLocationId: row.home_location_id,
    locationId: row.location_id,
    condition: row.condition,
    presence: presenceOf(row),
    place: placeOf(row, 'place'),
    home: placeOf(row, 'home'),
  }))
}

function presenceOf(row: {
  location_id: string | null
  piece_id: string | null
  piece_location_id: string | null
  held: number
  claimed: number
}): AssemblyPartRecord['presence'] {
  if (row.location_id === null) return null
  if (row.piece_id === null) return { held: row.held, claimed: row.claimed }
  return { held: row.piece_location_id === row.location_id ? 1 : 0, claimed: 1 }
}

/** What the nut that holds the cutter is tightened to: the extension's where there is one, else the holder's. */
export async function findNutTorqueNm(db: Knex, assemblyId: string): Promise<number | null> {
  const row = await db('assembly_parts as part')
    .leftJoin('holders', 'holders.item_id', 'part.item_id')
    .leftJoin('extensions', 'extensions.item_id', 'part.item_id')
    .where('part.assembly_id', assemblyId)
    .whereIn('part.kind', ['extension', 'holder'])
    .orderBy('part.kind')
    .first({ torque: db.raw('coalesce(extensions.nut_torque_nm, holders.nut_torque_nm)') })
  return row?.torque ?? null
}

/** Where each of these items can be fetched: its bins, the fullest first, and its tagged pieces in bins. */
export async function readPartSources(
  db: Knex,
  itemIds: readonly string[],
): Promise<Map<string, Pick<AssemblyPart, 'bins' | 'pieces'>>> {
  const balances = await db('balances')
    .join('locations as place', 'place.id', 'balances.location_id')
    .join('cribs', 'cribs.id', 'place.crib_id')
    .whereRaw('balances.item_id = any(?::bigint[])', [[...itemIds]])
    .where('place.kind', 'bin')
    .where('balances.quantity', '>', 0)
    .orderByRaw("balances.condition = 'worn', balances.quantity desc, lower(place.code), place.id")
    .select('balances.item_id', 'balances.condition', 'balances.quantity', { place_crib_code: 'cribs.code' })
    .select(placeColumns('place'))
  const pieces = await db('pieces')
    .join('locations', 'locations.id', 'pieces.location_id')
    .whereRaw('pieces.item_id = any(?::bigint[])', [[...itemIds]])
    .where('locations.kind', 'bin')
    .orderByRaw('lower(pieces.tag)')
    .select('pieces.id', 'pieces.item_id', 'pieces.tag', 'pieces.location_id', 'pieces.condition')
  return new Map(
    itemIds.map((itemId) => [
      itemId,
      {
        bins: balances
          .filter((row) => row.item_id === itemId)
          .flatMap((row) => {
            const place = placeOf(row, 'place')
            return place ? [{ place, condition: row.condition, quantity: row.quantity }] : []
          }),
        pieces: pieces
          .filter((row) => row.item_id === itemId)
          .map((row) => ({
            id: row.id,
            tag: row.tag,
            locationId: row.location_id,
            condition: row.condition,
          })),
      },
    ]),
  )
}

/** The checks kept with an assembly, the first first. */
export async function readAssemblyChecks(db: Knex, assemblyId: string): Promise<AssemblyCheck[]> {
  const rows = await db('assembly_checks').where('assembly_id', assemblyId).orderBy('id')
  return rows.map((row) => ({
    id: row.id,
    feature: row.feature as Feature,
    clearances: row.clearances as Partial<Clearances> | null,
    holds: row.holds,
    keptAnswer: row.kept_answer as ReachAnswer,
    answer: row.answer as ReachAnswer | null,
    checkedAt: row.checked_at.toISOString(),
  }))
}

/** What is open about an assembly, faults first. */
export async function readAssemblyFindings(db: Knex, assemblyId: string): Promise<AssemblyFinding[]> {
  const rows = await db('assembly_findings as finding')
    .leftJoin('movements', 'movements.id', 'finding.movement_id')
    .leftJoin('users', 'users.id', 'movements.actor_id')
    .leftJoin('locations as target', 'target.id', 'movements.to_location_id')
    .where('finding.assembly_id', assemblyId)
    .whereNull('finding.resolved_at')
    .orderByRaw('finding.is_fault desc, finding.id')
    .select('finding.*', 'movements.quantity', 'movements.occurred_at', {
      movement_kind: 'movements.kind',
      actor_name: 'users.name',
      to_name: 'target.name',
    })
  return rows.map((row) => ({
    id: row.id,
    key: row.key,
    isFault: row.is_fault,
    checkId: row.check_id,
    detail: row.detail as FindingDetail,
    foundAt: row.found_at.toISOString(),
    movement:
      row.movement_id === null
        ? null
        : {
            kind: enumFromDb(row.movement_kind),
            quantity: row.quantity,
            actorName: row.actor_name,
            occurredAt: row.occurred_at.toISOString(),
            toName: row.to_name,
          },
  }))
}
