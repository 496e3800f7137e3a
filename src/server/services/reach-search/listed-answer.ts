import type { Feature } from '@/core/reach/types'
import type { SearchAnswer, SearchChange, SearchOption } from '@/core/search/types'
import {
  changeSentence,
  nearMissSentence,
  type RankedOption,
  type RankingContext,
  rankSentence,
} from '@/lib/search-sentences'
import {
  type SearchAnswerResponse,
  type SearchNearMissResponse,
  type SearchOptionResponse,
  searchLimits,
} from '@/schemas/reach-search'
import type { BuiltOption } from './built-options'
import {
  type ListedAssembly,
  type ListingContext,
  listedAssembly,
  missingPartWords,
  namesOf,
} from './listed-assembly'
import { searchNotes } from './search-notes'

/** The answer of one feature as it is sent: every assembly with its rows, its check and its reason. */
export function listedAnswer(
  ready: readonly BuiltOption[],
  answer: SearchAnswer,
  feature: Feature,
  context: ListingContext,
): SearchAnswerResponse {
  return {
    options: listedOptions(ready, answer, feature, context),
    nearMisses: listedNearMisses(answer, feature, context),
    considered: answer.considered,
    reachable: answer.reachable,
    notes: searchNotes(answer, feature, context.crib.tables, context.body.purpose ?? null),
  }
}

/** The options in their order, what stands ready before the rest, each with the reason it stands there. */
function listedOptions(
  ready: readonly BuiltOption[],
  answer: SearchAnswer,
  feature: Feature,
  context: ListingContext,
): SearchOptionResponse[] {
  const { rankBy, sentenceUnit } = context.body
  const options: readonly (SearchOption & Partial<BuiltOption>)[] = [...ready, ...answer.options]
  const listed = options
    .flatMap((option) => {
      const assembly = listedAssembly(option, feature, context)
      return assembly ? [{ assembly, builtAs: option.built ? builtAs(option.built) : null }] : []
    })
    .slice(0, searchLimits(context.body).limit)
  const ranked = listed.map(({ assembly, builtAs }) => rankedOption(assembly, builtAs))
  const [first] = ranked
  if (!first) return []
  const ranking: RankingContext = {
    rankBy,
    first,
    reachable: answer.reachable,
    currency: context.currency,
    unit: sentenceUnit,
  }
  const stiffest = Math.min(...ranked.map(({ complianceUmPerN }) => complianceUmPerN))
  return listed.map(({ assembly, builtAs }, index) => ({
    ...withRatio(assembly, stiffest),
    // The same parts may stand ready, and be listed as what could be built anew.
    key: builtAs === null ? assembly.key : `${assembly.key}.${builtAs.number}`,
    reason: rankSentence(ranked[index] ?? first, ranking),
    builtAs,
  }))
}

function builtAs({ id, number, place }: BuiltOption['built']): NonNullable<SearchOptionResponse['builtAs']> {
  return { id, number, place }
}

function rankedOption(assembly: ListedAssembly, builtAs: SearchOptionResponse['builtAs']): RankedOption {
  const { cutter, stiffness, stickOut, reach, extension, cost } = assembly
  return {
    complianceUmPerN: stiffness.complianceUmPerN,
    stickOutMm: stickOut.usedMm,
    gaugeLengthMm: reach.gaugeLengthMm,
    cuttingDiameterMm: cutter.cuttingDiameterMm,
    substrate: cutter.substrate,
    hasExtension: extension !== null,
    missingParts: missingPartWords(assembly),
    cost: cost?.amount,
    builtAs,
  }
}

function withRatio(assembly: ListedAssembly, stiffest: number): ListedAssembly {
  const { stiffness } = assembly
  return { ...assembly, stiffness: { ...stiffness, timesStiffest: stiffness.complianceUmPerN / stiffest } }
}

/** What falls short, nearest first, with what stops it and what would help. */
function listedNearMisses(
  answer: SearchAnswer,
  feature: Feature,
  context: ListingContext,
): SearchNearMissResponse[] {
  const { sentenceUnit } = context.body
  return answer.nearMisses.flatMap((miss) => {
    const assembly = listedAssembly(miss, feature, context)
    if (!assembly) return []
    return {
      ...assembly,
      stoppedBy: miss.stoppedBy,
      shortfallMm: miss.shortfallMm,
      reason: nearMissSentence(miss, namesOf(assembly), sentenceUnit),
      changes: miss.changes.map((change) => listedChange(change, feature, context)),
    }
  })
}

function listedChange(
  change: SearchChange,
  feature: Feature,
  context: ListingContext,
): SearchNearMissResponse['changes'][number] {
  const assembly = 'option' in change ? listedAssembly(change.option, feature, context) : null
  const names = assembly && namesOf(assembly)
  const item = change.kind === 'extension' ? assembly?.extension : assembly?.holder
  return {
    kind: change.kind,
    text: changeSentence(change, names, context.body.sentenceUnit),
    itemId: item?.id ?? null,
  }
}
