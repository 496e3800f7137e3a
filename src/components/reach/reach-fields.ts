import { type CutterForm, cutterForms, substrates } from '@/core/tooling'

/** The parts of a check, each a column of fields of its own. */
export const fieldGroups = ['feature', 'cutter', 'holder', 'collet', 'extension', 'check'] as const
export type FieldGroup = (typeof fieldGroups)[number]

/** What of the crib a group of fields can be filled from. */
export const toolSlots = ['cutter', 'holder', 'collet', 'extension'] as const
export type ToolSlot = (typeof toolSlots)[number]

/** How what is typed in a field is read. `choice` and `text` are taken as they stand. */
export type FieldKind = 'length' | 'lengthOrZero' | 'angle' | 'number' | 'speed' | 'choice' | 'text'

export interface ReachField {
  group: FieldGroup
  name: string
  /** The member of the request it fills, as the core names it when it refuses it. */
  path: string
  /** Its name in the address bar. */
  query: string
  label: string
  symbol?: string
  kind: FieldKind
  hint?: string
}

type FieldRow = [name: string, query: string, label: string, kind: FieldKind, symbol?: string, hint?: string]

function fieldsOf(
  group: FieldGroup,
  prefix: string,
  pathOf: (name: string) => string,
  rows: FieldRow[],
): ReachField[] {
  return rows.map(([name, query, label, kind, symbol, hint]) => ({
    group,
    name,
    path: pathOf(name),
    query: `${prefix}${query}`,
    label,
    kind,
    ...(symbol ? { symbol } : {}),
    ...(hint ? { hint } : {}),
  }))
}

const clampingRows: FieldRow[] = [
  ['boreKind', 'takes', 'Takes', 'choice'],
  ['boreSeries', 'series', 'Collet series', 'text'],
  ['boreDiameterMm', 'bore', 'Bore diameter', 'length'],
  ['boreDepthMm', 'depth', 'Bore depth', 'length', undefined, 'How far a shank can go in'],
  ['minimumGripMm', 'grip', 'Least grip', 'length', 'LSCN'],
  ['gripStartMm', 'start', 'Gripping begins behind the nose', 'lengthOrZero'],
]

/** What a field of the kind `choice` may hold. */
export const fieldChoices: Readonly<Record<string, readonly string[]>> = {
  form: cutterForms,
  substrate: substrates,
  boreKind: ['collet', 'fixed'],
}

/** Where the core speaks of a bore it names the record; the fields are its members. */
const borePaths: Readonly<Record<string, string>> = {
  boreKind: 'bore.kind',
  boreSeries: 'bore.series',
  boreDiameterMm: 'bore.diameterMm',
}

const clearancePaths: Readonly<Record<string, string>> = {
  clearanceShankMm: 'clearances.shankMm',
  clearanceHolderMm: 'clearances.holderMm',
}

const holdingPath = (owner: string) => (name: string) => `${owner}.${borePaths[name] ?? name}`

