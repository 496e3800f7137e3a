import { CoreInputError } from '@/core/core-input-error'
import { reachAnswer } from '@/core/reach/reach-answer'
import type { Feature, Obstacle, ReachAnswer, ReachRequest } from '@/core/reach/types'
import type {
  Bore,
  ColletGeometry,
  CutterForm,
  CutterGeometry,
  ExtensionGeometry,
  HolderGeometry,
  HolderSegment,
} from '@/core/tooling'
import { catalogueValue } from './catalogue-values'
import type { CheckContext, Values } from './check-context'
import { missingFigures } from './missing-figures'
import { isSlotUsed, type ReachDraft } from './reach-draft'
import {
  type FieldGroup,
  isFieldOfFeature,
  isFieldOfForm,
  type ReachField,
  reachFields,
  toolSlots,
} from './reach-fields'
import { type FieldValue, readField } from './read-field'
import { readObstacles, readSegments } from './read-lists'

/** What is wrong, by the request's own names of the places. */
export type FieldErrors = Readonly<Record<string, string>>

/** What a draft says so far: figures read, tools put together as far as they are all there. */
export interface CompiledCheck {
  feature: Feature | null
  cutter: CutterGeometry | null
  holder: HolderGeometry | null
  extension: ExtensionGeometry | null
  stickOutMm: number | null
  /** null where the shop's own stands. */
  clearances: { shankMm: number | null; holderMm: number | null }
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

/** Puts the check together from what is picked and typed; what is typed stands before the catalogue. */
export function compileCheck(draft: ReachDraft, context: CheckContext): CompiledCheck {
  const unread: Record<string, string> = {}
  const figures = readFigures(draft, context, unread)
  const missing = missingFigures({
    ...figures,
    featureKind: draft.featureKind,
    hasSegments: figures.segments.length > 0,
    hasExtensionSegments: figures.extensionSegments.length > 0,
    unloaded: toolSlots.filter((slot) => draft.picks[slot] !== null && context.rows[slot] == null),
  })
  const parts = partsOf(draft.featureKind, figures)
  const isWhole = missing.length === 0 && Object.keys(unread).length === 0
  const { feature, cutter, holder } = parts
  if (!isWhole || !feature || !cutter || !holder) return { ...parts, request: null, missing, unread }
  const { settings } = context
  const request: ReachRequest = {
    feature,
    cutter,
    holder,
    extension: parts.extension,
    collet: figures.collet ? recordOf<ColletGeometry>(figures.collet) : null,
    bore: boreOf(figures.extension ?? figures.holder),
    stickOutMm: parts.stickOutMm,
    clearances: {
      shankMm: parts.clearances.shankMm ?? settings.shankClearanceMm,
      holderMm: parts.clearances.holderMm ?? settings.holderClearanceMm,
    },
    sideLoadN: numberOrNull(figures.check.sideLoadN),
    settings,
  }
  return { ...parts, request, missing, unread }
}

interface ReadFigures {
  feature: Values
  cutter: Values
  holder: Values
  /** null where none is used. */
  collet: Values | null
  extension: Values | null
  check: Values
  obstacles: Obstacle[]
  segments: HolderSegment[]
  extensionSegments: HolderSegment[]
}

function readFigures(draft: ReachDraft, context: CheckContext, unread: Record<string, string>): ReadFigures {
  const values = (group: FieldGroup) => groupValues(draft, group, context, unread)
  return {
    feature: values('feature'),
    cutter: cutterValues(values('cutter')),
    holder: values('holder'),
    collet: isSlotUsed(draft, 'collet') ? values('collet') : null,
    extension: isSlotUsed(draft, 'extension') ? values('extension') : null,
    check: values('check'),
    obstacles: draft.featureKind === 'wall' ? readObstacles(draft.obstacles, context.reading, unread) : [],
    segments: readSegments('holder', draft, context, unread),
    extensionSegments: readSegments('extension', draft, context, unread),
  }
}

type CompiledParts = Omit<CompiledCheck, 'request' | 'missing' | 'unread'>

/** What can be drawn of it, each part as soon as it is there. */
function partsOf(kind: ReachDraft['featureKind'], figures: ReadFigures): CompiledParts {
  const { feature, cutter, holder, extension, check, obstacles, segments, extensionSegments } = figures
  const isCutterThere = ['cuttingDiameterMm', 'shankDiameterMm', 'overallLengthMm'].every(
    (name) => cutter[name] != null,
  )
  const isHolderThere = holder.gaugeLengthMm != null && segments.length > 0
  const isExtensionThere = extension?.projectionMm != null && extensionSegments.length > 0
  return {
    feature: feature.depthMm == null ? null : featureOf(kind, feature, obstacles),
    cutter: isCutterThere ? recordOf<CutterGeometry>(cutter) : null,
    holder: isHolderThere ? { ...withoutBore<HolderGeometry>(holder), segments } : null,
    extension:
      extension && isExtensionThere
        ? { ...withoutBore<ExtensionGeometry>(extension), segments: extensionSegments }
        : null,
    stickOutMm: numberOrNull(check.stickOutMm),
    clearances: {
      shankMm: numberOrNull(check.clearanceShankMm),
      holderMm: numberOrNull(check.clearanceHolderMm),
    },
  }
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
