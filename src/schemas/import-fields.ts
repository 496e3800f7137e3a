import type { CatalogueKind, ToolingKind } from '@/core/stock/kinds'

/** What a file may bring, kind by kind: the fields a column can be given to, in the order they are offered. */

export const importKinds = ['cutters', 'holders', 'collets', 'extensions', 'stock', 'reorderPoints'] as const
export type ImportKind = (typeof importKinds)[number]

/** What brings items of each kind; fixtures are entered by hand. */
export const importKindOf: Readonly<Record<ToolingKind, ImportKind>> = {
  cutter: 'cutters',
  holder: 'holders',
  collet: 'collets',
  extension: 'extensions',
}

export type ImportFieldType =
  | 'text'
  | 'length'
  /** A length that may be called by a drill size: `#7`, `F`. */
  | 'diameter'
  /** A length that may be 0. */
  | 'distance'
  | 'angle'
  | 'count'
  | 'quantity'
  | 'days'
  | 'money'
  | 'form'
  | 'substrate'
  | 'part'
  /** Two lengths: from, to. */
  | 'range'
  | 'condition'
  /** The unit of the other cells of its row. */
  | 'unit'

export interface ImportField {
  field: string
  label: string
  /** ISO 13399 */
  symbol?: string
  type: ImportFieldType
}

const code: ImportField = { field: 'code', label: 'Own code', type: 'text' }
const maker: ImportField = { field: 'maker', label: 'Maker', type: 'text' }
const partNumber: ImportField = { field: 'partNumber', label: 'Maker’s part number', type: 'text' }
const rowUnit: ImportField = { field: 'rowUnit', label: 'Unit of the row (mm or in)', type: 'unit' }

const itemFields: ImportField[] = [
  code,
  maker,
  partNumber,
  { field: 'description', label: 'Description', type: 'text' },
  { field: 'unitCost', label: 'Unit cost', type: 'money' },
]

const clampingFields: ImportField[] = [
  { field: 'boreSeries', label: 'Collet series of the bore', type: 'text' },
  { field: 'boreDiameterMm', label: 'Fixed bore diameter', symbol: 'DCONWS', type: 'diameter' },
  { field: 'boreDepthMm', label: 'Bore depth', type: 'length' },
  { field: 'minimumGripMm', label: 'Minimum grip', symbol: 'LSCN', type: 'length' },
  { field: 'gripStartMm', label: 'Grip starts behind the nose', type: 'distance' },
  { field: 'nutTorqueNm', label: 'Nut torque, N·m', type: 'count' },
]

const maximumRpm: ImportField = {
  field: 'maximumRpm',
  label: 'Largest speed, rpm',
  symbol: 'RPMX',
  type: 'count',
}

/** One row a segment. */
const segmentFields: ImportField[] = [
  { field: 'segmentNumber', label: 'Segment: number from the nose', type: 'count' },
  { field: 'segmentLengthMm', label: 'Segment: length', type: 'length' },
  { field: 'segmentNoseDiameterMm', label: 'Segment: diameter at the nose end', type: 'length' },
  { field: 'segmentSpindleDiameterMm', label: 'Segment: diameter at the spindle end', type: 'length' },
]

/** One or two segments in one row. */
const shapeFields: ImportField[] = [
  { field: 'noseDiameterMm', label: 'Nose diameter', type: 'length' },
  { field: 'noseLengthMm', label: 'Nose length', type: 'length' },
  { field: 'bodyDiameterMm', label: 'Body diameter', symbol: 'BD', type: 'length' },
  { field: 'bodyLengthMm', label: 'Body length', symbol: 'LB', type: 'length' },
]

