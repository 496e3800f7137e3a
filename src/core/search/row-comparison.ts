import type { AskedSearch } from './asked-search'
import type { LeastCompliance } from './body-table'
import type { ClassOffer, Takers } from './offers'
import type { PlacedBounds } from './placed-bounds'
import type { SearchTables } from './search-tables'
import {
  chosenStickOutMm,
  largestLowerMm,
  outsideWindowMm,
  type StickOutLimit,
  type StickOutRule,
  stickOutLimit,
  stickOutShortfallMm,
} from './stick-out-rule'

/** A floor under the rank of a cutter's best assembly. */
export interface RankFloor {
  penalty: number
  complianceUmPerN: number
}

/** What the takers of an extension ask at one placement; neighbours that ask alike and are of one length together. */
interface TakerAsks {
  leastMm: number
  mostMm: number
  count: number
  askMm: Float64Array
  lengthMm: Float64Array
  size: Int32Array
}

/**
 * Compares one cutter at a time with everything that holds it, in three numbers an assembly: what the holder asks, what
 * the cutter asks, what the grip leaves. Cutters come in the order of the table, so that what those alike share, the
 * bounds and what each group of clamps asks, is gathered once.
 */
export class RowComparison {
  /** Comparisons made so far. */
  pairs = 0
  private offer: ClassOffer | null = null
  private bounds: PlacedBounds | null = null
  /** What each group of direct clamps asks, and the least of them. */
  private asks = new Float64Array(0)
  private leastAskMm = 0
  /** Of each kind of extension, and of each of the offer's, at these bounds. */
  private takersAsk = new Map<Takers, TakerAsks>()
  private takerAsks: TakerAsks[] = []
  private row = 0
  private limit: StickOutLimit = { longestMm: 0, longestLowerMm: 0 }

  constructor(
    private readonly tables: SearchTables,
    private readonly asked: AskedSearch,
    private readonly rule: StickOutRule,
  ) {}

  begin(row: number, offer: ClassOffer, bounds: PlacedBounds): void {
    this.row = row
    this.limit = stickOutLimit(this.rule, this.tables.cutters.diameterMm[row]!)
    if (this.offer === offer && this.bounds === bounds) return
    if (this.bounds !== bounds) this.takersAsk.clear()
    this.offer = offer
    this.bounds = bounds
    this.takerAsks = offer.takers.map((takers) => this.askOf(takers, bounds))
    const { outline, count } = offer.direct.groups
    if (this.asks.length < count) this.asks = new Float64Array(count)
    this.leastAskMm = Number.POSITIVE_INFINITY
    for (let group = 0; group < count; group++) {
      const askMm = bounds.holders[outline[group]!]!
      this.asks[group] = askMm
      if (askMm < this.leastAskMm) this.leastAskMm = askMm
    }
  }

  private askOf(takers: Takers, bounds: PlacedBounds): TakerAsks {
    const known = this.takersAsk.get(takers)
    if (known) return known
    const asks = takerAsks(takers, bounds.holders, this.tables.holders.lengthMm)
    this.takersAsk.set(takers, asks)
    return asks
  }

  /** Assemblies of the cutter without an extension that reach. */
  countDirect(): number {
    const { groups } = this.offer!.direct
    const { cutters, holders } = this.tables
    const overallMm = cutters.overallMm[this.row]!
    const fullShankMm = cutters.fullShankMm[this.row]!
    const { window } = this.rule
    let reaching = 0
    for (let group = 0; group < groups.count; group++) {
      const upperMm = overallMm - groups.leastInMm[group]!
      const lowerMm = Math.max(fullShankMm, overallMm - groups.mostInMm[group]!, this.asks[group]!)
      if (lowerMm > largestLowerMm(this.limit, upperMm)) continue
      if (window) {
        const stickOutMm = chosenStickOutMm(lowerMm, upperMm, this.rule.stepMm)
        const behindMm = holders.lengthMm[groups.outline[group]!]!
        if (outsideWindowMm(window, behindMm + stickOutMm) > 0) continue
      }
      reaching += groups.size[group]!
    }
    this.pairs += groups.count
    return reaching
  }

