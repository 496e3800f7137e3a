'use client'

import { type RefObject, useCallback, useMemo, useRef, useState } from 'react'
import type { CellEdit } from '@/components/grid/parts-list-column'
import type { PartsListHandle } from '@/components/grid/parts-list-grid'
import { useShop } from '@/components/layout/shop-context'
import { toast } from '@/components/ui/toast'
import { type ItemChange, rehearseItems, useChangeItems } from '@/hooks/use-change-items'
import { useChangeFound } from '@/hooks/use-found-changes'
import { useSaveItem } from '@/hooks/use-save-item'
import { faultSentence } from '@/lib/field-faults'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import {
  type EditStep,
  type FoundStep,
  type RowsStep,
  reversedStep,
  undoChanges,
  withStep,
} from './edit-history'
import { currentRow, type EditRefusal, refusalMessage } from './edit-refusal'
import type { ItemField } from './item-form-definition'
import { formFields, type Manner, readTypedField, typedText } from './typed-values'
import { useUndoKey } from './use-undo-key'

export interface GridEditing<Row> {
  /** What can be typed into a column, or undefined. */
  cellEdit: (columnId: string) => CellEdit<Row> | undefined
  fields: readonly ItemField[]
  refusals: readonly EditRefusal<Row>[]
  selected: readonly Row[]
  isBusy: boolean
  handleEdit: (row: Row, columnId: string, text: string) => void
  handleSelect: (rows: Row[]) => void
  takeBack: (refusal: EditRefusal<Row>) => void
  /** What was typed and not taken goes first, then the last edit. */
  undo: () => void
  undoName: string | null
  redo: () => void
  redoName: string | null
  /** How many values are not taken, once the last edit has its answer. */
  settledRefusals: () => Promise<number>
  /** How many of the rows selected a value would change; throws what stands against it. */
  rehearseSelected: (field: ItemField, value: unknown) => Promise<number>
  /** One field of all rows selected; throws what stands against it. */
  changeSelected: (field: ItemField, value: unknown) => Promise<void>
  /** Everything found was changed, or that was taken back, elsewhere on the page. */
  noteFound: (step: FoundStep) => void
  forgetFound: (foundId: string) => void
}

function fieldValue(row: object, field: string): unknown {
  return (row as Record<string, unknown>)[field]
}

const cellKey = (id: string, columnId: string) => `${id} ${columnId}`

