import { overlapToleranceMm, type ToolPart } from '@/core/outline/types'
import { holderCheckParts } from '@/core/reach/check-parts'
import type { Placement } from '@/core/reach/placement'
import { reachAnswer } from '@/core/reach/reach-answer'
import { clearanceLowerBounds } from '@/core/reach/stick-out-bounds'
import type { LowerBound, ReachAnswer, ReachRequest, StickOutAnswer } from '@/core/reach/types'
import type { AskedSearch } from './asked-search'
import { assemblyRequest } from './assembly-request'
import { type WalkFrom, walkAssemblies, walkedStickOutMm } from './assembly-walk'
import { reportShortfalls } from './cutter-shortfalls'
import { compareParts, optionOf } from './rank-options'
import type { SearchTables } from './search-tables'
import { chosenStickOutMm, outsideWindowMm, stickOutLimit, stickOutShortfallMm } from './stick-out-rule'
import type { NearMiss, SearchOption, SearchQuestion, Shortfall, StoppedBy } from './types'

/** A cutter that reaches in nothing, and the least any of its assemblies is short of. */
export interface NearRow {
  row: number
  shortfallMm: number
}

/** A near miss with what its changes are tried from. */
export interface FoundMiss {
  row: number
  miss: NearMiss
  request: ReachRequest
  /** Something of the cutter itself is short: no holder helps. */
  isCutterShort: boolean
}

/**
 * The nearest assembly of each cutter that reaches in nothing, with all it is short of; changes not yet tried.
 *
 * Assumes the nearest has the least shortfall; among those alike the least of the stick-out's own, then penalty, gauge
 * length and ids decide.
 *
 * Units      Millimetres; micrometres per newton.
 *
 * @example
 * foundMisses(null, null, null, [], [], () => null) // => []
 */
export function foundMisses(
  tables: SearchTables,
  question: SearchQuestion,
  asked: AskedSearch,
  nearest: readonly NearRow[],
  placements: readonly Placement[],
  fromRow: (row: number) => WalkFrom,
): FoundMiss[] {
  return nearest.map(({ row }) => {
    const at = placements[tables.cutters.tipOf[row]!]!
    const ofCutter: Shortfall[] = []
    reportShortfalls(tables, asked, at, row, (_, by, shortfallMm) => {
      if (by !== null) ofCutter.push({ by, shortfallMm })
    })
    const ownMm = Math.max(0, ...ofCutter.map(({ shortfallMm }) => shortfallMm))
    const option = nearestAssembly(fromRow(row), ownMm)
    const request = assemblyRequest(tables, question, option)
    const miss = describedMiss(request, asked, at, option, ofCutter)
    return { row, miss, request, isCutterShort: ofCutter.length > 0 }
  })
}

/** What the nearest is chosen by, ids aside. */
interface Distance {
  shortfallMm: number
  ofStickOutMm: number
  penalty: number
  gaugeLengthMm: number
}

function nearestAssembly(from: WalkFrom, ownMm: number): SearchOption {
  const { tables, rule, row } = from
  const limit = stickOutLimit(rule, tables.cutters.diameterMm[row]!)
  let nearest: { option: SearchOption; distance: Distance } | null = null
  const here: Distance = { shortfallMm: 0, ofStickOutMm: 0, penalty: 0, gaugeLengthMm: 0 }
  walkAssemblies(from, (assembly) => {
    const stickOutMm = walkedStickOutMm(from, assembly)
    here.ofStickOutMm = stickOutShortfallMm(rule, limit, assembly)
    here.shortfallMm = Math.max(ownMm, here.ofStickOutMm)
    here.penalty = assembly.penalty
    here.gaugeLengthMm = assembly.behindMm + stickOutMm
    const order = nearest ? compareDistances(here, nearest.distance) : -1
    if (order > 0) return
    const option = optionOf(tables, assembly, stickOutMm, 0)
    if (order < 0 || !nearest || compareParts(tables, option, nearest.option) < 0)
      nearest = { option, distance: { ...here } }
  })
  return nearest!.option
}

