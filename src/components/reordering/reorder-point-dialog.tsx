'use client'

import { type ComponentProps, type FormEvent, useState } from 'react'
import { parseCount } from '@/core/units/parse-count'
import {
  createReorderPoint,
  findItemOfCode,
  hasReorderPoint,
  type ItemOfCode,
  saveReorderPoint,
} from '@/hooks/use-reorder-points'
import { ApiError } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import type { ReorderPointResponse, ReorderPointRow } from '@/schemas/reordering'
import type { SupplierResponse } from '@/schemas/supplier'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { toast } from '../ui/toast'
import { useAttempt } from '../ui/use-attempt'
import { useNewPoint } from './new-point'
import { NewPointFields } from './new-point-fields'
import {
  type EditedField,
  editedFields,
  readTypedPoint,
  shownText,
  supplierChoices,
  type TypedTexts,
  typedCaution,
  typedText,
} from './reorder-point-fields'

export interface ReorderPointDialogProps {
  /** Null adds one. */
  row: ReorderPointRow | null
  /** The crib looked at, which a new one most likely is of. */
  cribId?: string | undefined
  /** The item a new one is of, where it is not asked for. */
  item?: ItemOfCode | undefined
  suppliers: readonly SupplierResponse[]
  onClose: () => void
  /** With the code of a new one, so that it can be shown. */
  onSaved: (itemCode?: string) => void
  onRemove?: (row: ReorderPointRow) => void
}

const emptyTexts: TypedTexts = { packSize: '1', minimumOrder: '1' }

/** A reorder point as a form: a new one, or one that is there on a phone. What is refused stays as it was typed. */
export function ReorderPointDialog(props: ReorderPointDialogProps) {
  const { row, cribId, item, suppliers, onClose, onSaved, onRemove } = props
  const [base, setBase] = useState(row)
  const [texts, setTexts] = useState<TypedTexts>(row ? textsOf(row) : emptyTexts)
  const [unread, setUnread] = useState<TypedTexts>({})
  const point = useNewPoint(item, cribId)
  const { fault, isBusy, attempt } = useAttempt()
  const current = currentOf(fault)
  const faults = { ...fieldFaults(fault), ...unread }

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const read = readTypedPoint(texts)
    setUnread(read.ok ? {} : read.faults)
    const isNamed = base !== null || point.check()
    if (!read.ok || !isNamed) return
    void attempt(async () => {
      if (base) {
        await saveReorderPoint(current ? { ...base, ...current } : base, read.change)
        return onSaved()
      }
      const found = item ?? (await findItemOfCode(point.code.trim()))
      if (!found) return point.setFaults({ code: 'No item in use has this code.' })
      if (await hasReorderPoint(found.id, point.cribId))
        return point.setFaults({ crib: 'It has a reorder point there already: change that one.' })
      const set = await createReorderPoint(found, point.cribId, read.change)
      const isLow = set.position !== undefined && set.position <= set.reorderPoint
      const where = `${found.code}${point.crib ? ` in ${point.crib.code}` : ''}`
      const message = `${where} has the reorder point ${set.reorderPoint}.`
      if (isLow) toast.warning(`${message} It is low now: ${set.position} available and coming.`)
      else toast.success(message)
      onSaved(found.code)
    })
  }

  function handleTakeTheirs() {
    if (!base || !current) return
    const theirs = { ...base, ...current }
    setBase(theirs)
    setTexts(textsOf(theirs))
    void attempt(async () => undefined)
  }

  return (
    <Dialog
      isOpen
      onOpenChange={onClose}
      title={
        row
          ? `${row.itemCode} in ${row.cribCode}`
          : item
            ? `Add a reorder point of ${item.code}`
            : 'Add a reorder point'
      }
      {...(row ? { description: row.description } : {})}
    >
      <form onSubmit={handleSubmit} className="flex flex-col gap-4" noValidate>
        {current && base ? (
          <StaleNotice now={{ ...base, ...current }} onTakeTheirs={handleTakeTheirs} />
        ) : fault ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault)}
          </Notice>
        ) : null}
        {row ? null : (
          <NewPointFields point={point} isItemKnown={item !== undefined} reorderPoint={typedPoint(texts)} />
        )}
        <div className="grid gap-4 sm:grid-cols-2">
          {editedFields.map((field) => (
            <PointField
              key={field.field}
              field={field}
              text={texts[field.field] ?? ''}
              error={faults[field.field]}
              caution={field.field === 'orderUpTo' ? typedCaution(texts) : null}
              suppliers={suppliers}
              onType={(text) => setTexts((past) => ({ ...past, [field.field]: text }))}
            />
          ))}
        </div>
        <div className="flex flex-wrap gap-3">
          <Button type="submit" variant="primary" disabled={isBusy}>
            {isBusy
              ? 'Saving …'
              : current
                ? 'Put mine over it'
                : row
                  ? 'Save the changes'
                  : 'Add the reorder point'}
          </Button>
          <Button onClick={onClose}>Cancel</Button>
          {row && onRemove ? (
            <Button variant="quiet" onClick={() => onRemove(row)}>
              Take it away
            </Button>
          ) : null}
        </div>
      </form>
    </Dialog>
  )
}

