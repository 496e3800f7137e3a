'use client'

import { ApiError } from '@/lib/api-client'
import { faultSentence } from '@/lib/field-faults'
import type { CatalogueView } from '../catalogue/catalogue-view'
import { useCan } from '../layout/shop-context'
import { Button, ButtonLink } from '../ui/button'
import { StateSentence } from '../ui/state-sentence'
import { isListNarrowed } from './reorder-point-filters'

export interface ReorderPointsStateProps {
  state: 'loading' | 'failed' | 'empty'
  failure: unknown
  view: CatalogueView
  onRetry: () => void
  onClear: () => void
  onAdd: () => void
}

/** What stands where the rows would: loading, failed, nothing found or nothing there, each with its next step. */
export function ReorderPointsState({
  state,
  failure,
  view,
  onRetry,
  onClear,
  onAdd,
}: ReorderPointsStateProps) {
  const canKeep = useCan('keepCrib')
  if (state === 'loading') return <StateSentence sentence="Reading the reorder points …" />
  if (state === 'failed') {
    const isAddressWrong = failure instanceof ApiError && failure.code === 'wrong-shape'
    return (
      <StateSentence sentence={`The reorder points could not be read. ${faultSentence(failure)}`}>
        <Button onClick={onRetry}>Try again</Button>
        {isAddressWrong ? <Button onClick={onClear}>Show the whole list</Button> : null}
      </StateSentence>
    )
  }
  if (isListNarrowed(view)) {
    const what = view.q === '' ? 'passes these filters' : `matches “${view.q}”`
    return (
      <StateSentence sentence={`No reorder point ${what}.`}>
        <Button onClick={onClear}>Clear the search and filters</Button>
      </StateSentence>
    )
  }
  if (!canKeep)
    return <StateSentence sentence="No item is watched yet. The crib manager sets the reorder points." />
  return (
    <StateSentence sentence="No item is watched yet, so nothing is ever called low. Bring reorder points in from a file, or set the first by hand.">
      <ButtonLink href="/imports/new?kind=reorderPoints" variant="primary">
        Import a file
      </ButtonLink>
      <Button onClick={onAdd}>Add a reorder point</Button>
    </StateSentence>
  )
}
