'use client'

import { useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { useAttempt } from '@/components/ui/use-attempt'
import { useChangeFound, useFoundChanges } from '@/hooks/use-found-changes'
import { faultSentence } from '@/lib/field-faults'
import { formatInstant } from '@/lib/format-instant'
import type { FoundChange } from '@/schemas/found-change'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import type { ItemField } from './item-form-definition'
import { type Manner, typedText } from './typed-values'

export interface FoundChangesMadeProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  fields: readonly ItemField[]
  onUndone: (id: string) => void
}

/** One's own last changes of everything found, each to be taken back, also after the page was left. */
export function FoundChangesMade<Row extends CatalogueRow>(props: FoundChangesMadeProps<Row>) {
  const { changes } = useFoundChanges(props.definition.kind)
  if (!changes || changes.length === 0) return null
  return (
    <section aria-label="Your last changes" className="border-hairline border-t pt-3">
      <h3 className="text-base">Your last changes</h3>
      <ul>
        {changes.map((change) => (
          <ChangeLine key={change.id} {...props} change={change} />
        ))}
      </ul>
    </section>
  )
}

function ChangeLine<Row extends CatalogueRow>({
  definition,
  fields,
  onUndone,
  change,
}: FoundChangesMadeProps<Row> & { change: FoundChange }) {
  const manner = useShop()
  const { undo } = useChangeFound(definition.kind)
  const { fault, isBusy, attempt } = useAttempt()
  const field = fields.find(({ path }) => path === change.field)
  return (
    <li className="border-hairline flex flex-wrap items-center gap-x-3 border-b py-1 last:border-b-0">
      <span className="min-w-0 flex-1 wrap-anywhere">
        {field?.label ?? change.field} {valueWords(field, change, manner)}:{' '}
        {change.count.toLocaleString('en')} {change.count === 1 ? definition.one : definition.many},{' '}
        <span className="text-ink-soft">{formatInstant(change.changedAt)}</span>
      </span>
      <Button
        size="compact"
        variant="quiet"
        disabled={isBusy}
        onClick={() =>
          void attempt(async () => {
            await undo(change.id)
            onUndone(change.id)
          })
        }
      >
        Take back
      </Button>
      {fault ? (
        <p role="alert" className="text-collision w-full text-sm font-semibold">
          {faultSentence(fault)}
        </p>
      ) : null}
    </li>
  )
}

function valueWords(field: ItemField | undefined, { value }: FoundChange, manner: Manner): string {
  if (value === null || value === '') return 'cleared'
  if (!field) return `to “${value}”`
  const choice = field.options?.find((option) => option.value === value)
  const unit = field.kind === 'length' ? ` ${manner.unit}` : ''
  return `to “${choice?.label ?? typedText(field, value, manner)}${unit}”`
}