function textsOf(row: ReorderPointRow): TypedTexts {
  return Object.fromEntries(editedFields.map(({ field }) => [field, typedText(row, field)]))
}

function currentOf(fault: unknown): ReorderPointResponse | null {
  if (!(fault instanceof ApiError) || fault.code !== 'stale-version') return null
  return (fault.problem?.current as ReorderPointResponse | null | undefined) ?? null
}

function StaleNotice({ now, onTakeTheirs }: { now: ReorderPointRow; onTakeTheirs: () => void }) {
  const said = editedFields
    .filter(({ field }) => now[field] !== null)
    .map((field) => `${field.label.toLowerCase()} ${shownText(now, field)}`)
  return (
    <Notice kind="collision" isAnnounced>
      <p>
        Someone else changed this reorder point meanwhile; nothing of yours was saved. It is now:{' '}
        {said.join(', ')}.
      </p>
      <Button size="compact" className="mt-1" onClick={onTakeTheirs}>
        Begin with theirs
      </Button>
    </Notice>
  )
}

function typedPoint(texts: TypedTexts): number | null {
  const read = parseCount(texts.reorderPoint ?? '')
  return read.ok ? read.count : null
}

const hints: Partial<Record<EditedField['field'], string>> = {
  reorderPoint: 'At or below this many pieces, available and coming, the item is low.',
  orderUpTo: 'An order fills up to this many.',
  packSize: 'Orders come in whole packs of this many.',
  minimumOrder: 'The supplier takes no fewer pieces.',
  leadTimeDays: 'Empty: the supplier’s own.',
}

function PointField({
  field,
  text,
  error,
  caution,
  suppliers,
  onType,
}: {
  field: EditedField
  text: string
  error: string | undefined
  caution: string | null
  suppliers: readonly SupplierResponse[]
  onType: (text: string) => void
}) {
  const shared = { label: field.label, error, value: text }
  if (field.kind === 'supplier') {
    return (
      <SelectField
        {...shared}
        options={supplierChoices(suppliers)}
        onChange={(event) => onType(event.target.value)}
      />
    )
  }
  const isCount = field.kind !== 'text'
  return (
    <TextField
      {...shared}
      isRequired={field.field === 'reorderPoint' || field.field === 'orderUpTo'}
      hint={caution ? <span className="text-caution font-semibold">{caution}</span> : hints[field.field]}
      autoComplete="off"
      onChange={(event) => onType(event.target.value)}
      {...(isCount ? ({ inputMode: 'numeric' } satisfies ComponentProps<'input'>) : {})}
    />
  )
}
