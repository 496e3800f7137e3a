import { sizesOf } from '@/core/assemblies/size-changes'
import { type AssemblyPartKind, type AssemblyTools, partItemKind } from '@/core/assemblies/types'
import type { Database } from '../../db/connection'
import { findPieceMeasurements } from '../../db/read-models/piece-measurements'
import { readItem } from '../catalogue/get-item'
import { measuredCutter } from '../reach/measured-cutter'

/** A part by what it is of. */
export interface NamedPart {
  kind: AssemblyPartKind
  itemId: string
  pieceId: string | null
}

export interface PartSizes {
  kind: AssemblyPartKind
  geometry: Record<string, unknown>
}

/** The sizes the parts have now: the catalogue's, and before them what was measured on the cutter's piece. */
export async function readPartSizes(db: Database, parts: readonly NamedPart[]): Promise<PartSizes[]> {
  const sizes: PartSizes[] = []
  for (const part of parts) {
    const row = await readItem(db, partItemKind(part.kind), part.itemId)
    sizes.push({ kind: part.kind, geometry: sizesOf(part.kind, await asMeasured(db, part, row)) })
  }
  return sizes
}

async function asMeasured(
  db: Database,
  { pieceId }: NamedPart,
  row: Awaited<ReturnType<typeof readItem>>,
): Promise<object> {
  if (row.kind !== 'cutter' || pieceId === null) return row
  const piece = await findPieceMeasurements(db, pieceId)
  return piece ? measuredCutter(row, piece) : row
}

/** The parts by their kinds; a cutter and a holder are always among them. */
export function toolsOf(parts: readonly { kind: AssemblyPartKind; geometry: object }[]): AssemblyTools {
  const found = (kind: AssemblyPartKind) => parts.find((part) => part.kind === kind)?.geometry ?? null
  const [cutter, holder] = [found('cutter'), found('holder')]
  if (!cutter || !holder) throw new Error('an assembly has a cutter and a holder')
  return {
    cutter,
    holder,
    collet: found('collet'),
    extension: found('extension'),
    extensionCollet: found('extensionCollet'),
  } as AssemblyTools
}
