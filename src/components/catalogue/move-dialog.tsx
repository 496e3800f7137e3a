'use client'

import { type FormEvent, useState } from 'react'
import { useCan, useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Notice } from '@/components/ui/notice'
import { SelectField, type SelectOption } from '@/components/ui/select-field'
import { TextField } from '@/components/ui/text-field'
import { toast } from '@/components/ui/toast'
import { type Condition, conditions } from '@/core/stock/kinds'
import { parseCount } from '@/core/units/parse-count'
import type { useItemStock } from '@/hooks/use-item'
import { useMoveStock } from '@/hooks/use-move-stock'
import { usePlaces } from '@/hooks/use-places'
import { ApiError } from '@/lib/api-client'
import { lowSentence } from '@/lib/low-sentence'
import { newIdempotencyKey } from '@/lib/new-idempotency-key'
import type { LocationResponse } from '@/schemas/location'
import type { BalanceResponse } from '@/schemas/stock'
import { SectionState } from './section-state'
import { conditionNames } from './stock-words'

export interface MoveDialogProps {
  kind: 'issue' | 'return'
  item: { id: string; code: string }
  stock: ReturnType<typeof useItemStock>
  onClose: () => void
}

/** Pieces out of a bin into hands or a machine, or back. One opened dialog is one movement, however often it is sent. */
export function MoveDialog(props: MoveDialogProps) {
  const { kind, item, stock, onClose } = props
  const balances = stock.stock?.balances ?? []
  const sources = balances.filter((balance) => isSource(kind, balance)).toSorted(byUse)
  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title={kind === 'issue' ? `Issue ${item.code}` : `Return ${item.code}`}
    >
      {stock.stock === undefined ? (
        <SectionState
          sentence={
            stock.error ? `The stock could not be loaded. ${stock.error.message}` : 'Loading the stock …'
          }
          onRetry={stock.error ? stock.retry : undefined}
        />
      ) : sources.length === 0 ? (
        <p>
          {kind === 'issue'
            ? 'No bin has a piece of it: there is nothing to issue.'
            : 'Nobody and no machine has a piece of it: there is nothing to return.'}
        </p>
      ) : (
        <MoveForm kind={kind} item={item} balances={balances} sources={sources} onClose={onClose} />
      )}
    </Dialog>
  )
}

function isSource(kind: MoveDialogProps['kind'], balance: BalanceResponse): boolean {
  const isBin = balance.locationKind === 'bin'
  const isInUse = balance.locationKind === 'person' || balance.locationKind === 'machine'
  return balance.quantity > 0 && (kind === 'issue' ? isBin : isInUse)
}

/** What can be used comes first, the fullest place of all; what is worn comes last. */
export function byUse(one: BalanceResponse, other: BalanceResponse): number {
  return (
    Number(one.condition === 'worn') - Number(other.condition === 'worn') || other.quantity - one.quantity
  )
}

interface MoveFormProps extends Pick<MoveDialogProps, 'kind' | 'item' | 'onClose'> {
  balances: readonly BalanceResponse[]
  sources: readonly BalanceResponse[]
}

function MoveForm({ kind, item, balances, sources, onClose }: MoveFormProps) {
  const moveStock = useMoveStock()
  const { actor } = useShop()
  const [key] = useState(newIdempotencyKey)
  // One's own hands first: whoever returns has it there.
  const own = sources.find((candidate) => candidate.locationId === actor.locationId)
  const [sourceKey, setSourceKey] = useState<string | null>(null)
  const [quantity, setQuantity] = useState('1')
  const [target, setTarget] = useState<string | null>(null)
  const [returnedAs, setReturnedAs] = useState<Condition | null>(null)
  const [note, setNote] = useState('')
  const [errors, setErrors] = useState<Record<string, string>>({})
  const [isBusy, setIsBusy] = useState(false)
  const source = sources.find((candidate) => balanceKey(candidate) === sourceKey) ?? own ?? sources[0]
  const targets = useTargets(kind, balances)
  const chosen = target ?? targets.options[0]?.value ?? ''
  const toCondition = kind === 'issue' ? source?.condition : (returnedAs ?? worst(source?.condition))

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const count = parseCount(quantity)
    if (!count.ok) return setErrors({ quantity: count.message })
    if (!source || !toCondition) return
    setErrors({})
    setIsBusy(true)
    try {
      const low = await moveStock(
        {
          kind,
          itemId: item.id,
          quantity: count.count,
          fromLocationId: source.locationId,
          fromCondition: source.condition,
          toLocationId: chosen,
          toCondition,
          note,
        },
        key,
      )
      toast.success(`${count.count} × ${item.code} ${kind === 'issue' ? 'issued' : 'returned'}.`)
      for (const alert of low) toast.warning(lowSentence(alert))
      onClose()
    } catch (error) {
      setErrors(refusals(error))
      setIsBusy(false)
    }
  }

  return (
    <form noValidate onSubmit={handleSubmit} className="flex flex-col gap-4">
      <SelectField
        label="From"
        value={source ? balanceKey(source) : ''}
        onChange={(event) => setSourceKey(event.target.value)}
        options={sources.map((balance) => ({ value: balanceKey(balance), label: sourceWords(balance) }))}
        error={errors.fromLocationId ?? errors.fromCondition}
      />
      <TextField
        label="Pieces"
        inputMode="numeric"
        autoComplete="off"
        value={quantity}
        onChange={(event) => setQuantity(event.target.value)}
        error={errors.quantity}
        hint={source ? `${source.quantity} there` : undefined}
      />
      {targets.isNarrowable ? (
        <TextField
          label="Find a bin by its code"
          autoComplete="off"
          spellCheck={false}
          value={targets.search}
          onChange={(event) => {
            targets.setSearch(event.target.value)
            setTarget(null)
          }}
        />
      ) : null}
      <SelectField
        label="To"
        value={chosen}
        onChange={(event) => setTarget(event.target.value)}
        options={
          targets.options.length > 0 ? targets.options : [{ value: '', label: 'No bin has this code' }]
        }
        error={errors.toLocationId}
      />
      {kind === 'return' ? (
        <SelectField
          label="Condition it comes back in"
          value={toCondition}
          onChange={(event) => setReturnedAs(conditions.find((name) => name === event.target.value) ?? null)}
          options={conditions.map((name) => ({ value: name, label: conditionNames[name] }))}
          error={errors.toCondition}
        />
      ) : null}
      <TextField
        label="Note"
        value={note}
        maxLength={1000}
        onChange={(event) => setNote(event.target.value)}
        error={errors.note}
      />
      {errors.whole ? (
        <Notice kind="collision" isAnnounced>
          {errors.whole}
        </Notice>
      ) : null}
      <div className="flex flex-wrap gap-2">
        <Button type="submit" variant="primary" disabled={isBusy || chosen === ''}>
          {kind === 'issue' ? (isBusy ? 'Issuing …' : 'Issue') : isBusy ? 'Returning …' : 'Return'}
        </Button>
        <Button variant="quiet" onClick={onClose}>
          Cancel
        </Button>
      </div>
    </form>
  )
}

