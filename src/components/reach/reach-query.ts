import { holderSegmentParts } from '@/core/tooling'
import { decimalText } from '@/core/units/decimal-text'
import { lengthDecimals } from '@/core/units/length-unit'
import { emptyDraft, type ObstacleDraft, type ReachDraft, type SegmentDraft } from './reach-draft'
import {
  type FieldGroup,
  fieldChoices,
  fieldGroups,
  type ReachField,
  reachFields,
  toolSlots,
} from './reach-fields'
import { type FieldValue, fieldText, type Reading, readField } from './read-field'

/** The address bar speaks millimetres, degrees and newtons, so that a link says the same to everyone. */
const plain: Reading = { unit: 'mm', decimalComma: false }

/** Before a text that was not understood, so that it is not taken for a figure in the address's own unit. */
const unreadMark = 'unread:'
/** Stands for a row of a list that was not understood, and for its texts. */
const unreadRow = 'unread'
const unreadText = '?'

const segmentPattern = /^(nut|holder):([\d.]+)x([\d.]+)(?:-([\d.]+))?$/
const obstaclePattern = /^([\d.]+)x([\d.]+)$/
const longestList = 100
const segmentQueryNames = { holder: 'h.segments', extension: 'x.segments' } as const

/**
 * The check as a query: ids of what is picked, figures of what is typed. A figure that cannot be read goes along as it
 * was typed, marked so: left out, whoever opens the link would get a verdict without a limit that was meant.
 *
 * An obstacle is `setback x rise`, a segment `part:length x nose diameter - spindle diameter`.
 */
export function draftQuery(draft: ReachDraft, reading: Reading): string {
  const query = new URLSearchParams()
  if (draft.featureKind === 'hole') query.set('feature', 'hole')
  for (const slot of toolSlots) {
    const id = draft.picks[slot]
    if (id !== null) query.set(slot, id)
  }
  for (const field of reachFields) {
    const text = draft.texts[field.group][field.name]
    if (text !== undefined) setFigure(query, field, text, reading, isOverride(draft, field.group))
  }
  setList(query, 'obstacles', draft.obstacles, (obstacle) => obstacleText(obstacle, reading))
  for (const owner of ['holder', 'extension'] as const) {
    const segments = draft.segments[owner]
    if (segments)
      setList(query, segmentQueryNames[owner], segments, (segment) => segmentText(segment, reading))
  }
  // These read better plain, and a query may carry them so.
  return query.toString().replace(/%3A/g, ':').replace(/%2C/g, ',')
}

function isOverride(draft: ReachDraft, group: FieldGroup): boolean {
  return group !== 'feature' && group !== 'check' && draft.picks[group] !== null
}

function setFigure(
  query: URLSearchParams,
  field: ReachField,
  text: string,
  reading: Reading,
  keepsEmpty: boolean,
): void {
  const read = readField(field.kind, text, reading)
  if (!read.ok) query.set(field.query, `${unreadMark}${text.trim()}`)
  else if (read.value !== null || keepsEmpty) query.set(field.query, fieldText(field.kind, read.value, plain))
}

function setList<Row>(
  query: URLSearchParams,
  name: string,
  rows: readonly Row[],
  write: (row: Row) => string | null,
): void {
  const texts = rows.map(write).filter((text) => text !== null)
  if (texts.length > 0) query.set(name, texts.join(','))
}

function mmText(text: string, reading: Reading): string | null {
  const read = readField('lengthOrZero', text, reading)
  return read.ok && typeof read.value === 'number' ? decimalText(read.value, 0, lengthDecimals) : null
}

/** A row nobody filled in is left out; one that is half filled in or cannot be read stays a fault. */
function unreadUnlessBlank(texts: readonly string[]): string | null {
  return texts.every((text) => text.trim() === '') ? null : unreadRow
}

