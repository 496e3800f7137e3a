'use client'

import { useCan } from '@/components/layout/shop-context'
import { Button, ButtonLink } from '@/components/ui/button'
import { StateSentence } from '@/components/ui/state-sentence'
import { ApiError } from '@/lib/api-client'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { type CatalogueView, hasFilters, isNarrowed } from './catalogue-view'

export interface CatalogueStateProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  state: 'loading' | 'failed' | 'empty'
  view: CatalogueView
  failure?: Error | null
  onRetry: () => void
  onClear: () => void
  /** Begins with an address that says nothing: what it said could not be read. */
  onReset: () => void
  onAdd: () => void
}

/** What stands where the rows would: loading, failed, nothing found or nothing there, each with its next step. */
export function CatalogueState<Row extends CatalogueRow>(props: CatalogueStateProps<Row>) {
  const { definition, state, view, failure, onRetry, onClear, onAdd } = props
  const mayKeep = useCan('keepCrib')
  if (state === 'loading') return <StateSentence sentence={`Loading the ${definition.many} …`} />
  if (state === 'failed')
    return (
      <StateSentence
        sentence={`The ${definition.many} could not be loaded. ${failure?.message ?? 'The server did not answer.'}`}
      >
        <Button onClick={onRetry}>Try again</Button>
        {failure instanceof ApiError && failure.code === 'wrong-shape' ? (
          <Button onClick={props.onReset}>Show the whole list</Button>
        ) : null}
      </StateSentence>
    )
  if (isNarrowed(view))
    return (
      <StateSentence sentence={nothingFound(definition.one, view)}>
        <Button onClick={onClear}>Clear the search and filters</Button>
      </StateSentence>
    )
  if (!mayKeep)
    return <StateSentence sentence={`There are no ${definition.many} yet. The crib manager adds them.`} />
  if (definition.kind === 'fixture')
    return (
      <StateSentence
        sentence={`There are no ${definition.many} yet. Enter what stands on the machines: vises, plates, collet blocks.`}
      >
        <Button variant="primary" onClick={onAdd}>
          Add a {definition.one}
        </Button>
      </StateSentence>
    )
  return (
    <StateSentence
      sentence={`There are no ${definition.many} yet. Bring them in from a file, or add the first by hand.`}
    >
      <ButtonLink href="/imports" variant="primary">
        Import a file
      </ButtonLink>
      <Button onClick={onAdd}>Add a {definition.one}</Button>
      <ButtonLink href="/first-day" variant="quiet">
        A shop’s first day, step by step
      </ButtonLink>
    </StateSentence>
  )
}

function nothingFound(one: string, view: CatalogueView): string {
  if (view.q === '') return `No ${one} passes these filters.`
  return hasFilters(view)
    ? `No ${one} that passes these filters matches “${view.q}”.`
    : `No ${one} matches “${view.q}”.`
}
