import { type SearchTableName, searchTableNames } from './types'

/**
 * Every table's name with a value of its own.
 *
 * @example
 * eachTable((table) => table.length).cutters // => 7
 */
export function eachTable<Value>(of: (table: SearchTableName) => Value): Record<SearchTableName, Value> {
  const [cutters, holders, collets, extensions] = searchTableNames
  return {
    cutters: of(cutters),
    holders: of(holders),
    collets: of(collets),
    extensions: of(extensions),
  }
}
