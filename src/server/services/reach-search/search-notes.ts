import type { Feature } from '@/core/reach/types'
import type { SearchTables } from '@/core/search/search-tables'
import type { SearchAnswer, SearchTableName } from '@/core/search/types'
import { noCutterSentence } from '@/lib/search-sentences'
import type { SearchAnswerResponse, SearchNoteCode, SearchPurpose } from '@/schemas/reach-search'
import { leftToFinishing } from './search-question'

type AskedTables = Pick<SearchTables, 'tooling' | 'refusals'>
type Note = SearchAnswerResponse['notes'][number]

/** What is to be known of an answer as a whole: why nothing reaches, what could not be checked, what is left over. */
export function searchNotes(
  answer: SearchAnswer,
  feature: Feature,
  tables: AskedTables,
  purpose: SearchPurpose | null,
): Note[] {
  const { tooling } = tables
  const note = (code: SearchNoteCode, text: string | null): Note[] => (text === null ? [] : [{ code, text }])
  if (tooling.cutters.length === 0 || tooling.holders.length === 0) {
    const missing = tooling.cutters.length === 0 ? 'cutter' : 'holder'
    return note('crib-empty', `There is no ${missing} in the catalogue yet, so nothing can be built.`)
  }
  return [
    ...(answer.reachable === 0 ? nothingNotes(answer, tables) : []),
    ...note('cutters-not-checked', uncheckedSentence(tables)),
    ...note('left-to-finishing', leftToFinishing(feature, purpose)),
  ]
}

function nothingNotes({ considered, sortedOut, nearMisses }: SearchAnswer, { tooling }: AskedTables): Note[] {
  const isAllMasked =
    sortedOut.cutterMasked === tooling.cutters.length || sortedOut.holderMasked === tooling.holders.length
  if (isAllMasked) {
    const what = sortedOut.cutterMasked === tooling.cutters.length ? 'cutter' : 'holder'
    return [{ code: 'nothing-passes-filters', text: `No ${what} passes what you filter by.` }]
  }
  const why = noCutterSentence(sortedOut)
  const near = nearMisses.length > 0 ? 'What comes nearest is listed below, with what stops it.' : null
  const said = (first: string) => [first, why, near].filter((words) => words !== null).join(' ')
  return considered === 0
    ? [{ code: 'no-cutter-suits', text: said('Nothing could be built for this.') }]
    : [{ code: 'nothing-reaches', text: said('Nothing the crib could build reaches this.') }]
}

const tableWords: Record<SearchTableName, [one: string, many: string]> = {
  cutters: ['cutter', 'cutters'],
  holders: ['holder', 'holders'],
  collets: ['collet', 'collets'],
  extensions: ['extension', 'extensions'],
}

/** Figures that are missing or cannot be keep a tool out; left unsaid, it would seem to be worse than what is listed. */
function uncheckedSentence({ refusals }: AskedTables): string | null {
  const counts = new Map<SearchTableName, Set<number>>()
  for (const { table, index } of refusals) counts.set(table, (counts.get(table) ?? new Set()).add(index))
  const said = [...counts].map(([table, { size }]) => `${size} ${tableWords[table][size === 1 ? 0 : 1]}`)
  if (said.length === 0) return null
  return `Left out, since a figure the check needs is missing or cannot be: ${said.join(', ')}.`
}