/** Editing in the list: each edit is saved as it is made, and can be taken back by a further one. */
export function useGridEditing<Row extends CatalogueRow>(
  definition: CatalogueDefinition<Row>,
  grid: RefObject<PartsListHandle | null>,
  isOn: boolean,
): GridEditing<Row> {
  const manner: Manner = useShop()
  const save = useSaveItem<Row>(definition.kind)
  const changeItems = useChangeItems<Row>(definition.kind)
  const changeFound = useChangeFound(definition.kind)
  const [refusals, setRefusals] = useState<EditRefusal<Row>[]>([])
  const [steps, setSteps] = useState<EditStep[]>([])
  const [undone, setUndone] = useState<RowsStep[]>([])
  const [selected, setSelected] = useState<Row[]>([])
  const [waiting, setWaiting] = useState(0)
  const refused = useRef(new Map<string, EditRefusal<Row>>())
  const known = useRef(new Map<string, Row>())
  const tail = useRef<Promise<void>>(Promise.resolve())
  const fields = useMemo(
    () => formFields(definition.form).filter(({ path }) => !path.includes('.')),
    [definition],
  )

  const cellEdit = useCallback(
    (columnId: string): CellEdit<Row> | undefined => {
      const field = fields.find(({ path }) => path === columnId)
      if (!field) return undefined
      return {
        // A line would lose the breaks of a text of several.
        isEditable: (row) =>
          (field.isShown?.(row) ?? true) && !String(fieldValue(row, columnId) ?? '').includes('\n'),
        text: (row) => typedText(field, fieldValue(row, columnId), manner),
        refusal: (row) => refused.current.get(cellKey(row.id, columnId)),
        ...(field.options ? { choices: field.options } : {}),
      }
    },
    [fields, manner],
  )

  /** The newest of the row given and the one that came back last. */
  function newest(row: Row): Row {
    const last = known.current.get(row.id)
    return last && last.version > row.version ? last : row
  }

  function show(rows: readonly Row[]) {
    for (const row of rows) known.current.set(row.id, row)
    grid.current?.showRows(rows)
  }

  function setRefusal(key: string, refusal: EditRefusal<Row> | null) {
    if (refusal) refused.current.set(key, refusal)
    else refused.current.delete(key)
    setRefusals([...refused.current.values()])
  }

  /** One after another, so that an edit has the version the one before it made. */
  function enqueue(act: () => Promise<void>) {
    setWaiting((count) => count + 1)
    tail.current = tail.current.then(act).finally(() => setWaiting((count) => count - 1))
  }

  function handleEdit(row: Row, columnId: string, text: string) {
    const field = fields.find(({ path }) => path === columnId)
    if (!field) return
    const key = cellKey(row.id, columnId)
    const refuse = (message: string, isStale = false) => {
      setRefusal(key, { row, columnId, text, message, isStale })
      grid.current?.redrawRow(row.id)
    }
    const read = readTypedField(field, text, manner)
    if (!read.ok) return refuse(read.message)
    enqueue(async () => {
      const base = newest(row)
      try {
        const after = await save({ existing: base, body: { [columnId]: read.value } })
        setRefusal(key, null)
        show([after])
        const change = {
          id: row.id,
          before: fieldValue(base, columnId),
          after: fieldValue(after, columnId),
        }
        const name = `${field.symbol ?? field.label} of ${after.code}`
        if (after.version !== base.version) noteStep({ field: columnId, name, rows: [change] })
      } catch (error) {
        const current = currentRow<Row>(error)
        if (current) show([current])
        refuse(refusalMessage(error, field, fields), current !== null)
      }
    })
  }

  function takeBack({ row, columnId }: EditRefusal<Row>) {
    setRefusal(cellKey(row.id, columnId), null)
    grid.current?.redrawRow(row.id)
  }

  function noteStep(step: EditStep) {
    setSteps((past) => withStep(past, step))
    setUndone([])
  }

  function undo() {
    const refusal = refusals.at(-1)
    if (refusal) return takeBack(refusal)
    const step = steps.at(-1)
    if (!step) return
    setSteps((past) => past.filter((one) => one !== step))
    enqueue(async () => {
      try {
        if ('foundId' in step) await undoFound(step)
        else {
          await undoRows(step)
          setUndone((past) => [...past, step])
        }
        toast.success(`${step.name} is as it was.`)
      } catch (error) {
        toast.error(`${step.name} was not taken back. ${faultSentence(error)}`)
        grid.current?.refresh()
      }
    })
  }

  function redo() {
    const step = undone.at(-1)
    if (!step) return
    setUndone((past) => past.filter((one) => one !== step))
    enqueue(async () => {
      try {
        await undoRows(reversedStep(step))
        setSteps((past) => withStep(past, step))
      } catch (error) {
        toast.error(`${step.name} was not made again. ${faultSentence(error)}`)
        grid.current?.refresh()
      }
    })
  }

  async function settledRefusals(): Promise<number> {
    await tail.current
    return refused.current.size
  }

  async function undoRows(step: RowsStep): Promise<void> {
    const changes = undoChanges(step, (id) => known.current.get(id))
    if (!changes) throw new Error('It was changed again since.')
    show(await sendChanges(changes))
  }

  async function undoFound({ foundId }: FoundStep): Promise<void> {
    await changeFound.undo(foundId)
    grid.current?.refresh()
  }

  async function sendChanges(changes: ItemChange[]): Promise<Row[]> {
    const [only] = changes
    if (!only || changes.length > 1) return changeItems(changes)
    const { id, version, ...body } = only
    return [await save({ existing: { id, version }, body })]
  }

  const selectedChanges = (field: ItemField, value: unknown): ItemChange[] =>
    selected.map(newest).map(({ id, version }) => ({ id, version, [field.path]: value }))

  async function rehearseSelected(field: ItemField, value: unknown): Promise<number> {
    const rows = await rehearseItems<Row>(definition.kind, selectedChanges(field, value))
    return rows.filter((row) => (fieldValue(row, field.path) ?? '') !== (value ?? '')).length
  }

  async function changeSelected(field: ItemField, value: unknown): Promise<void> {
    const before = selected.map(newest)
    try {
      const after = await changeItems(selectedChanges(field, value))
      show(after)
      const rows = after.map((row, index) => ({
        id: row.id,
        before: fieldValue(before[index] ?? row, field.path),
        after: fieldValue(row, field.path),
      }))
      const name = `${field.label} of ${rows.length} ${rows.length === 1 ? definition.one : definition.many}`
      noteStep({ field: field.path, name, rows })
    } catch (error) {
      grid.current?.refresh()
      throw error
    }
  }

  function noteFound(step: FoundStep) {
    noteStep(step)
    grid.current?.refresh()
  }

  function forgetFound(foundId: string) {
    setSteps((past) => past.filter((step) => !('foundId' in step) || step.foundId !== foundId))
    grid.current?.refresh()
  }

  useUndoKey(isOn, undo, redo)
  const refusedLast = refusals.at(-1)
  const refusedIn = fields.find(({ path }) => path === refusedLast?.columnId)?.label
  const undoName = refusedLast ? `${refusedLast.text} typed in ${refusedIn}` : (steps.at(-1)?.name ?? null)
  return {
    ...{ cellEdit, fields, refusals, selected, isBusy: waiting > 0, settledRefusals },
    ...{ undo, undoName, redo, redoName: undone.at(-1)?.name ?? null },
    ...{
      handleEdit,
      handleSelect: setSelected,
      takeBack,
      rehearseSelected,
      changeSelected,
      noteFound,
      forgetFound,
    },
  }
}
