import {
  type BallSpeedAnswer,
  type BallSpeedRequest,
  ballSpeedAnswer,
} from '@/core/ball-end/ball-speed-answer'
import { stepoverForScallopMm } from '@/core/ball-end/scallop'
import { CoreInputError } from '@/core/core-input-error'
import { leastSpeedLimit, type SpeedLimit, type SpeedLimits } from '@/core/speeds/speed-limit'
import { decimalText } from '@/core/units/decimal-text'
import type { LengthUnit } from '@/core/units/length-unit'
import { mmPerInch } from '@/core/units/length-unit'
import { parseAngle } from '@/core/units/parse-angle'
import { parseCount } from '@/core/units/parse-count'
import { parseLength } from '@/core/units/parse-length'
import { metresPerFoot, parseSpeed } from '@/core/units/parse-speed'
import { lengthInputText } from './format-length'

/** What can be typed, by the names the API and the address bar use, and how each is read. */
const fieldKinds = {
  cuttingDiameterMm: 'length',
  cornerRadiusMm: 'length',
  depthOfCutMm: 'length',
  tiltDeg: 'angle',
  leadDeg: 'angle',
  stepoverMm: 'length',
  scallopHeightMm: 'length',
  spindleRpm: 'rpm',
  wantedSpeedMPerMin: 'speed',
  maximumRpm: 'rpm',
} as const

export type BallSpeedField = keyof typeof fieldKinds
export const ballSpeedFields = Object.keys(fieldKinds) as BallSpeedField[]

/** Two pairs of fields say one thing each way: what was typed last in a pair counts, the other is worked out. */
const partners: Partial<Record<BallSpeedField, BallSpeedField>> = {
  stepoverMm: 'scallopHeightMm',
  scallopHeightMm: 'stepoverMm',
  spindleRpm: 'wantedSpeedMPerMin',
  wantedSpeedMPerMin: 'spindleRpm',
}

/** What was typed, as it was typed; blank where nothing was. */
export type BallSpeedDraft = Record<BallSpeedField, string>

export interface TypingSettings {
  unit: LengthUnit
  decimalComma: boolean
}

export interface BallSpeedReading {
  /** Null while something is missing or can't be. */
  request: BallSpeedRequest | null
  answer: BallSpeedAnswer | null
  faults: Partial<Record<BallSpeedField, string>>
  /** What caps the speed: the spindle as it was typed, or the holder or cutter picked. */
  limit: SpeedLimit | null
  /** Every field that could be read, for the address bar. */
  values: Partial<Record<BallSpeedField, number>>
}

/** A believable cut to begin with, in sizes people of either unit use. */
const firstValues: Record<LengthUnit, Partial<Record<BallSpeedField, number>>> = {
  mm: {
    cuttingDiameterMm: 6,
    depthOfCutMm: 0.3,
    tiltDeg: 0,
    stepoverMm: 0.3,
    spindleRpm: 18_000,
    maximumRpm: 24_000,
  },
  in: {
    cuttingDiameterMm: mmPerInch / 4,
    depthOfCutMm: mmPerInch / 100,
    tiltDeg: 0,
    stepoverMm: mmPerInch / 100,
    spindleRpm: 18_000,
    maximumRpm: 24_000,
  },
}

/** The fields as an address holds them; an address that holds none gives the first ones. */
export function draftFromAddress(params: URLSearchParams, settings: TypingSettings): BallSpeedDraft {
  const given = ballSpeedFields.flatMap((field) => {
    const text = params.get(field)
    return text !== null && /^\d+(?:\.\d+)?$/.test(text) ? [[field, Number(text)] as const] : []
  })
  const values = given.length > 0 ? Object.fromEntries(given) : firstValues[settings.unit]
  return Object.fromEntries(
    ballSpeedFields.map((field) => {
      const value = values[field]
      return [field, value === undefined ? '' : valueText(field, value, settings)]
    }),
  ) as BallSpeedDraft
}

/** Ids of what was picked from the crib, by the names the address bar has. */
export interface BallSpeedPicks {
  cutter: string | null
  holder: string | null
}

export function picksFromAddress(params: URLSearchParams): BallSpeedPicks {
  const idOf = (name: string) => {
    const text = params.get(name)
    return text !== null && /^\d{1,18}$/.test(text) ? text : null
  }
  return { cutter: idOf('cutter'), holder: idOf('holder') }
}

/** The address of what was read, in the units of the API, so that it means the same to whoever opens it. */
export function ballSpeedAddress(values: BallSpeedReading['values'], picks: BallSpeedPicks): string {
  const entries = Object.entries(values).map(([field, value]) => [field, decimalText(value, 0, 9)])
  const picked = Object.entries(picks).filter(([, id]) => id !== null)
  return new URLSearchParams([...entries, ...picked]).toString()
}

/** The draft with the end of a cutter picked from the crib; a ball's radius stays blank, as it is typed. */
export function withCutter(
  draft: BallSpeedDraft,
  cutter: { form: string; cuttingDiameterMm: number; cornerRadiusMm: number | null },
  settings: TypingSettings,
): BallSpeedDraft {
  const { form, cuttingDiameterMm, cornerRadiusMm } = cutter
  return {
    ...draft,
    cuttingDiameterMm: valueText('cuttingDiameterMm', cuttingDiameterMm, settings),
    cornerRadiusMm: form === 'ball' ? '' : valueText('cornerRadiusMm', cornerRadiusMm ?? 0, settings),
  }
}