function compareDistances(a: Distance, b: Distance): number {
  return (
    a.shortfallMm - b.shortfallMm ||
    a.ofStickOutMm - b.ofStickOutMm ||
    a.penalty - b.penalty ||
    a.gaugeLengthMm - b.gaugeLengthMm
  )
}

function describedMiss(
  request: ReachRequest,
  asked: AskedSearch,
  at: Placement,
  option: SearchOption,
  ofCutter: readonly Shortfall[],
): NearMiss {
  const { answer, stickOutMm } = answerAtBest(request)
  const part = askingPart(request, asked, at, answer.stickOut.boundBy)
  const gaugeLengthMm = answer.gaugeLengthMm
  const shortfalls = [...ofCutter, ...stickOutShortfalls(request, asked, answer, stickOutMm, part)]
  shortfalls.sort((a, b) => b.shortfallMm - a.shortfallMm)
  const [first] = shortfalls
  return {
    ...option,
    stickOutMm,
    gaugeLengthMm,
    complianceUmPerN: answer.stiffness.complianceUmPerN,
    stoppedBy: first!.by,
    shortfallMm: first!.shortfallMm,
    shortfalls,
    stickOut: {
      neededMm: answer.stickOut.minimumMm,
      maximumMm: answer.stickOut.maximumMm,
      neededBy: answer.stickOut.boundBy,
      maximumBy: answer.stickOut.upperBoundBy,
      part,
    },
    reachMm: answer.reachMm,
    changes: [],
  }
}

/** The answer at the stick-out the assembly would be set to: the least it needs, or the longest it may have. */
function answerAtBest(request: ReachRequest): { answer: ReachAnswer; stickOutMm: number } {
  const answer = reachAnswer(request)
  const { minimumMm, maximumMm, usedMm } = answer.stickOut
  const stickOutMm = chosenStickOutMm(minimumMm, maximumMm, request.settings.stickOutStepMm)
  return {
    answer: stickOutMm === usedMm ? answer : reachAnswer({ ...request, stickOutMm }),
    stickOutMm,
  }
}

function stickOutShortfalls(
  { cutter }: ReachRequest,
  asked: AskedSearch,
  { stickOut, gaugeLengthMm }: ReachAnswer,
  stickOutMm: number,
  part: ToolPart | null,
): Shortfall[] {
  const { longestStickOutToDiameter, gaugeLengthMm: window } = asked
  const rule = { stepMm: 1, longestToDiameter: longestStickOutToDiameter, window }
  const { longestMm } = stickOutLimit(rule, cutter.cuttingDiameterMm)
  const all: Shortfall[] = [
    { by: crossedBy(stickOut, part), shortfallMm: stickOut.minimumMm - stickOut.maximumMm },
    { by: 'stickOutToDiameter', shortfallMm: stickOutMm - longestMm },
    { by: 'gaugeLength', shortfallMm: outsideWindowMm(window, gaugeLengthMm) },
  ]
  return all.filter(({ shortfallMm }) => shortfallMm > overlapToleranceMm)
}

/** What the longest stick-out crosses: the part that asks for more, or the shank there is to hold. */
function crossedBy({ boundBy, upperBoundBy }: StickOutAnswer, part: ToolPart | null): StoppedBy {
  if (boundBy === 'floor') return 'floor'
  if (part) return part
  return boundBy === 'sideLock' || upperBoundBy === 'sideLock' ? 'sideLock' : 'grip'
}

/** The part behind the nose that asks for the stick-out; the lower one where two ask alike. */
function askingPart(
  request: ReachRequest,
  { clearances }: AskedSearch,
  at: Placement,
  boundBy: LowerBound,
): ToolPart | null {
  let most: { part: ToolPart; mm: number } | null = null
  for (const part of holderCheckParts(request.holder, request.extension))
    for (const { by, mm } of clearanceLowerBounds(at, [part], clearances))
      if (by === boundBy && (!most || mm > most.mm)) most = { part: part.part, mm }
  return most?.part ?? null
}
