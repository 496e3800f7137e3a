import type { AskedSearch } from './asked-search'
import {
  type WalkedAssembly,
  type WalkFrom,
  walkAssemblies,
  walkedCompliance,
  walkedStickOutMm,
} from './assembly-walk'
import { BestList } from './best-list'
import type { Takers } from './offers'
import { complianceOf, cutterCompliance, type RankFloor } from './row-comparison'
import type { SearchTables } from './search-tables'
import { chosenStickOutMm, keepsRule, largestLowerMm, stickOutLimit } from './stick-out-rule'
import type { AssemblyParts, SearchOption } from './types'

/** Cutters that reach in something, and the floor under the rank of each one's best. */
export interface ReachingRows {
  rows: number[]
  floors: RankFloor[]
}

/** A floor is worked out another way than what it stands under; this much of it may be rounding. */
const floorShare = 1 - 1e-9

/**
 * The best options of all: penalty, then compliance, then ids. Cutters are taken by the floor under their best, and no
 * further than the last option that is kept.
 *
 * Units      Millimetres; micrometres per newton.
 *
 * @example
 * rankedOptions({ cutters: { count: 0 } }, { limit: 5 }, { rows: [], floors: [] }, () => null) // => []
 */
export function rankedOptions(
  tables: SearchTables,
  asked: AskedSearch,
  { rows, floors }: ReachingRows,
  fromRow: (row: number) => WalkFrom,
): SearchOption[] {
  const compare = (a: SearchOption, b: SearchOption) => compareOptions(tables, a, b)
  const best = new BestList<SearchOption>(asked.limit, compare)
  if (!best.canTakeAny) return []
  for (const place of byFloor(floors)) {
    const { penalty, complianceUmPerN } = floors[place]!
    if (!canEnter(best.last, penalty, complianceUmPerN * floorShare)) break
    const ofCutter =
      asked.perCutter < asked.limit ? new BestList<SearchOption>(asked.perCutter, compare) : best
    offerOptions(
      fromRow(rows[place]!),
      (penalty, complianceUmPerN) => {
        return (
          canEnter(best.last, penalty, complianceUmPerN) && canEnter(ofCutter.last, penalty, complianceUmPerN)
        )
      },
      (option) => ofCutter.offer(option),
    )
    if (ofCutter !== best) for (const option of ofCutter.sorted()) best.offer(option)
  }
  return best.sorted()
}

function canEnter(last: SearchOption | null, penalty: number, complianceUmPerN: number): boolean {
  if (!last || penalty < last.penalty) return true
  return penalty === last.penalty && complianceUmPerN <= last.complianceUmPerN
}

/** Places in order of their floors, a few at a time: only the first are ever needed. */
function* byFloor(floors: readonly RankFloor[]): Generator<number> {
  const order = Array.from(floors, (_, place) => place)
  order.sort((a, b) => compareFloors(floors[a]!, floors[b]!))
  yield* order
}

function compareFloors(a: RankFloor, b: RankFloor): number {
  return a.penalty - b.penalty || a.complianceUmPerN - b.complianceUmPerN
}

/** Offers every assembly of one cutter that reaches and that may still enter. */
function offerOptions(
  from: WalkFrom,
  mayEnter: (penalty: number, complianceUmPerN: number) => boolean,
  offer: (option: SearchOption) => void,
): void {
  const { tables, rule, row } = from
  const limit = stickOutLimit(rule, tables.cutters.diameterMm[row]!)
  const visit = (assembly: WalkedAssembly) => {
    if (!keepsRule(rule, limit, assembly)) return
    const stickOutMm = walkedStickOutMm(from, assembly)
    const complianceUmPerN = walkedCompliance(from, assembly, stickOutMm)
    if (!mayEnter(assembly.penalty, complianceUmPerN)) return
    offer(optionOf(tables, assembly, stickOutMm, complianceUmPerN))
  }
  const wantsStack = (assembly: WalkedAssembly, takers: Takers, lowestMm: number) => {
    const { upperMm, extension, penalty } = assembly
    if (takers.count === 0 || lowestMm > largestLowerMm(limit, upperMm)) return false
    const stickOutMm = chosenStickOutMm(lowestMm, upperMm, rule.stepMm)
    const outline = tables.extensions.outlineOf[extension]!
    const holderNoseMm = stickOutMm + tables.extensions.lengthMm[outline]!
    const floor = cutterCompliance(tables, row, stickOutMm) + complianceOf(takers.least, holderNoseMm)
    return mayEnter(penalty + takers.leastPenalty, floor * floorShare)
  }
  walkAssemblies(from, visit, wantsStack)
}

/**
 * An assembly on a walk as an option.
 *
 * Units      Millimetres; micrometres per newton.
 *
 * @example
 * optionOf({ cutters: { index: [4] } }, { row: 0, holder: 2, collet: -1, behindMm: 100 }, 30, 1.5).gaugeLengthMm // => 130
 */
export function optionOf(
  { cutters }: SearchTables,
  assembly: WalkedAssembly,
  stickOutMm: number,
  complianceUmPerN: number,
): SearchOption {
  return {
    cutterIndex: cutters.index[assembly.row]!,
    holderIndex: assembly.holder,
    colletIndex: indexOrNull(assembly.collet),
    extensionIndex: indexOrNull(assembly.extension),
    extensionColletIndex: indexOrNull(assembly.extensionCollet),
    stickOutMm,
    gaugeLengthMm: assembly.behindMm + stickOutMm,
    complianceUmPerN,
    penalty: assembly.penalty,
  }
}

const indexOrNull = (index: number): number | null => (index < 0 ? null : index)

/**
 * The order of options: penalty, compliance, then the ids of cutter, holder, collet, extension; none before any.
 *
 * @example
 * compareOptions(null, { penalty: 0, complianceUmPerN: 1 }, { penalty: 0, complianceUmPerN: 2 }) // => -1
 */
export function compareOptions(tables: SearchTables, a: SearchOption, b: SearchOption): number {
  return a.penalty - b.penalty || a.complianceUmPerN - b.complianceUmPerN || compareParts(tables, a, b)
}

/**
 * The order of assemblies by the ids of cutter, holder, collet, extension; none before any.
 *
 * Result     0 only for the same assembly.
 *
 * @example
 * compareParts({ idOrder: { cutters: [1, 0], holders: [0] } }, { cutterIndex: 0, holderIndex: 0 }, { cutterIndex: 1, holderIndex: 0 }) // => 1
 */
export function compareParts({ idOrder }: SearchTables, a: AssemblyParts, b: AssemblyParts): number {
  const place = (order: Int32Array, index: number | null) => (index === null ? -1 : order[index]!)
  return (
    place(idOrder.cutters, a.cutterIndex) - place(idOrder.cutters, b.cutterIndex) ||
    place(idOrder.holders, a.holderIndex) - place(idOrder.holders, b.holderIndex) ||
    place(idOrder.collets, a.colletIndex) - place(idOrder.collets, b.colletIndex) ||
    place(idOrder.extensions, a.extensionIndex) - place(idOrder.extensions, b.extensionIndex)
  )
}
