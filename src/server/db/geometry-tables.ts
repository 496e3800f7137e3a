import type { CatalogueKind } from '@/core/stock/kinds'
import { enumFromDb, enumToDb } from './enum-case'

/**
 * The geometry of each kind of item, field by field. A column is its field's name in snake_case; a bore is three flat
 * columns here and one object outside.
 */
export interface GeometryTable {
  name: string
  /** Plain fields, one column each. */
  fields: readonly string[]
  /** Those of them whose values change case on the way. */
  enums: readonly string[]
  hasBore: boolean
  segments: { name: string; fields: readonly string[] } | null
}

const clampingFields = ['boreDepthMm', 'minimumGripMm', 'gripStartMm', 'nutTorqueNm']
const segmentFields = ['lengthMm', 'noseDiameterMm', 'spindleDiameterMm']

export const geometryTables: Record<CatalogueKind, GeometryTable> = {
  cutter: {
    name: 'cutters',
    fields: [
      'form',
      'cuttingDiameterMm',
      'cornerRadiusMm',
      'taperHalfAngleDeg',
      'pointAngleDeg',
      'tipDiameterMm',
      'lengthOfCutMm',
      'fluteLengthMm',
      'neckDiameterMm',
      'neckTaperHalfAngleDeg',
      'reachLengthMm',
      'neckTransitionAngleDeg',
      'shankDiameterMm',
      'overallLengthMm',
      'fluteCount',
      'substrate',
      'maximumRpm',
    ],
    enums: ['form', 'substrate'],
    hasBore: false,
    segments: null,
  },
  holder: {
    name: 'holders',
    fields: ['taper', 'gaugeLengthMm', ...clampingFields, 'sideLockInsertionMm', 'maximumRpm'],
    enums: [],
    hasBore: true,
    segments: { name: 'holder_segments', fields: ['part', ...segmentFields] },
  },
  collet: {
    name: 'collets',
    fields: ['series', 'minimumMm', 'maximumMm', 'lengthMm', 'minimumGripMm'],
    enums: [],
    hasBore: false,
    segments: null,
  },
  extension: {
    name: 'extensions',
    fields: ['projectionMm', 'shankDiameterMm', ...clampingFields],
    enums: [],
    hasBore: true,
    segments: { name: 'extension_segments', fields: segmentFields },
  },
  fixture: { name: 'fixtures', fields: ['heightMm'], enums: [], hasBore: false, segments: null },
}

type Values = Record<string, unknown>

interface FieldColumn {
  field: string
  column: string
  isEnum: boolean
}

const known = new WeakMap<GeometryTable, readonly FieldColumn[]>()

/** The plain fields with their columns, worked out once: lists and imports ask for every row. */
function fieldColumns(table: GeometryTable): readonly FieldColumn[] {
  const columns =
    known.get(table) ??
    table.fields.map((field) => ({
      field,
      column: enumToDb(field),
      isEnum: table.enums.includes(field),
    }))
  known.set(table, columns)
  return columns
}

/** The columns of what was given; what is absent has none and so is left alone. */
export function geometryToColumns(table: GeometryTable, given: Values): Values {
  const columns: Values = {}
  for (const field of table.fields) {
    const value = given[field]
    if (value === undefined) continue
    columns[enumToDb(field)] =
      table.enums.includes(field) && typeof value === 'string' ? enumToDb(value) : value
  }
  return table.hasBore ? { ...columns, ...boreToColumns(given.bore) } : columns
}

function boreToColumns(bore: unknown): Values {
  if (typeof bore !== 'object' || bore === null) return {}
  const given: Values = { ...bore }
  return {
    bore_kind: given.kind,
    bore_series: given.series ?? null,
    bore_diameter_mm: given.diameterMm ?? null,
  }
}

export function geometryFromRow(table: GeometryTable, row: Values): Values {
  const geometry: Values = {}
  for (const { field, column, isEnum } of fieldColumns(table)) {
    const value = row[column]
    geometry[field] = isEnum && typeof value === 'string' ? enumFromDb(value) : value
  }
  if (table.hasBore) {
    geometry.bore =
      row.bore_kind === 'collet'
        ? { kind: 'collet', series: row.bore_series }
        : { kind: 'fixed', diameterMm: row.bore_diameter_mm }
  }
  return geometry
}

/** Columns of segments, counted from the nose face. */
export function segmentsToRows(table: GeometryTable, itemId: string, segments: readonly Values[]): Values[] {
  const fields = table.segments?.fields ?? []
  return segments.map((segment, index) => ({
    item_id: itemId,
    position: index + 1,
    ...Object.fromEntries(fields.map((field) => [enumToDb(field), segment[field]])),
  }))
}

export function segmentFromRow(table: GeometryTable, row: Values): Values {
  const fields = table.segments?.fields ?? []
  return Object.fromEntries(fields.map((field) => [field, row[enumToDb(field)]]))
}

/** All columns of a kind's geometry, to select by name. */
export function geometryColumns(table: GeometryTable): string[] {
  const bore = table.hasBore ? ['bore_kind', 'bore_series', 'bore_diameter_mm'] : []
  return [...table.fields.map(enumToDb), ...bore].map((column) => `${table.name}.${column}`)
}
