'use client'

import { useEffect, useMemo, useState } from 'react'
import { type Control, type FieldValues, type UseFormReturn, useForm, useWatch } from 'react-hook-form'
import { NoDrawing } from '@/components/drawing/no-drawing'
import { useCan, useShop } from '@/components/layout/shop-context'
import { Button } from '@/components/ui/button'
import { classNames } from '@/components/ui/class-names'
import { Notice } from '@/components/ui/notice'
import { toast } from '@/components/ui/toast'
import { useSaveItem } from '@/hooks/use-save-item'
import { ApiError } from '@/lib/api-client'
import { createItemSchemas } from '@/schemas/create-item'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import type { ItemFieldGroup } from './item-form-definition'
import { ItemFormField } from './item-form-field'
import { itemResolver } from './item-resolver'
import { SegmentsEditor } from './segments-editor'
import { mergedValues, staleFields } from './stale-comparison'
import { StaleNotice } from './stale-notice'
import { blankValues, type Manner, readTyped, typedRow } from './typed-values'

export interface ItemFormProps<Row extends CatalogueRow> {
  definition: CatalogueDefinition<Row>
  /** The row to change; null adds one. */
  row: Row | null
  onSaved: (row: Row) => void
  onCancel: () => void
  onDirtyChange: (isDirty: boolean) => void
}

/** A field that gets the focus stands clear of the heading, of the drawing that stays in sight, and of the buttons. */
const formClass =
  'flex flex-col gap-5 [&_:is(input,select,textarea)]:scroll-mb-28 [&_:is(input,select,textarea)]:scroll-mt-24 [@media(min-height:50rem)_and_(min-width:40rem)]:[&_:is(input,select,textarea)]:scroll-mt-[28rem]'

type Form = UseFormReturn<FieldValues, unknown, FieldValues>

interface Stale<Row> {
  current: Row
  changedBy: string | null
}

export function ItemForm<Row extends CatalogueRow>(props: ItemFormProps<Row>) {
  const { definition, onCancel, onDirtyChange } = props
  const manner: Manner = useShop()
  const [base, setBase] = useState(props.row)
  const form = useForm<FieldValues, unknown, FieldValues>({
    defaultValues: base ? typedRow(definition.form, base, manner) : blankValues(definition.form),
    resolver: useMemo(() => itemResolver(definition.kind, definition.form, manner), [definition, manner]),
    mode: 'onBlur',
    reValidateMode: 'onChange',
  })
  const { isDirty, isSubmitting } = form.formState
  useEffect(() => onDirtyChange(isDirty), [isDirty, onDirtyChange])
  const saving = useSaving(props, form, base)
  const { stale } = saving

  function handleTakeTheirs() {
    if (!stale) return
    form.reset(typedRow(definition.form, stale.current, manner))
    setBase(stale.current)
    saving.clearStale()
  }

  function handleKeepMine() {
    if (!stale || !base) return
    const [before, theirs] = [base, stale.current].map((row) => typedRow(definition.form, row, manner))
    for (const { path, value } of mergedValues(definition.form, before ?? {}, theirs ?? {}, form.getValues()))
      form.setValue(path, value, { shouldDirty: true })
    setBase(stale.current)
    saving.clearStale()
    void form.handleSubmit((body) => saving.save(body, stale.current))()
  }

  return (
    <form noValidate onSubmit={form.handleSubmit((body) => saving.save(body, base))} className={formClass}>
      {stale && base ? (
        <StaleNotice
          fields={staleFields(
            definition.form,
            typedRow(definition.form, base, manner),
            typedRow(definition.form, stale.current, manner),
            form.getValues(),
          )}
          changedBy={stale.changedBy}
          changedAt={stale.current.updatedAt}
          onTakeTheirs={handleTakeTheirs}
          onKeepMine={handleKeepMine}
        />
      ) : null}
      <FormDrawing definition={definition} control={form.control} manner={manner} />
      {definition.form.groups.map((group) => (
        <FieldGroup key={group.title} group={group} control={form.control} />
      ))}
      {definition.form.segments ? (
        <SegmentsEditor control={form.control} {...definition.form.segments} />
      ) : null}
      {saving.failure ? (
        <Notice kind="collision" isAnnounced className="max-sm:order-3">
          {saving.failure}
        </Notice>
      ) : null}
      <div className="bg-sheet border-hairline max-sm:order-3 sticky bottom-0 -mx-5 flex gap-2 border-t px-5 py-3">
        <Button type="submit" variant="primary" disabled={isSubmitting}>
          {isSubmitting ? 'Saving …' : base ? 'Save the changes' : `Add the ${definition.one}`}
        </Button>
        <Button variant="quiet" onClick={onCancel}>
          Cancel
        </Button>
      </div>
    </form>
  )
}

