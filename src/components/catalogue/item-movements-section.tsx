'use client'

import { useState } from 'react'
import { Button } from '@/components/ui/button'
import { classNames } from '@/components/ui/class-names'
import { useItemMovements } from '@/hooks/use-item'
import { formatInstant } from '@/lib/format-instant'
import type { MovementResponse } from '@/schemas/movement'
import { cellClass, headingCellClass, ItemSection } from './item-section'
import { ReverseDialog } from './reverse-dialog'
import { SectionState } from './section-state'
import { conditionNames, movementNames } from './stock-words'

/** What happened to it, newest first; what one may reverse carries the button. */
export function ItemMovementsSection({ itemId }: { itemId: string }) {
  const list = useItemMovements(itemId)
  const [reversed, setReversed] = useState<MovementResponse | null>(null)
  const { movements, error } = list
  return (
    <ItemSection
      title="Movements"
      aside={list.total ? <span className="text-ink-soft text-sm">{list.total} in all</span> : null}
    >
      {movements.length > 0 ? (
        <MovementTable movements={movements} onReverse={setReversed} />
      ) : error ? (
        <SectionState
          sentence={`The movements could not be loaded. ${error.message}`}
          onRetry={list.refresh}
        />
      ) : list.isLoading ? (
        <SectionState sentence="Loading the movements …" />
      ) : (
        <SectionState sentence="Nothing has moved yet. Opening stock comes in by an import." />
      )}
      {list.hasMore ? (
        <Button
          size="compact"
          className="mt-3 print:hidden"
          disabled={list.isLoadingMore}
          onClick={list.loadMore}
        >
          {list.isLoadingMore ? 'Loading …' : 'Show older'}
        </Button>
      ) : null}
      {reversed ? <ReverseDialog movement={reversed} onClose={() => setReversed(null)} /> : null}
    </ItemSection>
  )
}

function MovementTable({
  movements,
  onReverse,
}: {
  movements: readonly MovementResponse[]
  onReverse: (movement: MovementResponse) => void
}) {
  return (
    <table className="w-full max-sm:block">
      <thead className="max-sm:sr-only">
        <tr className="border-hairline border-b">
          {['When', 'What', 'From', 'To', 'Who', 'Note'].map((heading) => (
            <th key={heading} scope="col" className={headingCellClass}>
              {heading}
            </th>
          ))}
          <th scope="col" className={headingCellClass}>
            <span className="sr-only">Reverse</span>
          </th>
        </tr>
      </thead>
      <tbody className="max-sm:block">
        {movements.map((movement) => (
          <MovementRow key={movement.id} movement={movement} onReverse={onReverse} />
        ))}
      </tbody>
    </table>
  )
}

/** On a phone each movement is a small block of lines instead of a row. */
function MovementRow({
  movement,
  onReverse,
}: {
  movement: MovementResponse
  onReverse: (movement: MovementResponse) => void
}) {
  const isUndone = movement.reversedById !== null
  const phoneCell = 'max-sm:block max-sm:border-0 max-sm:p-0'
  return (
    <tr
      className={classNames(
        'border-hairline border-b align-baseline max-sm:block max-sm:py-2.5',
        isUndone && 'text-ink-soft',
      )}
    >
      <td className={`${cellClass} ${phoneCell} whitespace-nowrap max-sm:text-sm`}>
        {formatInstant(movement.occurredAt)}
      </td>
      <th scope="row" className={`${cellClass} ${phoneCell} text-left font-normal whitespace-nowrap`}>
        <span className={classNames('font-semibold', isUndone && 'line-through')}>
          {movementNames[movement.kind]} {movement.quantity}
        </span>
        {isUndone ? ' reversed' : ''}
      </th>
      <td className={`${cellClass} ${phoneCell}`}>
        <span className="text-ink-soft text-sm sm:hidden">from </span>
        <End end={movement.from} condition={conditionNames[movement.fromCondition]} />
      </td>
      <td className={`${cellClass} ${phoneCell}`}>
        <span className="text-ink-soft text-sm sm:hidden">to </span>
        <End end={movement.to} condition={conditionNames[movement.toCondition]} />
      </td>
      <td className={`${cellClass} ${phoneCell}`}>
        <span className="text-ink-soft text-sm sm:hidden">by </span>
        {movement.actorName}
      </td>
      <td className={`${cellClass} ${phoneCell} text-ink-soft max-w-64 text-sm`}>{movement.note}</td>
      <td className={`${cellClass} ${phoneCell} text-right print:hidden`}>
        {movement.canReverse ? (
          <Button
            variant="quiet"
            size="compact"
            className="min-h-8! max-sm:-ml-3 max-sm:min-h-11!"
            onClick={() => onReverse(movement)}
          >
            Reverse
          </Button>
        ) : null}
      </td>
    </tr>
  )
}

function End({ end, condition }: { end: MovementResponse['from']; condition: string }) {
  return (
    <>
      {end.cribCode !== null && end.code !== null ? end.code : end.name}
      {end.code === null ? null : <span className="text-ink-soft text-sm"> {condition.toLowerCase()}</span>}
    </>
  )
}
