import type { Knex } from 'knex'
import type { CatalogueKind } from '@/core/stock/kinds'
import type { Bore, ColletGeometry, CutterGeometry, ExtensionGeometry, HolderGeometry } from '@/core/tooling'
import { enumToDb } from '../enum-case'
import { geometryColumns, geometryFromRow, geometryTables, segmentFromRow } from '../geometry-tables'

/** Everything of a crib's catalogue that an assembly could be made of; what is archived is left out. */
export interface CribToolingRows {
  cutters: { itemId: string; geometry: CutterGeometry; maximumRpm: number | null }[]
  holders: { itemId: string; geometry: HolderGeometry; bore: Bore; taper: string | null }[]
  collets: { itemId: string; geometry: ColletGeometry }[]
  extensions: {
    itemId: string
    geometry: ExtensionGeometry
    bore: Bore
    /** null where it was not entered. */
    shankDiameterMm: number | null
  }[]
  /** Tagged pieces with a figure of their own, which stands before the catalogue's. */
  pieces: MeasuredPieceRow[]
}

export interface MeasuredPieceRow {
  id: string
  itemId: string
  cuttingDiameterMm: number | null
  cornerRadiusMm: number | null
  lengthOfCutMm: number | null
  reachLengthMm: number | null
  overallLengthMm: number | null
}

const measuredColumns = [
  'cutting_diameter_mm',
  'corner_radius_mm',
  'length_of_cut_mm',
  'reach_length_mm',
  'overall_length_mm',
] as const

const isMeasuredSql = `coalesce(${measuredColumns.map((column) => `pieces.${column}`).join(', ')}) is not null`

/**
 * What stands for the state of every item's geometry and of the shop's settings: two reads that give the same text saw
 * the same rows. Items and settings are never removed and every change raises a version; pieces change theirs with every
 * movement, so of them the measured figures themselves are summed up.
 */
export async function readToolingRevision(db: Knex): Promise<string> {
  const { rows } = await db.raw(`
    select concat_ws('.',
      (select concat_ws('.', count(*), sum(version)) from items),
      (select version from shop_settings where id = 1),
      (select concat_ws('.', count(*), sum(hashtextextended(
          jsonb_build_array(id, item_id, ${measuredColumns.join(', ')})::text, 0)))
        from pieces where ${isMeasuredSql})) as revision`)
  return rows[0].revision
}

/** Reads it all, one statement after another: whoever asks holds one snapshot. */
export async function readCribTooling(db: Knex): Promise<CribToolingRows> {
  const cutters = await readKind(db, 'cutter')
  const holders = await readKind(db, 'holder')
  const collets = await readKind(db, 'collet')
  const extensions = await readKind(db, 'extension')
  return {
    cutters: cutters.map(({ itemId, geometry: { maximumRpm, ...geometry } }) => ({
      itemId,
      geometry: geometry as unknown as CutterGeometry,
      maximumRpm: maximumRpm as number | null,
    })),
    holders: holders.map(({ itemId, geometry: { bore, taper, maximumRpm: _, ...geometry } }) => ({
      itemId,
      geometry: geometry as unknown as HolderGeometry,
      bore: bore as Bore,
      taper: taper as string | null,
    })),
    collets: collets.map(({ itemId, geometry }) => ({
      itemId,
      geometry: geometry as unknown as ColletGeometry,
    })),
    extensions: extensions.map(({ itemId, geometry: { bore, shankDiameterMm, ...geometry } }) => ({
      itemId,
      geometry: geometry as unknown as ExtensionGeometry,
      bore: bore as Bore,
      shankDiameterMm: (shankDiameterMm as number | null | undefined) ?? null,
    })),
    pieces: await readMeasuredPieces(db),
  }
}

interface GeometryRow {
  itemId: string
  geometry: Record<string, unknown>
}

async function readKind(db: Knex, kind: CatalogueKind): Promise<GeometryRow[]> {
  const table = geometryTables[kind]
  const rows = await db(table.name)
    .join('items', 'items.id', `${table.name}.item_id`)
    .whereNull('items.archived_at')
    .orderBy('items.id')
    .select('items.id', ...geometryColumns(table))
  const segments = await readAllSegments(db, kind)
  return rows.map((row) => ({
    itemId: row.id,
    geometry: {
      ...geometryFromRow(table, row),
      ...(table.segments ? { segments: segments.get(row.id) ?? [] } : {}),
    },
  }))
}

async function readAllSegments(db: Knex, kind: CatalogueKind): Promise<Map<string, object[]>> {
  const table = geometryTables[kind]
  const segments = new Map<string, object[]>()
  if (!table.segments) return segments
  const rows = await db(table.segments.name)
    .orderBy(['item_id', 'position'])
    .select('item_id', ...table.segments.fields.map(enumToDb))
  for (const row of rows) {
    const held = segments.get(row.item_id)
    const segment = segmentFromRow(table, row)
    if (held) held.push(segment)
    else segments.set(row.item_id, [segment])
  }
  return segments
}

async function readMeasuredPieces(db: Knex): Promise<MeasuredPieceRow[]> {
  const rows = await db('pieces')
    .join('items', 'items.id', 'pieces.item_id')
    .where('items.kind', 'cutter')
    .whereNull('items.archived_at')
    .whereRaw(isMeasuredSql)
    .orderBy('pieces.id')
    .select('pieces.id', 'pieces.item_id', ...measuredColumns.map((column) => `pieces.${column}`))
  return rows.map((row) => ({
    id: row.id,
    itemId: row.item_id,
    cuttingDiameterMm: row.cutting_diameter_mm,
    cornerRadiusMm: row.corner_radius_mm,
    lengthOfCutMm: row.length_of_cut_mm,
    reachLengthMm: row.reach_length_mm,
    overallLengthMm: row.overall_length_mm,
  }))
}