/** By this the chosen place stays chosen when the stock is read again meanwhile. */
function balanceKey(balance: BalanceResponse): string {
  return `${balance.locationId} ${balance.condition}`
}

/** What was used does not come back new. */
function worst(condition: Condition | undefined): Condition {
  return condition === undefined || condition === 'new' ? 'used' : condition
}

function sourceWords(balance: BalanceResponse): string {
  const place =
    balance.cribCode === null ? balance.locationName : `${balance.cribCode} ${balance.locationCode}`
  const condition =
    balance.condition === 'worn'
      ? 'worn, for regrinding or scrap'
      : conditionNames[balance.condition].toLowerCase()
  return `${place}, ${condition}: ${balance.quantity}`
}

const fewBins = 30

function useTargets(kind: MoveDialogProps['kind'], balances: readonly BalanceResponse[]) {
  const { actor } = useShop()
  const [search, setSearch] = useState('')
  const mayKeep = useCan('keepCrib')
  const machines = usePlaces(kind === 'issue' ? 'machine' : null)
  const people = usePlaces(kind === 'issue' && mayKeep ? 'person' : null)
  const bins = usePlaces(kind === 'return' ? 'bin' : null, search)
  if (kind === 'issue') {
    const options = issueTargets(actor, machines.places, people.places)
    return { options, isNarrowable: false, search, setSearch }
  }
  const options = returnTargets(balances, bins.places, search)
  return {
    options,
    isNarrowable: search !== '' || (bins.total ?? options.length) > fewBins,
    search,
    setSearch,
  }
}

type NamedPlace = Pick<LocationResponse, 'id' | 'name'>

/** Where a piece may go to: one's own hands, the machines, and the hands of others for those who see their places. */
export function issueTargets(
  actor: { name: string; locationId: string },
  machines: readonly NamedPlace[],
  people: readonly NamedPlace[],
): SelectOption[] {
  const others = people.filter(({ id }) => id !== actor.locationId)
  return [
    { value: actor.locationId, label: `My hands (${actor.name})` },
    ...[...machines, ...others].map(({ id, name }) => ({ value: id, label: name })),
  ]
}

/**
 * Where a piece may come back to: the bins it lies in already, the fullest first, then the rest. They come from the stock,
 * since a shop has more bins than one block of the list. Where it lies in none, or a code was typed, nobody's bin is taken
 * for granted.
 */
export function returnTargets(
  balances: readonly BalanceResponse[],
  places: readonly Pick<LocationResponse, 'id' | 'code' | 'cribCode'>[],
  search: string,
): SelectOption[] {
  const rest = places.map((place) => ({ value: place.id, label: `${place.cribCode} ${place.code}` }))
  if (search !== '') return rest
  const homes = new Map(
    balances
      .filter((balance) => balance.locationKind === 'bin')
      .toSorted((one, other) => other.quantity - one.quantity)
      .map((balance) => [balance.locationId, `${balance.cribCode} ${balance.locationCode}`]),
  )
  const first = [...homes].map(([value, label]) => ({ value, label }))
  const others = rest.filter((option) => !homes.has(option.value))
  if (first.length === 0 && others.length > 1) return [{ value: '', label: 'Choose a bin' }, ...others]
  return [...first, ...others]
}

const formFields = ['fromLocationId', 'fromCondition', 'toLocationId', 'toCondition', 'quantity', 'note']

function refusals(error: unknown): Record<string, string> {
  if (!(error instanceof ApiError))
    return { whole: error instanceof Error ? error.message : 'It was not posted.' }
  const beside = error.fieldProblems.filter((problem) => formFields.includes(problem.path))
  return beside.length > 0
    ? Object.fromEntries(beside.map((problem) => [problem.path, problem.message]))
    : { whole: error.message }
}