/** Every typed field of the page: what it is called, how it is read, where it goes, how the address bar names it. */
export const reachFields: readonly ReachField[] = [
  ...fieldsOf('feature', '', (name) => `feature.${name}`, [
    ['depthMm', 'depth', 'Depth', 'length'],
    ['draftDeg', 'draft', 'Draft', 'angle', undefined, 'How far the wall leans back'],
    ['tiltDeg', 'tilt', 'Tilt', 'angle', undefined, 'Tool away from the wall; ball tips only'],
    ['throughMm', 'through', 'Through allowance', 'lengthOrZero', undefined, 'Below the floor'],
    ['openingWidthMm', 'opening', 'Opening at the floor', 'length'],
    ['insideCornerRadiusMm', 'corner', 'Inside corner radius', 'lengthOrZero'],
    ['floorRadiusMm', 'floor', 'Floor radius', 'lengthOrZero', undefined, '0 asks for a square end'],
    ['diameterMm', 'diameter', 'Hole diameter', 'length'],
    ['breakThroughMm', 'breakthrough', 'Break-through', 'lengthOrZero'],
  ]),
  ...fieldsOf('cutter', 'c.', (name) => `cutter.${name}`, [
    ['form', 'form', 'Form', 'choice'],
    ['cuttingDiameterMm', 'DC', 'Cutting diameter', 'length', 'DC'],
    ['cornerRadiusMm', 'RE', 'Corner radius', 'lengthOrZero', 'RE'],
    ['taperHalfAngleDeg', 'taper', 'Taper, a side', 'angle'],
    ['pointAngleDeg', 'SIG', 'Point angle', 'angle', 'SIG'],
    ['tipDiameterMm', 'tip', 'Tip diameter', 'lengthOrZero'],
    ['lengthOfCutMm', 'APMX', 'Length of cut', 'length', 'APMX'],
    ['fluteLengthMm', 'LCF', 'Fluted length', 'length', 'LCF'],
    ['neckDiameterMm', 'DN', 'Neck diameter', 'length', 'DN'],
    ['reachLengthMm', 'LU', 'Reach length', 'length', 'LU'],
    ['neckTaperHalfAngleDeg', 'BHTA', 'Neck taper, a side', 'angle', 'BHTA'],
    ['neckTransitionAngleDeg', 'transition', 'Transition, a side', 'angle'],
    ['shankDiameterMm', 'DMM', 'Shank diameter', 'length', 'DMM'],
    ['overallLengthMm', 'OAL', 'Overall length', 'length', 'OAL'],
    ['substrate', 'material', 'Tool material', 'choice'],
  ]),
  ...fieldsOf('holder', 'h.', holdingPath('holder'), [
    ['gaugeLengthMm', 'A', 'Gauge length', 'length', 'A', 'Gauge line to nose face'],
    ...clampingRows,
    ['sideLockInsertionMm', 'insertion', 'Side-lock insertion', 'length'],
    ['spindleNoseDiameterMm', 'spindle', 'Spindle nose diameter', 'length'],
  ]),
  ...fieldsOf('collet', 'k.', (name) => `collet.${name}`, [
    ['series', 'series', 'Series', 'text'],
    ['minimumMm', 'from', 'Smallest shank', 'length'],
    ['maximumMm', 'to', 'Largest shank', 'length'],
    ['lengthMm', 'length', 'Length', 'length'],
    ['minimumGripMm', 'grip', 'Least grip', 'length', 'LSCN'],
  ]),
  ...fieldsOf('extension', 'x.', holdingPath('extension'), [
    ['projectionMm', 'E', 'Projection', 'length', 'E', 'From the holder’s nose to its own'],
    ...clampingRows,
  ]),
  ...fieldsOf('check', '', (name) => clearancePaths[name] ?? name, [
    ['stickOutMm', 'stickout', 'Stick-out', 'length'],
    ['clearanceShankMm', 'cs', 'Clearance at the shank', 'lengthOrZero'],
    ['clearanceHolderMm', 'ch', 'Clearance at the holder', 'lengthOrZero'],
    ['sideLoadN', 'load', 'Side load', 'number', undefined, 'In newtons, for the deflection at the tip'],
  ]),
]

const byName = new Map(reachFields.map((field) => [`${field.group}.${field.name}`, field]))

export function reachField(group: FieldGroup, name: string): ReachField {
  const field = byName.get(`${group}.${name}`)
  if (!field) throw new Error(`There is no field ${group}.${name}`)
  return field
}

export const formNames: Readonly<Record<CutterForm, string>> = {
  square: 'Square end',
  cornerRadius: 'Corner radius',
  ball: 'Ball',
  tapered: 'Tapered',
  drill: 'Drill',
  reamer: 'Reamer',
  tap: 'Tap',
  faceMill: 'Face mill',
  slotting: 'Slotting cutter',
  threadMill: 'Thread mill',
  chamfer: 'Chamfer tool',
}

const formsWith: Readonly<Record<string, readonly CutterForm[]>> = {
  cornerRadiusMm: ['cornerRadius', 'tapered'],
  taperHalfAngleDeg: ['tapered'],
  pointAngleDeg: ['drill', 'reamer', 'tap', 'chamfer'],
  tipDiameterMm: ['chamfer'],
}

/** Whether a cutter of this form has such a dimension. */
export function isFieldOfForm(name: string, form: CutterForm): boolean {
  return formsWith[name]?.includes(form) ?? true
}

const wallOnly = [
  'draftDeg',
  'tiltDeg',
  'throughMm',
  'openingWidthMm',
  'insideCornerRadiusMm',
  'floorRadiusMm',
]
const holeOnly = ['diameterMm', 'breakThroughMm']

/** Whether a wall, or a hole, has such a dimension. */
export function isFieldOfFeature(name: string, kind: 'wall' | 'hole'): boolean {
  return !(kind === 'wall' ? holeOnly : wallOnly).includes(name)
}
