import { overlapToleranceMm } from '@/core/outline/types'
import { reachAnswer } from '@/core/reach/reach-answer'
import type { Feature } from '@/core/reach/types'
import { assemblyRequest } from '@/core/search/assembly-request'
import { searchReach } from '@/core/search/search-reach'
import type { AssemblyParts, SearchOption } from '@/core/search/types'
import type { ReachSearchRequest } from '@/schemas/reach-search'
import type { BuiltAssembly } from '../../db/read-models/built-assemblies'
import type { CribTables } from './crib-tables'
import type { SearchFilters } from './search-filters'
import { assemblyQuestion, searchQuestion } from './search-question'

export interface BuiltOption extends SearchOption {
  built: BuiltAssembly
}

/** A built assembly as the tables have its parts. */
interface PlacedAssembly {
  built: BuiltAssembly
  parts: AssemblyParts
}

/**
 * What stands ready and reaches as it is, at the stick-out it was built with, the stiffest first. Whether a cutter suits
 * the feature at all is asked of the search; where its parts lie does not matter, since they are in the assembly.
 */
export function builtOptions(
  feature: Feature,
  crib: CribTables,
  built: readonly BuiltAssembly[],
  body: ReachSearchRequest,
  filters: SearchFilters,
): BuiltOption[] {
  const offered = placedAssemblies(crib, built).filter(
    ({ parts }) =>
      filters.suits.cutters[parts.cutterIndex] === 1 && filters.suits.holders[parts.holderIndex] === 1,
  )
  if (offered.length === 0) return []
  const suited = suitedCutters(feature, crib, offered, body, filters)
  return offered
    .filter(({ parts }) => suited.has(parts.cutterIndex))
    .flatMap((placed) => standingOption(placed, feature, crib, body, filters) ?? [])
    .toSorted((one, other) => one.complianceUmPerN - other.complianceUmPerN)
}

function placedAssemblies(
  { tables: { tooling }, cutterSources }: CribTables,
  built: readonly BuiltAssembly[],
): PlacedAssembly[] {
  const indexes = (list: readonly { id: string }[]) => new Map(list.map(({ id }, index) => [id, index]))
  const [holders, collets, extensions] = [tooling.holders, tooling.collets, tooling.extensions].map(indexes)
  const ofItems = new Map(
    cutterSources.flatMap(({ itemId, piece }, index) => (piece ? [] : [[itemId, index]])),
  )
  const ofPieces = new Map(cutterSources.flatMap(({ piece }, index) => (piece ? [[piece.id, index]] : [])))
  return built.flatMap((assembly): PlacedAssembly[] => {
    const indexIn = (list: Map<string, number> | undefined, itemId: string | undefined) =>
      itemId === undefined ? null : list?.get(itemId)
    const cutter = assembly.parts.get('cutter')
    const cutterIndex = ofPieces.get(cutter?.pieceId ?? '') ?? ofItems.get(cutter?.itemId ?? '')
    const holderIndex = indexIn(holders, assembly.parts.get('holder')?.itemId)
    const colletIndex = indexIn(collets, assembly.parts.get('collet')?.itemId)
    const extensionIndex = indexIn(extensions, assembly.parts.get('extension')?.itemId)
    const extensionColletIndex = indexIn(collets, assembly.parts.get('extensionCollet')?.itemId)
    if (
      cutterIndex === undefined ||
      holderIndex == null ||
      colletIndex === undefined ||
      extensionIndex === undefined ||
      extensionColletIndex === undefined
    )
      return []
    return [
      {
        built: assembly,
        parts: { cutterIndex, holderIndex, colletIndex, extensionIndex, extensionColletIndex },
      },
    ]
  })
}

/** Those of the built cutters that reach in something: what is short of the rest is not the cutter's form or tip. */
function suitedCutters(
  feature: Feature,
  { tables }: CribTables,
  offered: readonly PlacedAssembly[],
  body: ReachSearchRequest,
  { limits }: SearchFilters,
): Set<number> {
  const cutters = new Uint8Array(tables.tooling.cutters.length)
  for (const { parts } of offered) cutters[parts.cutterIndex] = 1
  const { options } = searchReach(tables, {
    ...searchQuestion(feature, body, { masks: { cutters }, penalties: {}, limits }),
    perCutter: 1,
    limit: offered.length,
    nearMissLimit: 0,
  })
  return new Set(options.map(({ cutterIndex }) => cutterIndex))
}

function standingOption(
  { built, parts }: PlacedAssembly,
  feature: Feature,
  crib: CribTables,
  body: ReachSearchRequest,
  { limits }: SearchFilters,
): BuiltOption | null {
  const mounted = assemblyRequest(crib.tables, assemblyQuestion(feature, body, limits), parts)
  const answer = reachAnswer({ ...mounted, stickOutMm: built.stickOutMm })
  const { gaugeLengthMm } = limits
  const longest = body.where?.longestStickOutToDiameter
  const holds =
    answer.verdict === 'reaches' &&
    (longest == null || answer.stiffness.stickOutToDiameter <= longest + overlapToleranceMm) &&
    (gaugeLengthMm === null ||
      (answer.gaugeLengthMm >= gaugeLengthMm.shortestMm - overlapToleranceMm &&
        answer.gaugeLengthMm <= gaugeLengthMm.longestMm + overlapToleranceMm))
  if (!holds) return null
  return {
    ...parts,
    built,
    stickOutMm: built.stickOutMm,
    gaugeLengthMm: answer.gaugeLengthMm,
    complianceUmPerN: answer.stiffness.complianceUmPerN,
    penalty: 0,
  }
}
