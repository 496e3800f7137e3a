import { type AskedSearch, askedSearch } from './asked-search'
import type { WalkFrom } from './assembly-walk'
import { BestList } from './best-list'
import { reportShortfalls } from './cutter-shortfalls'
import { changesOf } from './near-miss-changes'
import { foundMisses, type NearRow } from './near-misses'
import { offersOf } from './offers'
import { otherHolders } from './other-holders'
import { type TipBounds, tipBounds } from './placed-bounds'
import { type ReachingRows, rankedOptions } from './rank-options'
import { RowComparison } from './row-comparison'
import type { SearchTables } from './search-tables'
import { sortedOutRecords } from './sorted-out'
import type { StickOutRule } from './stick-out-rule'
import type { NearMiss, SearchAnswer, SearchQuestion, SortedOut } from './types'

/**
 * Which assemblies a crib could build that reach a feature, best first, and which come nearest.
 *
 * Assumes what the reach check assumes; every verdict, stick-out and compliance is what it answers for the assembly.
 * What the feature or the cutter itself excludes is left out before any pair is formed.
 *
 * Shapes     Every record of the crib once; collets and extensions in everything that takes them.
 * Units      Millimetres, degrees; micrometres per newton.
 * Result     The same question gives the same answer, whatever the order of the crib's records.
 * Errors     CoreInputError as `askedSearch`.
 * Source     The reach check, assembly by assembly, and naive solids: test/reference/search.
 * Tolerance  1e-9 mm, as the reach check's.
 *
 * @example
 * searchReach(searchTables({ cutters: [], holders: [], collets: [], extensions: [] }, defaultReachSettings), { feature: { kind: 'wall', depthMm: 10 }, limit: 5, nearMissLimit: 5 }).options // => []
 */
export function searchReach(tables: SearchTables, question: SearchQuestion): SearchAnswer {
  const asked = askedSearch(tables, question)
  const rule: StickOutRule = {
    stepMm: tables.settings.stickOutStepMm,
    longestToDiameter: asked.longestStickOutToDiameter,
    window: asked.gaugeLengthMm,
  }
  const offers = offersOf(tables, asked)
  const bounds = tipBounds(tables, asked)
  const compared = compareCutters(tables, asked, rule, offers, bounds)
  const fromRow = (row: number): WalkFrom => ({
    tables,
    asked,
    rule,
    row,
    offer: offers(tables.cutters.shankClass[row]!),
    bounds: bounds.of(tables.cutters.tipOf[row]!),
  })
  const { considered, reachable, comparedPairs, sortedOut } = compared
  return {
    options: rankedOptions(tables, asked, compared.reaching, fromRow),
    nearMisses: nearMisses(tables, question, asked, compared.nearest, bounds, fromRow),
    considered,
    reachable,
    comparedPairs,
    sortedOut,
  }
}

/** What would help is tried for the few that are shown. */
function nearMisses(
  tables: SearchTables,
  question: SearchQuestion,
  asked: AskedSearch,
  nearest: readonly NearRow[],
  { placements }: TipBounds,
  fromRow: (row: number) => WalkFrom,
): NearMiss[] {
  const othersOf = otherHolders(tables, asked)
  return foundMisses(tables, question, asked, nearest, placements, fromRow).map((found) => ({
    ...found.miss,
    changes: [...(found.isCutterShort ? [] : othersOf(fromRow(found.row))), ...changesOf(found, asked)],
  }))
}

interface ComparedCutters {
  considered: number
  reachable: number
  comparedPairs: number
  sortedOut: SortedOut
  reaching: ReachingRows
  nearest: NearRow[]
}

/** Goes through the cutters once: sorts out, counts what reaches, keeps what comes nearest. */
function compareCutters(
  tables: SearchTables,
  asked: AskedSearch,
  rule: StickOutRule,
  offers: ReturnType<typeof offersOf>,
  bounds: TipBounds,
): ComparedCutters {
  const { cutters } = tables
  const sortedOut = sortedOutRecords(tables, asked)
  const comparison = new RowComparison(tables, asked, rule)
  const reaching: ReachingRows = { rows: [], floors: [] }
  const nearest = new BestList<NearRow>(
    asked.nearMissLimit,
    (a, b) =>
      a.shortfallMm - b.shortfallMm ||
      tables.idOrder.cutters[cutters.index[a.row]!]! - tables.idOrder.cutters[cutters.index[b.row]!]!,
  )
  let considered = 0
  let reachable = 0
  for (let row = 0; row < cutters.count; row++) {
    if (asked.masks.cutters[cutters.index[row]!] === 0) continue
    const offer = offers(cutters.shankClass[row]!)
    considered += offer.assemblyCount
    const ownMm = ownShortfallMm(tables, asked, bounds, row, sortedOut)
    if (offer.assemblyCount === 0) {
      if (ownMm === 0) sortedOut.shankNotHeld++
      continue
    }
    if (ownMm > 0 && !mayBeNear(nearest, ownMm)) continue
    comparison.begin(row, offer, bounds.of(cutters.tipOf[row]!))
    if (ownMm === 0) {
      const direct = comparison.countDirect()
      const extended = comparison.countExtended()
      reachable += direct + extended
      if (direct + extended > 0) {
        reaching.rows.push(row)
        reaching.floors.push(comparison.rankFloor(direct > 0, extended > 0))
        continue
      }
    }
    if (mayBeNear(nearest, ownMm))
      nearest.offer({ row, shortfallMm: Math.max(ownMm, comparison.leastShortfallMm()) })
  }
  return {
    considered,
    reachable,
    comparedPairs: comparison.pairs,
    sortedOut,
    reaching,
    nearest: nearest.sorted(),
  }
}

function mayBeNear(nearest: BestList<NearRow>, ownMm: number): boolean {
  return (
    nearest.canTakeAny && ownMm < Number.POSITIVE_INFINITY && ownMm <= (nearest.last?.shortfallMm ?? ownMm)
  )
}

/** The most that is short of the cutter itself; 0 where nothing is, Infinity where it is another tool altogether. */
function ownShortfallMm(
  tables: SearchTables,
  asked: AskedSearch,
  { placements }: TipBounds,
  row: number,
  sortedOut: SortedOut,
): number {
  let mostMm = 0
  reportShortfalls(tables, asked, placements[tables.cutters.tipOf[row]!]!, row, (reason, by, shortfallMm) => {
    if (mostMm === 0) sortedOut[reason]++
    mostMm = Math.max(mostMm, by === null ? Number.POSITIVE_INFINITY : shortfallMm)
  })
  return mostMm
}
