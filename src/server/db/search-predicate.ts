import type { Knex } from 'knex'

/**
 * Keeps the rows of a query (which has `items` in it) that match every term of a search. A term is found as a substring
 * of code, maker, part number and description; a term of letters also forgives one letter wrong, missing, extra or
 * swapped in a word of five letters or more. In a term broken by punctuation the pieces may match one by one, as long
 * as one of them has letters to forgive. Digits are never forgiven. The migration of the search explains the indexes.
 */
export function whereMatchesSearch(query: Knex.QueryBuilder, search: string): void {
  for (const term of search.toLowerCase().split(/\s+/).filter(Boolean)) {
    query.where((either) => {
      either.whereLike('items.search_text', `%${escapeLike(term)}%`)
      const pieces = term.match(/[\p{L}\p{N}]+/gu) ?? []
      if (!pieces.some(isForgivable)) return
      either.orWhere((all) => {
        for (const piece of pieces) all.where((one) => wherePieceMatches(one, piece, pieces.length > 1))
      })
    })
  }
}

function wherePieceMatches(query: Knex.QueryBuilder, piece: string, isPart: boolean): void {
  if (isPart) query.whereLike('items.search_text', `%${piece}%`)
  if (isForgivable(piece))
    query.orWhereRaw('items.search_words && (select matching_search_words(?))', [piece])
}

/** A word of five letters may have lost one on the way here. */
function isForgivable(piece: string): boolean {
  return /^\p{L}{4,}$/u.test(piece)
}

function escapeLike(text: string): string {
  return text.replace(/[\\%_]/g, '\\$&')
}