/** Saves and sorts out a refusal: beside its field, as a stale edit, or as a sentence of its own. */
function useSaving<Row extends CatalogueRow>(props: ItemFormProps<Row>, form: Form, base: Row | null) {
  const { definition, onSaved } = props
  const saveItem = useSaveItem<Row>(definition.kind)
  const [failure, setFailure] = useState<string | null>(null)
  const [stale, setStale] = useState<Stale<Row> | null>(null)

  async function save(body: FieldValues, existing: Row | null) {
    setFailure(null)
    try {
      const row = await saveItem({ existing, body })
      toast.success(base ? `${row.code} is saved.` : `${row.code} is added.`)
      onSaved(row)
    } catch (error) {
      handleRefusal(error)
    }
  }

  function handleRefusal(error: unknown) {
    if (!(error instanceof ApiError)) {
      setFailure(error instanceof Error ? error.message : 'Saving failed.')
      return
    }
    const current = error.problem?.current
    if (error.code === 'stale-version' && current) {
      const changedBy = error.problem?.changedBy
      setStale({ current: current as Row, changedBy: typeof changedBy === 'string' ? changedBy : null })
      return
    }
    const fields =
      error.code === 'code-taken' && error.fieldProblems.length === 0
        ? [{ path: 'code', message: error.message }]
        : error.fieldProblems
    for (const [index, { path, message }] of fields.entries())
      form.setError(
        path === 'segments' ? 'segments.root' : path,
        { type: 'server', message },
        { shouldFocus: index === 0 },
      )
    setFailure(
      fields.length === 0 ? error.message : 'Some fields were refused: the reason stands beside each.',
    )
  }

  return { save, failure, stale, clearStale: () => setStale(null) }
}

function FieldGroup({
  group,
  control,
}: {
  group: ItemFieldGroup
  control: Control<FieldValues, unknown, FieldValues>
}) {
  const values = useWatch({ control })
  const mayIncludeCosts = useCan('seeCosts')
  const shown = group.fields.filter(
    (field) => (field.isShown?.(values) ?? true) && (field.kind !== 'money' || mayIncludeCosts),
  )
  if (shown.length === 0) return null
  return (
    <fieldset className="border-ink border-t-2 pt-3">
      <legend className="float-left mb-2 w-full text-lg font-semibold">{group.title}</legend>
      <div className="clear-both grid items-start gap-x-4 gap-y-3 sm:grid-cols-2">
        {shown.map((field) => (
          <ItemFormField key={field.path} field={field} control={control} />
        ))}
      </div>
    </fieldset>
  )
}

/** Follows what is typed; while it cannot be drawn, says what it waits for. */
function FormDrawing<Row extends CatalogueRow>({
  definition,
  control,
  manner,
}: {
  definition: CatalogueDefinition<Row>
  control: Control<FieldValues, unknown, FieldValues>
  manner: Manner
}) {
  const values = useWatch({ control })
  const { body } = readTyped(definition.form, values, manner)
  const completed = { ...(definition.form.completeForDrawing?.(body) ?? body), code: body.code || '–' }
  const checked = createItemSchemas[definition.kind].safeParse(completed)
  // Faults the geometry itself has come last and under this code; before them something is not typed yet.
  const fault = checked.success ? null : checked.error.issues[0]
  const reason =
    fault?.code === 'custom'
      ? fault.message
      : 'The drawing appears here as soon as the dimensions make a whole.'
  return (
    <div
      className={classNames(
        'bg-sheet [@media(min-height:50rem)_and_(min-width:40rem)]:sticky top-[4.5rem] z-5 -mt-4 pt-4 pb-1',
        // On a phone beside the segments it is made of, which are a long way down.
        definition.form.segments && 'max-sm:order-1',
      )}
    >
      {checked.success ? definition.form.draw(checked.data as Row) : <NoDrawing reason={reason} />}
    </div>
  )
}
