import { CoreInputError } from '@/core/core-input-error'
import { can } from '@/core/policies/permissions'
import { searchReach } from '@/core/search/search-reach'
import type { AssemblyParts, SearchAnswer } from '@/core/search/types'
import { AppError } from '@/lib/app-error'
import type { ReachSearchRequest, SearchAnswerResponse } from '@/schemas/reach-search'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { readBuiltAssemblies } from '../../db/read-models/built-assemblies'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { builtOptions } from './built-options'
import { cribTables } from './crib-tables'
import { inTurns } from './in-turns'
import { listedAnswer } from './listed-answer'
import { readPartRows } from './named-parts'
import { searchFilters } from './search-filters'
import { searchQuestion } from './search-question'
import { searchedCut } from './searched-cut'

export interface SearchResult {
  results: SearchAnswerResponse[]
  considered: number
  reachable: number
  computedInMs: number
}

/**
 * Every assembly the crib could build, searched for one feature or for many. Whoever goes away stops it: between two
 * features it looks whether someone still waits, and lets others be answered.
 */
export async function searchTools(
  actor: Actor,
  body: ReachSearchRequest,
  signal: AbortSignal,
): Promise<SearchResult> {
  refuseHiddenCosts(actor, body)
  const startedAt = performance.now()
  const crib = await cribTables()
  const filters = await searchFilters(crib, body)
  const features = body.features ?? (body.feature ? [body.feature] : [])
  const built = body.rankBy === 'built' ? await readBuiltAssemblies(db()) : []
  const answered = await inTurns(features, signal, (feature, index) => ({
    feature,
    ready: refusedAt(featurePath(body, index), () => builtOptions(feature, crib, built, body, filters)),
    answer: refusedAt(featurePath(body, index), () =>
      searchReach(crib.tables, searchQuestion(feature, body, filters)),
    ),
  }))
  const { currency, cutting } = await readShopSettings(db())
  const named = answered.flatMap(({ ready, answer }) => [...ready, ...namedAssemblies(answer)])
  const cut = await searchedCut(body.cut)
  const rows = await readPartRows(actor, crib, named, body.where?.cribId ?? null)
  const { piecePlaces, limits, speeds } = filters
  const context = { actor, crib, rows, piecePlaces, limits, speeds, body, currency, cutting, cut }
  const results = await inTurns(answered, signal, ({ ready, answer, feature }) =>
    listedAnswer(ready, answer, feature, context),
  )
  return {
    results,
    considered: results.reduce((sum, { considered }) => sum + considered, 0),
    reachable: results.reduce((sum, { reachable }) => sum + reachable, 0),
    computedInMs: performance.now() - startedAt,
  }
}

/** Every assembly an answer names, those of its changes too. */
function namedAssemblies({ options, nearMisses }: SearchAnswer): AssemblyParts[] {
  const changed = nearMisses.flatMap(({ changes }) =>
    changes.flatMap((change) => ('option' in change ? change.option : [])),
  )
  return [...options, ...nearMisses, ...changed]
}

/** Ranking by a cost tells the cost. */
function refuseHiddenCosts(actor: Actor, { rankBy }: ReachSearchRequest): void {
  if (rankBy !== 'cost' || can(actor.role, 'seeCosts')) return
  throw new AppError('not-allowed', 'Your role does not see costs, so nothing is ranked by them.', {
    errors: [{ path: 'rankBy', message: 'Your role does not see costs.' }],
  })
}

function featurePath(body: ReachSearchRequest, index: number): string {
  return body.features ? `features.${index}` : 'feature'
}

/** What the core refuses of a feature is said at that feature. */
function refusedAt<Answer>(path: string, compute: () => Answer): Answer {
  try {
    return compute()
  } catch (error) {
    if (!(error instanceof CoreInputError)) throw error
    const place = error.path.replace(/^feature/, path)
    throw new AppError('impossible', error.message, { errors: [{ path: place, message: error.message }] })
  }
}
