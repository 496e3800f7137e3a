import { CoreInputError } from '@/core/core-input-error'
import { notNegative, positive, positiveOrNull } from '@/core/outline/checked-number'
import { overlapToleranceMm } from '@/core/outline/types'
import { type CheckedDemand, checkedDemand } from '@/core/reach/checked-feature'
import { checkedClearances } from '@/core/reach/reach-case'
import type { Clearances, Feature } from '@/core/reach/types'
import { askedFeature } from './asked-feature'
import { eachTable } from './each-table'
import type { SearchTables } from './search-tables'
import type { GaugeLengthWindow, ScallopLimit, SearchQuestion, SearchTableName } from './types'

/** A question with everything checked. */
export interface AskedSearch {
  /** What of the feature this purpose asks. */
  feature: Feature
  demand: CheckedDemand
  clearances: Clearances
  scallop: ScallopLimit | null
  /** null where every holder's own counts. */
  spindleRadiusMm: number | null
  longestStickOutToDiameter: number | null
  gaugeLengthMm: GaugeLengthWindow | null
  /** All 1 where no mask was given. */
  masks: Record<SearchTableName, Uint8Array>
  /** All 0 where none were given. */
  penalties: Record<SearchTableName, Float64Array>
  perCutter: number
  limit: number
  nearMissLimit: number
}

/**
 * A question with gaps filled and what can't be refused.
 *
 * Units      Millimetres and degrees.
 * Errors     CoreInputError as `checkedDemand` and `checkedClearances`; `not-finite`, `not-positive`, `negative`,
 *            `not-whole`, `wrong-length`, `window-crossed`, at the question's own field.
 *
 * @example
 * askedSearch(searchTables({ cutters: [], holders: [], collets: [], extensions: [] }, defaultReachSettings), { feature: { kind: 'wall', depthMm: 0 }, limit: 1, nearMissLimit: 1 }) // => throws not-positive
 */
export function askedSearch(tables: SearchTables, question: SearchQuestion): AskedSearch {
  const feature = askedFeature(question)
  const spindleNoseMm = positiveOrNull(
    question.spindleNoseDiameterMm,
    'spindleNoseDiameterMm',
    'The spindle nose diameter',
  )
  return {
    feature,
    demand: checkedDemand(feature),
    clearances: checkedClearances({ clearances: question.clearances, settings: tables.settings }),
    scallop: question.purpose === 'roughing' ? null : askedScallop(question),
    spindleRadiusMm: spindleNoseMm === null ? null : spindleNoseMm / 2,
    longestStickOutToDiameter: positiveOrNull(
      question.longestStickOutToDiameter,
      'longestStickOutToDiameter',
      'The longest stick-out to diameter',
    ),
    gaugeLengthMm: askedWindow(question),
    masks: eachTable((table) => askedMask(tables, question, table)),
    penalties: eachTable((table) => askedPenalties(tables, question, table)),
    perCutter:
      question.perCutter == null ? Number.POSITIVE_INFINITY : whole(question.perCutter, 'perCutter', 1),
    limit: whole(question.limit, 'limit', 0),
    nearMissLimit: whole(question.nearMissLimit, 'nearMissLimit', 0),
  }
}

function askedScallop({ scallop }: SearchQuestion): ScallopLimit | null {
  if (!scallop) return null
  return {
    stepoverMm: positive(scallop.stepoverMm, 'scallop.stepoverMm', 'The stepover'),
    maximumHeightMm: positive(scallop.maximumHeightMm, 'scallop.maximumHeightMm', 'The scallop height'),
  }
}

function askedWindow({ gaugeLengthMm: window }: SearchQuestion): GaugeLengthWindow | null {
  if (!window) return null
  const shortestMm = notNegative(window.shortestMm, 'gaugeLengthMm.shortestMm', 'The shortest gauge length')
  const longestMm = notNegative(window.longestMm, 'gaugeLengthMm.longestMm', 'The longest gauge length')
  if (shortestMm > longestMm + overlapToleranceMm)
    throw new CoreInputError(
      'window-crossed',
      'gaugeLengthMm',
      'The shortest gauge length is more than the longest: no tool fits this set-up.',
    )
  return { shortestMm, longestMm }
}

function askedMask({ tooling }: SearchTables, { masks }: SearchQuestion, table: SearchTableName): Uint8Array {
  const count = tooling[table].length
  const mask = masks?.[table]
  if (!mask) return new Uint8Array(count).fill(1)
  refuseLength(mask.length, count, `masks.${table}`)
  return mask
}

function askedPenalties(
  { tooling }: SearchTables,
  { penalties: given }: SearchQuestion,
  table: SearchTableName,
): Float64Array {
  const count = tooling[table].length
  const penalties = given?.[table]
  if (!penalties) return new Float64Array(count)
  refuseLength(penalties.length, count, `penalties.${table}`)
  for (let index = 0; index < count; index++)
    notNegative(penalties[index], `penalties.${table}.${index}`, 'The penalty')
  return penalties
}

function refuseLength(given: number, count: number, path: string): void {
  if (given !== count)
    throw new CoreInputError('wrong-length', path, `There must be ${count} entries, one for every record.`)
}

function whole(value: number, path: string, least: number): number {
  if (!Number.isInteger(value) || value < least)
    throw new CoreInputError('not-whole', path, `This must be a whole number, ${least} or more.`)
  return value
}
