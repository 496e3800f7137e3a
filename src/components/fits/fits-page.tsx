'use client'

import { usePathname, useSearchParams } from 'next/navigation'
import { useState } from 'react'
import { PageHeading } from '../layout/page-heading'
import { useCan, useShop } from '../layout/shop-context'
import { ButtonLink } from '../ui/button'
import { classNames } from '../ui/class-names'
import { type FitsQuestion, fitsQuestions, questionOf } from './fits-question'
import { HoldingResults } from './holding-results'
import { PocketResults } from './pocket-results'
import { QuestionForm } from './question-form'

/** From a feature to its cutters, from a shank to what holds it, from a chuck or bore to what goes in. */
export function FitsPage() {
  const params = useSearchParams()
  const pathname = usePathname()
  const { unit } = useShop()
  const mayKeep = useCan('keepCrib')
  // Kept here too: the address follows a moment later, and a choice must not jump back until then.
  const [question, setQuestion] = useState(() => questionOf(params))
  const asked = new URLSearchParams(
    question.fields.flatMap(({ name }) => {
      const value = params.get(name)
      return value ? [[name, value]] : []
    }),
  )
  if (question.id === 'pocket' && params.get('inStock') === 'yes') asked.set('inStock', 'yes')
  const isAsked = question.fields.every(({ name, isOptional }) => isOptional || asked.has(name))

  function ask(query: URLSearchParams) {
    // Nothing of the page comes from the server, so the address changes at once.
    window.history.replaceState(null, '', `${pathname}?${query}`)
  }

  function handleChoose(chosen: FitsQuestion) {
    setQuestion(chosen)
    ask(new URLSearchParams({ from: chosen.id }))
  }

  return (
    <>
      <PageHeading title="What fits" note="Everything in the catalogue that could, with what is in stock.">
        {mayKeep ? (
          <ButtonLink href="/duplicates" size="compact" variant="quiet">
            Items that measure the same
          </ButtonLink>
        ) : null}
      </PageHeading>
      <div className="flex flex-col gap-5 px-4 pb-10 lg:px-6">
        <QuestionChoice chosen={question} onChoose={handleChoose} />
        <QuestionForm
          key={`${question.id} ${unit} ${asked}`}
          question={question}
          asked={asked}
          onAsk={(query) => ask(query)}
        />
        {isAsked && question.id === 'pocket' ? <PocketResults query={asked.toString()} /> : null}
        {isAsked && question.id !== 'pocket' ? (
          <HoldingResults question={question} query={asked.toString()} />
        ) : null}
      </div>
    </>
  )
}

function QuestionChoice({
  chosen,
  onChoose,
}: {
  chosen: FitsQuestion
  onChoose: (question: FitsQuestion) => void
}) {
  return (
    <fieldset className="flex flex-wrap gap-2">
      <legend className="mb-1 text-[0.9375rem] font-semibold">What you have</legend>
      {fitsQuestions.map((question) => (
        <label
          key={question.id}
          className={classNames(
            'has-focus-visible:outline-accent flex min-h-11 cursor-pointer items-center gap-2 rounded-[3px] border px-3 has-focus-visible:outline-3 has-focus-visible:outline-offset-2',
            question.id === chosen.id
              ? 'border-accent bg-accent-wash font-semibold'
              : 'border-ink-soft/60 bg-sheet hover:bg-accent-wash',
          )}
        >
          <input
            type="radio"
            name="from"
            value={question.id}
            checked={question.id === chosen.id}
            onChange={() => onChoose(question)}
            className="accent-accent size-4"
          />
          {question.label}
        </label>
      ))}
    </fieldset>
  )
}
