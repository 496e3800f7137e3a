'use client'

import { useEffect, useMemo, useRef, useState } from 'react'
import { useToolSearch } from '@/hooks/use-tool-search'
import { ApiError } from '@/lib/api-client'
import { PageHeading } from '../layout/page-heading'
import { useShop } from '../layout/shop-context'
import type { FieldErrors } from '../reach/compile-check'
import { useReading } from '../reach/use-reach-check'
import { Button } from '../ui/button'
import { classNames } from '../ui/class-names'
import { featureWords, filterWords } from './feature-words'
import { SearchForm } from './search-form'
import {
  compileSearch,
  noChoices,
  type SearchChoices,
  type SearchDraft,
  searchDraft,
  searchQuery,
  withChoices,
} from './search-question'
import { SearchResults } from './search-results'
import { SearchStart } from './search-start'
import { useAddressQuery } from './use-address-query'

/** What of the crib reaches: the feature asked for, and everything that could be built for it, the best first. */
export function SearchPage() {
  const [query, go] = useAddressQuery()
  const { reachSettings } = useShop()
  const reading = useReading()
  const draft = useMemo(() => searchDraft(query, reading), [query, reading])
  const compiled = useMemo(
    () => compileSearch(draft, reading, reachSettings),
    [draft, reading, reachSettings],
  )
  const request = compiled.state === 'asked' ? compiled.request : null
  const search = useToolSearch(request)
  const [isFormOpen, setIsFormOpen] = useState(compiled.state !== 'asked')
  const results = useRef<HTMLDivElement>(null)
  const isJustAsked = useRef(false)

  // The keyboard and the eye go to where the answer comes, once the form made way for it.
  useEffect(() => {
    if (!isJustAsked.current || isFormOpen) return
    isJustAsked.current = false
    results.current?.focus({ preventScroll: true })
    results.current?.scrollIntoView({ block: 'start' })
  }, [isFormOpen])

  function handleAsk(asked: SearchDraft) {
    isJustAsked.current = true
    setIsFormOpen(false)
    go(searchQuery(asked, reading))
    if (request) search.retry()
  }

  function handleChoices(change: Partial<SearchChoices>) {
    go(withChoices(query, { ...draft.choices, ...change }))
  }

  return (
    <>
      <PageHeading
        title="Find a tool"
        note={
          <span className="max-lg:hidden">
            Every cutter in everything that could hold it, at the stick-out it needs.
          </span>
        }
      />
      <div className="grid flex-1 grid-cols-[minmax(0,1fr)] content-start gap-4 px-3 pb-10 lg:grid-cols-[22rem_minmax(0,1fr)] lg:gap-8 lg:px-6">
        <div className="min-w-0 lg:sticky lg:top-16 lg:max-h-[calc(100dvh-5rem)] lg:self-start lg:overflow-y-auto">
          {request?.feature && !isFormOpen ? (
            <AskedLine
              words={featureWords(request.feature, draft.purpose, reading.unit)}
              filters={filterWords(draft)}
              onChange={() => setIsFormOpen(true)}
            />
          ) : null}
          <div className={classNames(request && !isFormOpen && 'max-lg:hidden')}>
            <SearchForm
              key={`${reading.unit} ${reading.decimalComma} ${withChoices(query, noChoices)}`}
              draft={draft}
              reading={reading}
              settings={reachSettings}
              refused={refusedFields(compiled.state === 'refused' ? compiled.errors : null, search.error)}
              onAsk={handleAsk}
            />
          </div>
        </div>
        <div ref={results} tabIndex={-1} className="min-w-0 scroll-mt-20 outline-none">
          {request ? (
            <SearchResults search={search} request={request} draft={draft} onChoices={handleChoices} />
          ) : (
            <SearchStart isRefused={compiled.state === 'refused'} />
          )}
        </div>
      </div>
    </>
  )
}

/** What stands against the question, beside the fields it is about: read here, or said by the server. */
function refusedFields(local: FieldErrors | null, error: Error | undefined): FieldErrors {
  const told =
    error instanceof ApiError ? error.fieldProblems.map(({ path, message }) => [path, message]) : []
  return { ...local, ...Object.fromEntries(told) }
}

/** On a phone the fields make way for the answer: what was asked stays in sight, a thumb away from being changed. */
function AskedLine({
  words,
  filters,
  onChange,
}: {
  words: string
  filters: string | null
  onChange: () => void
}) {
  return (
    <div className="border-ink bg-sheet flex items-center gap-3 border py-1 pr-1 pl-3 lg:hidden">
      <p className="min-w-0 flex-1 font-semibold">
        {words}
        {filters === null ? null : <span className="block font-normal">{filters}</span>}
      </p>
      <Button size="counter" variant="quiet" className="px-4!" onClick={onChange}>
        Change
      </Button>
    </div>
  )
}
