'use client'

import { useState } from 'react'
import { useMachines, useSetUps } from '@/hooks/use-machines'
import type { useToolSearch } from '@/hooks/use-tool-search'
import type {
  ReachSearchBody,
  ReachSearchResponse,
  SearchNoteCode,
  SearchRanking,
} from '@/schemas/reach-search'
import { useShop } from '../layout/shop-context'
import { ReachCautions } from '../reach/reach-cautions'
import { Button, ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { StateSentence } from '../ui/state-sentence'
import { CompareBar, CompareSection } from './compare-section'
import type { AssemblyListing } from './listed-assembly'
import { NearMissItem } from './near-miss-item'
import { OptionItem } from './option-item'
import { RankBar } from './rank-bar'
import { noFilters, type SearchChoices, type SearchDraft } from './search-question'
import { useIsSlow } from './use-is-slow'

export interface SearchResultsProps {
  search: ReturnType<typeof useToolSearch>
  request: ReachSearchBody
  draft: SearchDraft
  onChoices: (change: Partial<SearchChoices>) => void
}

/** The answer: how many reach, what they are ranked by, the ranked list, and what falls short, nearest first. */
export function SearchResults({ search, request, draft, onChoices }: SearchResultsProps) {
  const { answer, error, isCancelled, isSearching } = search
  return (
    <section aria-label="What reaches" className="flex flex-col gap-3">
      <RankBar choices={draft.choices} onChoices={onChoices} />
      {answer ? (
        <Answer answer={answer} request={request} draft={draft} onChoices={onChoices} />
      ) : error ? (
        <StateSentence sentence={`The crib could not be searched. ${error.message}`}>
          <Button size="counter" onClick={search.retry}>
            Search again
          </Button>
        </StateSentence>
      ) : isCancelled ? (
        <StateSentence sentence="The search was stopped before it was done; nothing was changed.">
          <Button size="counter" onClick={search.retry}>
            Search again
          </Button>
        </StateSentence>
      ) : (
        <Searching isSearching={isSearching} onCancel={search.cancel} />
      )}
    </section>
  )
}

function Searching({ isSearching, onCancel }: { isSearching: boolean; onCancel: () => void }) {
  const isSlow = useIsSlow(isSearching)
  return (
    <StateSentence
      sentence={
        isSlow ? 'Still searching the crib: this takes longer than a second …' : 'Searching the crib …'
      }
    >
      {isSlow ? (
        <Button size="counter" onClick={onCancel}>
          Stop the search
        </Button>
      ) : null}
    </StateSentence>
  )
}

interface AnswerProps extends Omit<SearchResultsProps, 'search'> {
  answer: ReachSearchResponse
}

const rankWords: Record<SearchRanking, string> = {
  stiffness: 'the stiffest first',
  stock: 'what is in stock first',
  cost: 'the least cost first',
  built: 'what is built already first',
}

function Answer({ answer, request, draft, onChoices }: AnswerProps) {
  const { unit, reachSettings } = useShop()
  const [chosen, setChosen] = useState<readonly string[]>([])
  const [isComparing, setIsComparing] = useState(false)
  const { options, nearMisses, reachable, considered } = answer
  const listed = [...options, ...nearMisses]
  const compared = chosen.flatMap((key) => listed.find((assembly) => assembly.key === key) ?? [])
  const spindleNoseDiameterMm = useSpindleNose(draft.choices)
  const feature = request.feature
  if (!feature) return null
  const listing: AssemblyListing = {
    feature,
    request,
    draft,
    unit,
    clearances: {
      shankMm: request.clearances?.shankMm ?? reachSettings.shankClearanceMm,
      holderMm: request.clearances?.holderMm ?? reachSettings.holderClearanceMm,
    },
    spindleNoseDiameterMm,
    isChosen: (key) => chosen.includes(key),
    isFull: chosen.length >= mostCompared,
    onChoose: (key) =>
      setChosen((held) => (held.includes(key) ? held.filter((other) => other !== key) : [...held, key])),
  }
  return (
    <>
      <p role="status" className="text-lg font-semibold">
        {summary(reachable, considered)}
        {options.length > 0 ? (
          <span className="text-ink-soft block text-base font-normal">
            {options.length === 1 ? 'The one' : `The ${options.length}`} listed
            {draft.check.picks.cutter === null ? ', one for each cutter' : ''}
            {options.length > 1 ? `, ${rankWords[draft.choices.rankBy]}` : ''}.
          </span>
        ) : null}
      </p>
      <Notes answer={answer} isFiltered={isFiltered(draft)} onChoices={onChoices} />
      {isComparing && compared.length > 1 ? (
        <CompareSection assemblies={compared} listing={listing} onClose={() => setIsComparing(false)} />
      ) : null}
      {options.length > 0 ? (
        <ol className="border-ink border-t">
          {options.map((option, index) => (
            <OptionItem key={option.key} option={option} place={index + 1} listing={listing} />
          ))}
        </ol>
      ) : null}
      {nearMisses.length > 0 ? (
        <section aria-labelledby="near-misses" className="mt-4">
          <h2 id="near-misses" className="text-xl">
            Falls short
          </h2>
          <p className="text-ink-soft">Nearest first, with what stops it and the least that would help.</p>
          <ol className="border-ink mt-2 border-t">
            {nearMisses.map((miss) => (
              <NearMissItem key={miss.key} miss={miss} listing={listing} />
            ))}
          </ol>
        </section>
      ) : null}
      <ReachCautions />
      {chosen.length > 0 && !isComparing ? (
        <CompareBar
          count={compared.length}
          onCompare={() => setIsComparing(true)}
          onClear={() => setChosen([])}
        />
      ) : null}
    </>
  )
}

/** Of the machine chosen, or of the one its set-up is on. */
function useSpindleNose({ machineId, setUpId }: SearchChoices): number | null {
  const machines = useMachines()
  const setUps = useSetUps('all')
  const wantedId = machineId ?? setUps.rows.find(({ id }) => id === setUpId)?.machineId
  return machines.rows.find(({ id }) => id === wantedId)?.spindleNoseDiameterMm ?? null
}

const mostCompared = 4

function summary(reachable: number, considered: number): string {
  const all = considered.toLocaleString('en')
  if (considered === 0) return 'Nothing could be built for this.'
  if (reachable === 0) return `None of the ${all} assemblies the crib could build reaches.`
  return `${reachable.toLocaleString('en')} of ${all} assemblies ${reachable === 1 ? 'reaches' : 'reach'}.`
}

const noteKinds: Record<SearchNoteCode, 'plain' | 'caution'> = {
  'crib-empty': 'caution',
  'nothing-passes-filters': 'caution',
  'no-cutter-suits': 'caution',
  'nothing-reaches': 'caution',
  'cutters-not-checked': 'plain',
  'left-to-finishing': 'plain',
}

/** What is to be known of the answer as a whole, with the way on where there is one. */
function Notes({ answer, isFiltered, onChoices }: WayOnProps & Pick<AnswerProps, 'answer'>) {
  return answer.notes.map(({ code, text }) => (
    <Notice key={code} kind={noteKinds[code]}>
      <p>{text}</p>
      <WayOn code={code} isFiltered={isFiltered} onChoices={onChoices} />
    </Notice>
  ))
}

interface WayOnProps extends Pick<AnswerProps, 'onChoices'> {
  /** Something of the crib was left out by a choice. */
  isFiltered: boolean
}

function isFiltered({ choices }: SearchDraft): boolean {
  const { cribId, machineId, setUpId, isInStockOnly, forms, substrates } = choices
  const named = [cribId, machineId, setUpId].some((choice) => choice !== null)
  return named || isInStockOnly || forms.length > 0 || substrates.length > 0
}

function WayOn({ code, isFiltered, onChoices }: WayOnProps & { code: SearchNoteCode }) {
  const everything = (
    <Button className="mt-2 max-lg:min-h-16" onClick={() => onChoices(noFilters)}>
      Look through everything
    </Button>
  )
  switch (code) {
    case 'crib-empty':
      return (
        <p className="mt-2 flex flex-wrap gap-2">
          <ButtonLink href="/cutters">Cutters</ButtonLink>
          <ButtonLink href="/holders">Holders</ButtonLink>
        </p>
      )
    case 'nothing-passes-filters':
      return everything
    case 'no-cutter-suits':
    case 'nothing-reaches':
      return (
        <>
          <p>
            A wider corner, floor or opening, roughing and finishing apart, or some draft on the wall may
            help.
          </p>
          {isFiltered ? everything : null}
        </>
      )
    default:
      return null
  }
}