function obstacleText({ setback, rise }: ObstacleDraft, reading: Reading): string | null {
  const [setbackMm, riseMm] = [mmText(setback, reading), mmText(rise, reading)]
  if (setbackMm === null || riseMm === null) return unreadUnlessBlank([setback, rise])
  return `${setbackMm}x${riseMm}`
}

function segmentText(segment: SegmentDraft, reading: Reading): string | null {
  const [length, nose, spindle] = [segment.length, segment.nose, segment.spindle].map((text) =>
    mmText(text, reading),
  )
  if (!length || !nose || !spindle) return unreadUnlessBlank([segment.length, segment.nose, segment.spindle])
  return `${segment.part}:${length}x${nose}${spindle === nose ? '' : `-${spindle}`}`
}

/** The draft a query stands for, in the reader's unit. A figure that is not understood stays, as a fault at its field. */
export function queryDraft(queryText: string, reading: Reading): ReachDraft {
  const query = new URLSearchParams(queryText)
  const texts = Object.fromEntries(fieldGroups.map((group) => [group, {}])) as Record<
    FieldGroup,
    Record<string, string>
  >
  for (const field of reachFields) {
    const written = query.get(field.query)
    const read = written === null ? null : readField(field.kind, written, plain)
    if (written !== null && !read?.ok)
      texts[field.group][field.name] = written.startsWith(unreadMark)
        ? written.slice(unreadMark.length)
        : written
    else if (read?.ok && isChoice(field, read.value))
      texts[field.group][field.name] = fieldText(field.kind, read.value, reading)
  }
  const picks = Object.fromEntries(toolSlots.map((slot) => [slot, idOrNull(query.get(slot))]))
  return {
    featureKind: query.get('feature') === 'hole' ? 'hole' : 'wall',
    picks: { ...emptyDraft.picks, ...picks },
    texts,
    obstacles: readList(query.get('obstacles'), (text, key) => readObstacle(text, key, reading)) ?? [],
    segments: {
      holder: readList(query.get(segmentQueryNames.holder), (text, key) => readSegment(text, key, reading)),
      extension: readList(query.get(segmentQueryNames.extension), (text, key) =>
        readSegment(text, key, reading),
      ),
    },
  }
}

/** A choice nobody offers is no answer to anything. */
function isChoice(field: ReachField, value: FieldValue): boolean {
  return field.kind !== 'choice' || value === null || (fieldChoices[field.name] ?? []).includes(String(value))
}

function idOrNull(text: string | null): string | null {
  return text !== null && /^[1-9]\d{0,17}$/.test(text) ? text : null
}

function readList<Row>(text: string | null, read: (text: string, key: number) => Row): Row[] | null {
  return text ? text.split(',').slice(0, longestList).map(read) : null
}

function typed(mm: string | undefined, reading: Reading): string {
  const read = readField('lengthOrZero', mm ?? '', plain)
  return read.ok ? fieldText('lengthOrZero', read.value, reading) : ''
}

function readObstacle(text: string, key: number, reading: Reading): ObstacleDraft {
  const match = obstaclePattern.exec(text)
  if (!match) return { key, setback: unreadText, rise: unreadText }
  return { key, setback: typed(match[1], reading), rise: typed(match[2], reading) }
}

function readSegment(text: string, key: number, reading: Reading): SegmentDraft {
  const match = segmentPattern.exec(text)
  const part = holderSegmentParts.find((known) => known === match?.[1])
  if (!match || !part)
    return { key, part: 'holder', length: unreadText, nose: unreadText, spindle: unreadText }
  return {
    key,
    part,
    length: typed(match[2], reading),
    nose: typed(match[3], reading),
    spindle: typed(match[4] ?? match[3], reading),
  }
}

/** The draft as another unit writes it: the same figures, so that a bare number never changes its meaning. */
export function draftInUnit(draft: ReachDraft, from: Reading, to: Reading): ReachDraft {
  return queryDraft(draftQuery(draft, from), to)
}