  /** Assemblies of the cutter in an extension that reach. */
  countExtended(): number {
    const { extended } = this.offer!
    let reaching = 0
    for (let clamp = 0; clamp < extended.count; clamp++) reaching += this.countStacks(clamp)
    this.pairs += extended.count
    return reaching
  }

  private countStacks(clamp: number): number {
    const { takers, extended } = this.offer!
    const { extensions } = this.tables
    const { count } = takers[clamp]!
    const ofExtension = extended.outline[clamp]!
    const projectionMm = extensions.lengthMm[ofExtension]!
    const upperMm = this.upperIn(clamp)
    const lowestMm = this.lowestIn(clamp)
    const largestMm = largestLowerMm(this.limit, upperMm)
    const { window } = this.rule
    const ask = this.takerAsks[clamp]!
    if (lowestMm > largestMm || ask.leastMm - projectionMm > largestMm) return 0
    if (!window && ask.mostMm - projectionMm <= largestMm) return count
    let reaching = 0
    for (let one = 0; one < ask.count; one++) {
      const askMm = ask.askMm[one]! - projectionMm
      if (askMm > largestMm) continue
      if (window) {
        const stickOutMm = chosenStickOutMm(Math.max(lowestMm, askMm), upperMm, this.rule.stepMm)
        const behindMm = ask.lengthMm[one]! + projectionMm
        if (outsideWindowMm(window, behindMm + stickOutMm) > 0) continue
      }
      reaching += ask.size[one]!
    }
    this.pairs += ask.count
    return reaching
  }

  /** The least shortfall of any assembly of the cutter in its stick-out's rules. */
  leastShortfallMm(): number {
    const { direct, extended } = this.offer!
    let leastMm = Number.POSITIVE_INFINITY
    for (let group = 0; group < direct.groups.count; group++) {
      const { outline, leastInMm, mostInMm } = direct.groups
      const overallMm = this.tables.cutters.overallMm[this.row]!
      const fullShankMm = this.tables.cutters.fullShankMm[this.row]!
      const shortMm = stickOutShortfallMm(this.rule, this.limit, {
        lowerMm: Math.max(fullShankMm, overallMm - mostInMm[group]!, this.asks[group]!),
        upperMm: overallMm - leastInMm[group]!,
        behindMm: this.tables.holders.lengthMm[outline[group]!]!,
      })
      leastMm = Math.min(leastMm, shortMm)
    }
    this.pairs += direct.groups.count
    for (let clamp = 0; clamp < extended.count; clamp++)
      leastMm = Math.min(leastMm, this.leastStackShortfallMm(clamp))
    return leastMm
  }

  private leastStackShortfallMm(clamp: number): number {
    const { extended } = this.offer!
    const projectionMm = this.tables.extensions.lengthMm[extended.outline[clamp]!]!
    const upperMm = this.upperIn(clamp)
    const lowestMm = this.lowestIn(clamp)
    const ask = this.takerAsks[clamp]!
    // Without a window a holder that asks for less is never further off.
    const count = this.rule.window ? ask.count : Math.min(1, ask.count)
    let leastMm = Number.POSITIVE_INFINITY
    for (let one = 0; one < count; one++) {
      const askMm = this.rule.window ? ask.askMm[one]! : ask.leastMm
      const shortMm = stickOutShortfallMm(this.rule, this.limit, {
        lowerMm: Math.max(lowestMm, askMm - projectionMm),
        upperMm,
        behindMm: ask.lengthMm[one]! + projectionMm,
      })
      leastMm = Math.min(leastMm, shortMm)
    }
    this.pairs += count
    return leastMm
  }

  /** The longest stick-out in an extension. */
  private upperIn(clamp: number): number {
    return this.tables.cutters.overallMm[this.row]! - this.offer!.extended.leastInMm[clamp]!
  }

  /** The shortest stick-out in an extension, the holder behind it left aside. */
  private lowestIn(clamp: number): number {
    const { extended } = this.offer!
    const { cutters } = this.tables
    return Math.max(
      cutters.fullShankMm[this.row]!,
      cutters.overallMm[this.row]! - extended.mostInMm[clamp]!,
      this.bounds!.extensions[extended.outline[clamp]!]!,
    )
  }

