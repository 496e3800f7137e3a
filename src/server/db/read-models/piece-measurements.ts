import type { Knex } from 'knex'

/** What was measured on one tagged piece; null where the catalogue's figure stands. */
export interface PieceMeasurements {
  itemId: string
  cuttingDiameterMm: number | null
  cornerRadiusMm: number | null
  lengthOfCutMm: number | null
  reachLengthMm: number | null
  overallLengthMm: number | null
}

/** A piece's own sizes and the item it is one of; null where there is no such piece. */
export async function findPieceMeasurements(db: Knex, pieceId: string): Promise<PieceMeasurements | null> {
  const row = await db('pieces').where('pieces.id', pieceId).first()
  if (!row) return null
  return {
    itemId: String(row.item_id),
    cuttingDiameterMm: row.cutting_diameter_mm,
    cornerRadiusMm: row.corner_radius_mm,
    lengthOfCutMm: row.length_of_cut_mm,
    reachLengthMm: row.reach_length_mm,
    overallLengthMm: row.overall_length_mm,
  }
}
