import type { AskedSearch } from './asked-search'
import { type BodyTable, type LeastCompliance, leastCompliance } from './body-table'
import { type ClampTable, maskedClamps } from './clamp-table'
import type { SearchTables } from './search-tables'

/** Ways to clamp a shank that the question lets be used. */
export interface OfferedClamps extends ClampTable {
  leastPenalty: number
}

/** The holders that take an extension, each with the collet that holds it, -1 where none is needed. */
export interface Takers {
  count: number
  holder: Int32Array
  collet: Int32Array
  /** Distinct outlines and how many takers have each. */
  outline: Int32Array
  outlineSize: Int32Array
  leastPenalty: number
  least: LeastCompliance
}

/** What the question lets hold one class of shanks. */
export interface ClassOffer {
  direct: OfferedClamps
  extended: OfferedClamps
  /** Of each of `extended`. */
  takers: Takers[]
  /** Assemblies of one cutter of this class. */
  assemblyCount: number
}

/**
 * What of the crib the question lets be used, worked out a class of shanks at a time, when it is first asked.
 *
 * @example
 * offersOf(searchTables({ cutters: [], holders: [], collets: [], extensions: [] }, defaultReachSettings), { masks: { holders: new Uint8Array(0) } }).length // => 1
 */
export function offersOf(tables: SearchTables, asked: AskedSearch): (shankClass: number) => ClassOffer {
  const known = new Map<number, ClassOffer>()
  const takersOf = takersAsker(tables, asked)
  return (shankClass) => {
    const found = known.get(shankClass)
    if (found) return found
    const direct = offeredClamps(tables.inHolders[shankClass]!, tables.holders, asked, 'holders')
    const extended = offeredClamps(tables.inExtensions[shankClass]!, tables.extensions, asked, 'extensions')
    const takers = Array.from(extended.owner, (extension) => takersOf(tables.extensionClass[extension]!))
    const stacks = takers.reduce((sum, { count }) => sum + count, 0)
    const offer = { direct, extended, takers, assemblyCount: direct.count + stacks }
    known.set(shankClass, offer)
    return offer
  }
}

function offeredClamps(
  clamps: ClampTable,
  bodies: BodyTable,
  { masks, penalties }: AskedSearch,
  table: 'holders' | 'extensions',
): OfferedClamps {
  const offered = maskedClamps(clamps, bodies, masks[table], masks.collets)
  let leastPenalty = Number.POSITIVE_INFINITY
  for (let clamp = 0; clamp < offered.count; clamp++) {
    const collet = offered.collet[clamp]!
    const penalty = penalties[table][offered.owner[clamp]!]! + (collet >= 0 ? penalties.collets[collet]! : 0)
    if (penalty < leastPenalty) leastPenalty = penalty
  }
  return { ...offered, leastPenalty }
}

/** Takers of an extension by the class of its shank; -1: of one whose shank is not known. */
function takersAsker(tables: SearchTables, asked: AskedSearch): (extensionClass: number) => Takers {
  const known = new Map<number, Takers>()
  return (extensionClass) => {
    const found = known.get(extensionClass)
    if (found) return found
    const collets =
      extensionClass < 0 ? anyHolder(tables, asked) : holdersOfClass(tables, asked, extensionClass)
    const takers = packTakers(tables, asked, collets)
    known.set(extensionClass, takers)
    return takers
  }
}

/** Every holder that is offered at all: what holds the extension in it is not checked. */
function anyHolder({ tooling, holders }: SearchTables, { masks }: AskedSearch): Map<number, number> {
  const collets = new Map<number, number>()
  for (const [holder, { bore }] of tooling.holders.entries())
    if (bore && masks.holders[holder] !== 0 && holders.outlineOf[holder]! >= 0) collets.set(holder, -1)
  return collets
}

/** Holders whose bore takes the extension, each with the collet that costs it the least rank, by id where alike. */
function holdersOfClass(
  { holdingExtension, holders, idOrder }: SearchTables,
  { masks, penalties }: AskedSearch,
  extensionClass: number,
): Map<number, number> {
  const collets = new Map<number, number>()
  for (const { owner, collet } of holdingExtension[extensionClass]!) {
    if (masks.holders[owner] === 0 || holders.outlineOf[owner]! < 0) continue
    if (collet >= 0 && masks.collets[collet] === 0) continue
    const best = collets.get(owner)
    const isBetter =
      best === undefined ||
      penalties.collets[collet]! < penalties.collets[best]! ||
      (penalties.collets[collet] === penalties.collets[best] &&
        idOrder.collets[collet]! < idOrder.collets[best]!)
    if (isBetter) collets.set(owner, collet)
  }
  return collets
}

function packTakers(
  { holders }: SearchTables,
  { penalties }: AskedSearch,
  collets: Map<number, number>,
): Takers {
  const sizes = new Map<number, number>()
  let leastPenalty = Number.POSITIVE_INFINITY
  for (const [holder, collet] of collets) {
    const outline = holders.outlineOf[holder]!
    sizes.set(outline, (sizes.get(outline) ?? 0) + 1)
    const ofCollet = collet >= 0 ? penalties.collets[collet]! : 0
    leastPenalty = Math.min(leastPenalty, penalties.holders[holder]! + ofCollet)
  }
  // Those that will ask alike side by side: of one length, the slimmest nose first.
  const outline = Int32Array.from(sizes.keys()).sort(
    (a, b) =>
      holders.lengthMm[a]! - holders.lengthMm[b]! || holders.noseRadiusMm[a]! - holders.noseRadiusMm[b]!,
  )
  return {
    count: collets.size,
    holder: Int32Array.from(collets.keys()),
    collet: Int32Array.from(collets.values()),
    outline,
    outlineSize: Int32Array.from(outline, (one) => sizes.get(one) ?? 0),
    leastPenalty,
    least: leastCompliance(holders, outline),
  }
}