export const importFields: Readonly<Record<ImportKind, readonly ImportField[]>> = {
  cutters: [
    ...itemFields,
    { field: 'form', label: 'Form', type: 'form' },
    { field: 'cuttingDiameterMm', label: 'Cutting diameter', symbol: 'DC', type: 'diameter' },
    { field: 'cornerRadiusMm', label: 'Corner radius', symbol: 'RE', type: 'distance' },
    { field: 'taperHalfAngleDeg', label: 'Taper a side', type: 'angle' },
    { field: 'pointAngleDeg', label: 'Point angle, included', symbol: 'SIG', type: 'angle' },
    { field: 'tipDiameterMm', label: 'Tip diameter of a chamfer', symbol: 'DCN', type: 'distance' },
    { field: 'lengthOfCutMm', label: 'Length of cut', symbol: 'APMX', type: 'length' },
    { field: 'fluteLengthMm', label: 'Flute length with run-out', symbol: 'LCF', type: 'length' },
    { field: 'neckDiameterMm', label: 'Neck diameter', symbol: 'DN', type: 'length' },
    { field: 'neckTaperHalfAngleDeg', label: 'Neck taper a side', symbol: 'BHTA', type: 'angle' },
    { field: 'reachLengthMm', label: 'Reach length', symbol: 'LU', type: 'length' },
    { field: 'neckTransitionAngleDeg', label: 'Neck to shank, a side', type: 'angle' },
    { field: 'shankDiameterMm', label: 'Shank diameter', symbol: 'DMM, DCONMS', type: 'diameter' },
    { field: 'overallLengthMm', label: 'Overall length', symbol: 'OAL', type: 'length' },
    { field: 'fluteCount', label: 'Flutes', symbol: 'NOF', type: 'count' },
    { field: 'substrate', label: 'Carbide or HSS', type: 'substrate' },
    maximumRpm,
    rowUnit,
  ],
  holders: [
    ...itemFields,
    { field: 'taper', label: 'Taper of the spindle', type: 'text' },
    { field: 'gaugeLengthMm', label: 'Gauge length', symbol: 'A', type: 'length' },
    ...clampingFields,
    { field: 'sideLockInsertionMm', label: 'Side-lock insertion', type: 'length' },
    maximumRpm,
    { field: 'segmentPart', label: 'Segment: nut or holder', type: 'part' },
    ...segmentFields,
    { field: 'nutDiameterMm', label: 'Nut diameter', type: 'length' },
    { field: 'nutLengthMm', label: 'Nut length', type: 'length' },
    ...shapeFields,
    rowUnit,
  ],
  collets: [
    ...itemFields,
    { field: 'series', label: 'Series', type: 'text' },
    { field: 'minimumMm', label: 'Smallest shank', symbol: 'DCONWSN', type: 'diameter' },
    { field: 'maximumMm', label: 'Largest shank', symbol: 'DCONWSX', type: 'diameter' },
    { field: 'range', label: 'Range of shanks (3-2)', type: 'range' },
    { field: 'lengthMm', label: 'Length', type: 'length' },
    { field: 'minimumGripMm', label: 'Minimum grip', symbol: 'LSCN', type: 'length' },
    rowUnit,
  ],
  extensions: [
    ...itemFields,
    { field: 'projectionMm', label: 'Projection from the holder’s nose', type: 'length' },
    { field: 'shankDiameterMm', label: 'Shank diameter', symbol: 'DMM, DCONMS', type: 'diameter' },
    ...clampingFields,
    ...segmentFields,
    ...shapeFields,
    rowUnit,
  ],
  stock: [
    code,
    maker,
    partNumber,
    { field: 'crib', label: 'Crib', type: 'text' },
    { field: 'location', label: 'Bin', type: 'text' },
    { field: 'quantity', label: 'Quantity', type: 'quantity' },
    { field: 'condition', label: 'Condition', type: 'condition' },
  ],
  reorderPoints: [
    code,
    maker,
    partNumber,
    { field: 'crib', label: 'Crib', type: 'text' },
    { field: 'reorderPoint', label: 'Reorder point', type: 'quantity' },
    { field: 'orderUpTo', label: 'Order up to', type: 'quantity' },
    { field: 'packSize', label: 'Pack', type: 'quantity' },
    { field: 'minimumOrder', label: 'Smallest order', type: 'quantity' },
    { field: 'supplier', label: 'Supplier', type: 'text' },
    { field: 'supplierPartNumber', label: 'Supplier’s number', type: 'text' },
    { field: 'leadTimeDays', label: 'Lead time, days', type: 'days' },
  ],
}

const byName = new Map(
  importKinds.map((kind) => [kind, new Map(importFields[kind].map((field) => [field.field, field]))]),
)

/** The field of that name, or undefined where the kind has none. */
export function importField(kind: ImportKind, name: string): ImportField | undefined {
  return byName.get(kind)?.get(name)
}

const fixtureFields: readonly ImportField[] = [
  ...itemFields,
  { field: 'heightMm', label: 'Height above what it stands on', type: 'length' },
]

/** The field an exported column of a kind is written as, or undefined for what no file brings in. */
export function exportField(kind: CatalogueKind, name: string): ImportField | undefined {
  return kind === 'fixture'
    ? fixtureFields.find(({ field }) => field === name)
    : importField(importKindOf[kind], name)
}
/** What can be said for all rows of a file that has no column for it. */
export const defaultableFields = {
  cutters: ['form'],
  holders: [],
  collets: [],
  extensions: [],
  stock: ['crib'],
  reorderPoints: ['crib'],
} as const satisfies Record<ImportKind, readonly string[]>

/** Whether a cell of this type is in the unit of its column. */
export function hasLengthUnit(type: ImportFieldType): boolean {
  return type === 'length' || type === 'diameter' || type === 'distance' || type === 'range'
}

/** Whether a file of this kind holds lengths, which a bare number has to be told the unit of. */
export function hasLengths(kind: ImportKind): boolean {
  return importFields[kind].some(({ type }) => hasLengthUnit(type))
}

/** Whether a file of this kind may hold decimals: lengths, or what a thing costs. */
export function hasDecimals(kind: ImportKind): boolean {
  return importFields[kind].some(({ type }) => hasLengthUnit(type) || type === 'money')
}

export const importKindLabels: Readonly<Record<ImportKind, string>> = {
  cutters: 'Cutters',
  holders: 'Holders',
  collets: 'Collets',
  extensions: 'Extensions',
  stock: 'Opening stock',
  reorderPoints: 'Reorder points',
}
