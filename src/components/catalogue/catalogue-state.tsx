'use client'

import { useCan } from '@/components/layout/shop-context'
import { Button, ButtonLink } from '@/components/ui/button'
import { StateSentence } from '@/components/ui/state-sentence'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'

export interface CatalogueStateProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  state: 'loading' | 'failed' | 'empty'
  /** Whether a search or a filter may be why there is nothing. */
  isNarrowed: boolean
  failure?: Error | null
  onRetry: () => void
  onClear: () => void
  onAdd: () => void
}

/** What stands where the rows would: loading, failed, nothing found or nothing there, each with its next step. */
export function CatalogueState<Row extends CatalogueRow>(props: CatalogueStateProps<Row>) {
  const { definition, state, isNarrowed, failure, onRetry, onClear, onAdd } = props
  const mayKeep = useCan('keepCrib')
  if (state === 'loading') return <StateSentence sentence={`Loading the ${definition.many} …`} />
  if (state === 'failed')
    return (
      <StateSentence
        sentence={`The ${definition.many} could not be loaded. ${failure?.message ?? 'The server did not answer.'}`}
      >
        <Button onClick={onRetry}>Try again</Button>
      </StateSentence>
    )
  if (isNarrowed)
    return (
      <StateSentence sentence={`No ${definition.one} matches this search and these filters.`}>
        <Button onClick={onClear}>Clear the search and filters</Button>
      </StateSentence>
    )
  if (!mayKeep)
    return <StateSentence sentence={`There are no ${definition.many} yet. The crib manager adds them.`} />
  return (
    <StateSentence
      sentence={`There are no ${definition.many} yet. Bring them in from a file, or add the first by hand.`}
    >
      <ButtonLink href="/imports" variant="primary">
        Import a file
      </ButtonLink>
      <Button onClick={onAdd}>Add a {definition.one}</Button>
    </StateSentence>
  )
}
