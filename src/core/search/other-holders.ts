import type { AskedSearch } from './asked-search'
import { type WalkFrom, walkAssemblies, walkedCompliance, walkedStickOutMm } from './assembly-walk'
import { BestList } from './best-list'
import { offersOf } from './offers'
import { compareOptions, optionOf } from './rank-options'
import type { SearchTables } from './search-tables'
import { keepsRule, stickOutLimit } from './stick-out-rule'
import type { SearchChange, SearchOption } from './types'

/**
 * Looks through the whole crib for what the question left out: the best holder without an extension, and the best with
 * one, in which a cutter reaches.
 *
 * Assumes a cutter that reaches in nothing the question lets it be built with, and that is not short itself.
 *
 * Result     A function of a row's walk; without masks on what holds there is nothing more to find.
 *
 * @example
 * otherHolders(searchTables({ cutters: [], holders: [], collets: [], extensions: [] }, defaultReachSettings), { masks: { holders: new Uint8Array(0), collets: new Uint8Array(0), extensions: new Uint8Array(0) } })(null) // => []
 */
export function otherHolders(tables: SearchTables, asked: AskedSearch): (from: WalkFrom) => SearchChange[] {
  const { holders, collets, extensions } = asked.masks
  if (![holders, collets, extensions].some((mask) => mask.includes(0))) return () => []
  const unmasked = unmaskedHolders(asked)
  const offers = offersOf(tables, unmasked)
  return (from) => {
    const offer = offers(tables.cutters.shankClass[from.row]!)
    const { direct, extended } = bestOf({ ...from, asked: unmasked, offer })
    return [
      ...direct.map((option) => ({ kind: 'holder' as const, option })),
      ...extended.map((option) => ({ kind: 'extension' as const, option })),
    ]
  }
}

function unmaskedHolders(asked: AskedSearch): AskedSearch {
  const all = (mask: Uint8Array) => new Uint8Array(mask.length).fill(1)
  const { cutters, holders, collets, extensions } = asked.masks
  return {
    ...asked,
    masks: { cutters, holders: all(holders), collets: all(collets), extensions: all(extensions) },
  }
}

function bestOf(from: WalkFrom): { direct: SearchOption[]; extended: SearchOption[] } {
  const { tables, rule, row } = from
  const compare = (a: SearchOption, b: SearchOption) => compareOptions(tables, a, b)
  const direct = new BestList(1, compare)
  const extended = new BestList(1, compare)
  const limit = stickOutLimit(rule, tables.cutters.diameterMm[row]!)
  walkAssemblies(from, (assembly) => {
    if (!keepsRule(rule, limit, assembly)) return
    const stickOutMm = walkedStickOutMm(from, assembly)
    const complianceUmPerN = walkedCompliance(from, assembly, stickOutMm)
    const list = assembly.extension < 0 ? direct : extended
    list.offer(optionOf(tables, assembly, stickOutMm, complianceUmPerN))
  })
  return { direct: direct.sorted(), extended: extended.sorted() }
}
