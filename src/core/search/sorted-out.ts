import type { AskedSearch } from './asked-search'
import type { SearchTables } from './search-tables'
import { type SearchTableName, type SortedOut, sortedOutReasons } from './types'

/**
 * Counts the records that are left out whatever the feature: masked, refused, a bore nobody knows.
 *
 * Result     Every reason, those of the cutters and the feature at 0.
 *
 * @example
 * sortedOutRecords(searchTables({ cutters: [], holders: [], collets: [], extensions: [] }, defaultReachSettings), { masks: { holders: new Uint8Array(0) } }).opening // => 0
 */
export function sortedOutRecords(tables: SearchTables, asked: AskedSearch): SortedOut {
  const counts = Object.fromEntries(sortedOutReasons.map((reason) => [reason, 0])) as SortedOut
  const { tooling } = tables
  const count = (table: SearchTableName, one: 'cutter' | 'holder' | 'collet' | 'extension') =>
    tooling[table].forEach((_, index) => {
      if (asked.masks[table][index] === 0) counts[`${one}Masked`]++
      else if (tables.isAccepted[table][index] === 0) counts[`${one}Refused`]++
      else if ((one === 'holder' || one === 'extension') && !tooling[`${one}s`][index]?.bore)
        counts[`${one}BoreUnknown`]++
    })
  count('cutters', 'cutter')
  count('holders', 'holder')
  count('collets', 'collet')
  count('extensions', 'extension')
  return counts
}