  /** No assembly of the cutter ranks before this; of each kind where it has one that reaches. */
  rankFloor(hasDirect: boolean, hasExtended: boolean): RankFloor {
    const floor = { penalty: Number.POSITIVE_INFINITY, complianceUmPerN: Number.POSITIVE_INFINITY }
    const { direct } = this.offer!
    if (hasDirect) {
      const stickOutMm = Math.max(this.shortestMm(direct.mostInAnyMm), this.leastAskMm)
      floor.penalty = direct.leastPenalty
      floor.complianceUmPerN =
        cutterCompliance(this.tables, this.row, stickOutMm) + complianceOf(direct.least, stickOutMm)
    }
    if (hasExtended) {
      const stack = this.stackFloor()
      floor.penalty = Math.min(floor.penalty, stack.penalty)
      floor.complianceUmPerN = Math.min(floor.complianceUmPerN, stack.complianceUmPerN)
    }
    floor.penalty += this.asked.penalties.cutters[this.tables.cutters.index[this.row]!]!
    return floor
  }

  private stackFloor(): RankFloor {
    const { extended, takers } = this.offer!
    const stickOutMm = this.shortestMm(extended.mostInAnyMm)
    let penalty = Number.POSITIVE_INFINITY
    let ofHolder = Number.POSITIVE_INFINITY
    for (const { leastPenalty, least, count } of takers)
      if (count > 0) {
        penalty = Math.min(penalty, leastPenalty)
        ofHolder = Math.min(ofHolder, complianceOf(least, stickOutMm))
      }
    const complianceUmPerN =
      cutterCompliance(this.tables, this.row, stickOutMm) +
      complianceOf(extended.least, stickOutMm) +
      ofHolder
    return { penalty: penalty + extended.leastPenalty, complianceUmPerN }
  }

  private shortestMm(mostInAnyMm: number): number {
    const { cutters } = this.tables
    return Math.max(cutters.fullShankMm[this.row]!, cutters.overallMm[this.row]! - mostInAnyMm)
  }
}

function takerAsks({ outline, outlineSize }: Takers, bounds: Float64Array, lengths: Float64Array): TakerAsks {
  const askMm = new Float64Array(outline.length)
  const lengthMm = new Float64Array(outline.length)
  const size = new Int32Array(outline.length)
  let last = -1
  let leastMm = Number.POSITIVE_INFINITY
  let mostMm = Number.NEGATIVE_INFINITY
  for (let one = 0; one < outline.length; one++) {
    const ask = bounds[outline[one]!]!
    const length = lengths[outline[one]!]!
    if (last < 0 || ask !== askMm[last] || length !== lengthMm[last]) {
      last++
      askMm[last] = ask
      lengthMm[last] = length
      if (ask < leastMm) leastMm = ask
      if (ask > mostMm) mostMm = ask
    }
    size[last] = size[last]! + outlineSize[one]!
  }
  return { leastMm, mostMm, count: last + 1, askMm, lengthMm, size }
}

/**
 * Compliance of a row's cutter alone at a stick-out.
 *
 * Assumes the stick-out leaves only full shank behind the nose.
 *
 * Units      Millimetres; micrometres per newton.
 *
 * @example
 * cutterCompliance({ cutters: { fullShankMm: [10], compliance: [1], compliancePerCubicMm: [0.001] } }, 0, 20) // => 8
 */
export function cutterCompliance({ cutters }: SearchTables, row: number, stickOutMm: number): number {
  const fullShankMm = cutters.fullShankMm[row]!
  return cutters.compliance[row]! + cutters.compliancePerCubicMm[row]! * (stickOutMm ** 3 - fullShankMm ** 3)
}

/**
 * What a body with its nose so far from the tip adds.
 *
 * Units      Millimetres; micrometres per newton.
 *
 * @example
 * complianceOf({ constant: 1, linear: 2, quadratic: 3 }, 10) // => 321
 */
export function complianceOf({ constant, linear, quadratic }: LeastCompliance, noseMm: number): number {
  return constant + noseMm * (linear + noseMm * quadratic)
}