/** The draft after a field was typed in; its partner becomes the one that is worked out. */
export function withTyped(draft: BallSpeedDraft, field: BallSpeedField, text: string): BallSpeedDraft {
  const partner = partners[field]
  return { ...draft, [field]: text, ...(partner ? { [partner]: '' } : {}) }
}

/**
 * Reads every field, works the answer out, and says of each field what is wrong with it. `picked` has the highest speeds
 * of the holder and cutter picked from the crib; the spindle's is typed.
 */
export function readBallSpeedDraft(
  draft: BallSpeedDraft,
  settings: TypingSettings,
  picked: SpeedLimits = {},
): BallSpeedReading {
  const values: BallSpeedReading['values'] = {}
  const faults: BallSpeedReading['faults'] = {}
  for (const field of ballSpeedFields) {
    if (draft[field].trim() === '') continue
    const read = readField(field, draft[field], settings)
    if (typeof read === 'number') values[field] = read
    else faults[field] = read.message
  }
  const { cuttingDiameterMm, depthOfCutMm, tiltDeg = 0, scallopHeightMm, maximumRpm, ...rest } = values
  // A limit of nothing is left to the calculation, which says so at its field.
  const limit = maximumRpm === 0 ? null : leastSpeedLimit({ ...picked, spindle: maximumRpm ?? null })
  if (cuttingDiameterMm === undefined) faults.cuttingDiameterMm ??= 'Enter the diameter of the ball.'
  if (depthOfCutMm === undefined) faults.depthOfCutMm ??= 'Enter the depth of cut.'
  if (cuttingDiameterMm === undefined || depthOfCutMm === undefined || Object.keys(faults).length > 0) {
    return { request: null, answer: null, faults, limit, values }
  }
  try {
    const request: BallSpeedRequest = { cuttingDiameterMm, depthOfCutMm, tiltDeg, ...rest }
    const cap = limit?.rpm ?? maximumRpm
    if (cap !== undefined) request.maximumRpm = cap
    if (scallopHeightMm !== undefined) request.stepoverMm = stepoverForScallopMm(request, scallopHeightMm)
    return { request, answer: ballSpeedAnswer(request), faults, limit, values }
  } catch (error) {
    if (!(error instanceof CoreInputError)) throw error
    const field = ballSpeedFields.find((candidate) => candidate === error.path) ?? 'cuttingDiameterMm'
    return { request: null, answer: null, faults: { [field]: error.message }, limit, values }
  }
}

/** What the worked-out half of each pair shows; blank where there is nothing to work it out from. */
export function workedOutText(
  field: BallSpeedField,
  { request, answer }: BallSpeedReading,
  settings: TypingSettings,
): string {
  const worth: Partial<Record<BallSpeedField, number | null | undefined>> = {
    stepoverMm: request?.stepoverMm,
    scallopHeightMm: answer?.scallopHeightMm,
    spindleRpm: answer?.spindleRpm,
    wantedSpeedMPerMin: answer?.speedMPerMin?.largest,
  }
  const value = worth[field]
  return value === null || value === undefined ? '' : roundedText(field, value, settings)
}

function readField(
  field: BallSpeedField,
  text: string,
  settings: TypingSettings,
): number | { message: string } {
  switch (fieldKinds[field]) {
    case 'length': {
      const read = parseLength(text, { ...settings, drillSizes: false })
      return read.ok ? read.mm : read
    }
    case 'angle': {
      const read = parseAngle(text, settings)
      return read.ok ? read.deg : read
    }
    case 'speed': {
      const read = parseSpeed(text, settings)
      return read.ok ? read.mPerMin : read
    }
    case 'rpm': {
      const read = parseCount(text, settings)
      return read.ok ? read.count : read
    }
  }
}

function valueText(field: BallSpeedField, value: number, settings: TypingSettings): string {
  switch (fieldKinds[field]) {
    case 'length':
      return lengthInputText(value, settings.unit, settings)
    case 'angle':
      return withComma(decimalText(value, 0, 6), settings)
    case 'speed':
      return withComma(decimalText(settings.unit === 'mm' ? value : value / metresPerFoot, 0, 4), settings)
    case 'rpm':
      return decimalText(value, 0, 0)
  }
}

/** As people would write a worked-out figure: no more decimals than mean anything. */
function roundedText(field: BallSpeedField, value: number, settings: TypingSettings): string {
  if (fieldKinds[field] === 'length') {
    const inches = settings.unit === 'in'
    return withComma(decimalText(inches ? value / mmPerInch : value, 0, inches ? 5 : 4), settings)
  }
  return fieldKinds[field] === 'speed'
    ? withComma(decimalText(settings.unit === 'mm' ? value : value / metresPerFoot, 0, 1), settings)
    : valueText(field, value, settings)
}

function withComma(text: string, { decimalComma }: TypingSettings): string {
  return decimalComma ? text.replace('.', ',') : text
}
