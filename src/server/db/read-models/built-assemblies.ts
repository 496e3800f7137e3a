import type { Knex } from 'knex'
import type { AssemblyPartKind } from '@/core/assemblies/types'
import { enumFromDb } from '../enum-case'

export interface BuiltAssembly {
  id: string
  number: number
  stickOutMm: number
  parts: ReadonlyMap<AssemblyPartKind, { itemId: string; pieceId: string | null }>
  /** In whose hands or in which machine it is, in words. */
  place: string
}

/** Every assembly that stands ready; one that is marked, since something of it changed, is not among them. */
export async function readBuiltAssemblies(db: Knex): Promise<BuiltAssembly[]> {
  const { rows } = await db.raw(`
    select assembly.id, assembly.number, assembly.stick_out_mm, assembly.pocket, machine.code as machine_code,
      (select coalesce(nullif(place.name, ''), place.code) from assembly_parts as held
        join locations as place on place.id = held.location_id
        where held.assembly_id = assembly.id and held.kind = 'cutter') as place_name,
      (select jsonb_agg(jsonb_build_array(part.kind, part.item_id::text, part.piece_id::text))
        from assembly_parts as part where part.assembly_id = assembly.id) as parts
    from assemblies as assembly
    left join machines as machine on machine.id = assembly.machine_id
    where assembly.state = 'built' and not exists (select from assembly_findings as finding
      where finding.assembly_id = assembly.id and finding.resolved_at is null and finding.is_fault)
    order by assembly.number`)
  return rows.map((row: BuiltRow) => ({
    id: row.id,
    number: row.number,
    stickOutMm: row.stick_out_mm,
    parts: new Map(
      row.parts.map(([kind, itemId, pieceId]) => [enumFromDb(kind) as AssemblyPartKind, { itemId, pieceId }]),
    ),
    place: placeWords(row),
  }))
}

interface BuiltRow {
  id: string
  number: number
  stick_out_mm: number
  pocket: number | null
  machine_code: string | null
  place_name: string | null
  parts: [kind: string, itemId: string, pieceId: string | null][]
}

function placeWords({ machine_code, pocket, place_name }: BuiltRow): string {
  if (machine_code === null) return place_name === null ? 'not known' : `with ${place_name}`
  return pocket === null ? `at ${machine_code}` : `in ${machine_code}, pocket ${pocket}`
}
