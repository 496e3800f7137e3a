import { CoreInputError } from '@/core/core-input-error'
import { reachAnswer } from '@/core/reach/reach-answer'
import type { Feature, Obstacle, ReachAnswer, ReachRequest, ReachSettings } from '@/core/reach/types'
import type {
  Bore,
  ColletGeometry,
  CutterForm,
  CutterGeometry,
  ExtensionGeometry,
  HolderGeometry,
  HolderSegment,
} from '@/core/tooling'
import { type CatalogueRows, catalogueValue } from './catalogue-values'
import { missingFigures } from './missing-figures'
import { isSlotUsed, type ObstacleDraft, type ReachDraft, type SegmentDraft } from './reach-draft'
import {
  type FieldGroup,
  isFieldOfFeature,
  isFieldOfForm,
  type ReachField,
  reachFields,
  toolSlots,
} from './reach-fields'
import { type FieldValue, type Reading, readField } from './read-field'

/** What is wrong, by the request's own names of the places. */
export type FieldErrors = Readonly<Record<string, string>>

/** What a draft says so far: figures read, tools put together as far as they are all there. */
export interface CompiledCheck {
  feature: Feature | null
  cutter: CutterGeometry | null
  holder: HolderGeometry | null
  extension: ExtensionGeometry | null
  request: ReachRequest | null
  /** What is still needed, in words. */
  missing: readonly string[]
  /** Texts that can't be read. */
  unread: FieldErrors
}

/** The verdict, or why there is none. There is never an old one. */
export type CheckResult =
  | { state: 'waiting' }
  | { state: 'refused'; errors: FieldErrors; reason: string | null }
  | { state: 'answered'; request: ReachRequest; answer: ReachAnswer }

export type Values = Readonly<Record<string, FieldValue>>

export interface CheckContext {
  rows: CatalogueRows
  reading: Reading
  settings: ReachSettings
}

/** Puts the check together from what is picked and typed; what is typed stands before the catalogue. */
export function compileCheck(draft: ReachDraft, context: CheckContext): CompiledCheck {
  const unread: Record<string, string> = {}
  const values = (group: FieldGroup) => groupValues(draft, group, context, unread)
  const [feature, cutter, holder] = [values('feature'), cutterValues(values('cutter')), values('holder')]
  const [collet, extension, check] = [values('collet'), values('extension'), values('check')]
  const usesCollet = isSlotUsed(draft, 'collet')
  const usesExtension = isSlotUsed(draft, 'extension')
  const obstacles = readObstacles(draft.obstacles, context.reading, unread)
  const segments = readSegments('holder', draft, context, unread)
  const extensionSegments = readSegments('extension', draft, context, unread)
  const missing = missingFigures({
    featureKind: draft.featureKind,
    feature,
    cutter,
    holder,
    collet: usesCollet ? collet : null,
    extension: usesExtension ? extension : null,
    hasSegments: segments.length > 0,
    hasExtensionSegments: extensionSegments.length > 0,
    unloaded: toolSlots.filter((slot) => draft.picks[slot] !== null && context.rows[slot] == null),
  })
  const hasCutter = ['cuttingDiameterMm', 'shankDiameterMm', 'overallLengthMm'].every(
    (name) => cutter[name] != null,
  )
  const parts = {
    feature: feature.depthMm == null ? null : featureOf(draft.featureKind, feature, obstacles),
    cutter: hasCutter ? recordOf<CutterGeometry>(cutter) : null,
    holder:
      holder.gaugeLengthMm == null || segments.length === 0
        ? null
        : { ...withoutBore<HolderGeometry>(holder), segments },
    extension:
      !usesExtension || extension.projectionMm == null || extensionSegments.length === 0
        ? null
        : { ...withoutBore<ExtensionGeometry>(extension), segments: extensionSegments },
  }
  const isWhole = missing.length === 0 && Object.keys(unread).length === 0
  const { feature: asked, cutter: tool, holder: chuck } = parts
  if (!isWhole || !asked || !tool || !chuck) return { ...parts, request: null, missing, unread }
  const request: ReachRequest = {
    feature: asked,
    cutter: tool,
    holder: chuck,
    extension: parts.extension,
    collet: usesCollet ? recordOf<ColletGeometry>(collet) : null,
    bore: boreOf(usesExtension ? extension : holder),
    stickOutMm: numberOrNull(check.stickOutMm),
    clearances: {
      shankMm: numberOrNull(check.clearanceShankMm) ?? context.settings.shankClearanceMm,
      holderMm: numberOrNull(check.clearanceHolderMm) ?? context.settings.holderClearanceMm,
    },
    sideLoadN: numberOrNull(check.sideLoadN),
    settings: context.settings,
  }
  return { ...parts, request, missing, unread }
}

/** The verdict of what was put together, or what the core refuses and where. */
export function checkResult({ request, unread }: CompiledCheck): CheckResult {
  if (Object.keys(unread).length > 0) return { state: 'refused', errors: unread, reason: null }
  if (!request) return { state: 'waiting' }
  try {
    return { state: 'answered', request, answer: reachAnswer(request) }
  } catch (error) {
    if (!(error instanceof CoreInputError)) throw error
    return { state: 'refused', errors: { [error.path]: error.message }, reason: error.message }
  }
}

function groupValues(
  draft: ReachDraft,
  group: FieldGroup,
  context: CheckContext,
  unread: Record<string, string>,
): Record<string, FieldValue> {
  const values: Record<string, FieldValue> = {}
  for (const field of reachFields) {
    if (field.group !== group || !isFieldInUse(draft, field)) continue
    const text = draft.texts[group][field.name]
    if (text === undefined) {
      values[field.name] = catalogueValue(context.rows, group, field.name)
      continue
    }
    const read = readField(field.kind, text, context.reading)
    if (read.ok) values[field.name] = read.value
    else unread[field.path] = read.message
  }
  return values
}

function isFieldInUse(draft: ReachDraft, field: ReachField): boolean {
  if (field.group === 'feature') return isFieldOfFeature(field.name, draft.featureKind)
  return field.group === 'check' || field.group === 'cutter' || isSlotUsed(draft, field.group)
}

/** What was typed for another form is not this form's. */
function cutterValues(values: Record<string, FieldValue>): Record<string, FieldValue> {
  const form = (values.form ?? 'square') as CutterForm
  const ofForm = Object.entries(values).filter(([name]) => isFieldOfForm(name, form))
  return { ...Object.fromEntries(ofForm), form }
}

/** Values by the record's own names; the field table is what holds the two together. */
function recordOf<Geometry>(values: Values): Geometry {
  return values as unknown as Geometry
}

function withoutBore<Geometry>(values: Values): Geometry {
  const { boreKind: _kind, boreSeries: _series, boreDiameterMm: _diameter, ...rest } = values
  return recordOf<Geometry>(rest)
}

function featureOf(kind: ReachDraft['featureKind'], values: Values, obstacles: Obstacle[]): Feature {
  return recordOf<Feature>({
    ...values,
    kind,
    ...(kind === 'wall' ? { obstacles } : {}),
  } as unknown as Values)
}

function boreOf(values: Values): Bore | null {
  const { boreKind, boreSeries, boreDiameterMm } = values
  if (boreKind === 'collet' && typeof boreSeries === 'string') return { kind: 'collet', series: boreSeries }
  if (boreKind === 'fixed' && typeof boreDiameterMm === 'number')
    return { kind: 'fixed', diameterMm: boreDiameterMm }
  return null
}

function numberOrNull(value: FieldValue | undefined): number | null {
  return typeof value === 'number' ? value : null
}

function readObstacles(
  drafts: readonly ObstacleDraft[],
  reading: Reading,
  unread: Record<string, string>,
): Obstacle[] {
  const figure = (text: string, path: string) => readFigure(text, path, reading, unread, true)
  return drafts.flatMap((draft, index) => {
    const setbackMm = figure(draft.setback, `feature.obstacles.${index}.setbackMm`)
    const riseMm = figure(draft.rise, `feature.obstacles.${index}.riseMm`)
    return setbackMm === null || riseMm === null ? [] : [{ setbackMm, riseMm }]
  })
}

function readSegments(
  owner: 'holder' | 'extension',
  draft: ReachDraft,
  { rows, reading }: CheckContext,
  unread: Record<string, string>,
): HolderSegment[] {
  const typed = draft.segments[owner]
  if (typed === null) return [...(rows[owner]?.segments ?? [])].map((row) => ({ part: 'holder', ...row }))
  return typed.flatMap((segment, index) =>
    readSegment(segment, `${owner}.segments.${index}`, reading, unread),
  )
}

/** A row with nothing in it yet is no segment; one half filled says what it lacks. */
function readSegment(
  segment: SegmentDraft,
  path: string,
  reading: Reading,
  unread: Record<string, string>,
): HolderSegment[] {
  if (![segment.length, segment.nose, segment.spindle].some((text) => text.trim() !== '')) return []
  const lengthMm = readFigure(segment.length, `${path}.lengthMm`, reading, unread)
  const noseDiameterMm = readFigure(segment.nose, `${path}.noseDiameterMm`, reading, unread)
  // A cylinder is typed once.
  const spindleDiameterMm =
    segment.spindle.trim() === ''
      ? noseDiameterMm
      : readFigure(segment.spindle, `${path}.spindleDiameterMm`, reading, unread)
  if (lengthMm === null || noseDiameterMm === null || spindleDiameterMm === null) return []
  return [{ part: segment.part, lengthMm, noseDiameterMm, spindleDiameterMm }]
}

function readFigure(
  text: string,
  path: string,
  reading: Reading,
  unread: Record<string, string>,
  allowsZero = false,
): number | null {
  const read = readField(allowsZero ? 'lengthOrZero' : 'length', text, reading)
  if (read.ok && typeof read.value === 'number') return read.value
  unread[path] = read.ok ? 'Enter a length.' : read.message
  return null
}
