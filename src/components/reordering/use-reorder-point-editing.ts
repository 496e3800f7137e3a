'use client'

import { type RefObject, useCallback, useRef, useState } from 'react'
import { toast } from '@/components/ui/toast'
import { type ReorderPointChange, saveReorderPoint, saveReorderPoints } from '@/hooks/use-reorder-points'
import { ApiError } from '@/lib/api-client'
import { faultSentence } from '@/lib/field-faults'
import type { ReorderPointResponse, ReorderPointRow } from '@/schemas/reordering'
import { longestHistory, undoChanges } from '../catalogue/edit-history'
import type { EditRefusal } from '../catalogue/edit-refusal'
import { useUndoKey } from '../catalogue/use-undo-key'
import type { CellEdit } from '../grid/parts-list-column'
import type { PartsListHandle } from '../grid/parts-list-grid'
import { editedFields, type ReorderPointField, readTypedChange, typedText } from './reorder-point-fields'

/** What one act changed, row by row, so that it can be taken back. */
interface ReorderPointStep {
  field: ReorderPointField
  name: string
  rows: { id: string; before: unknown; after: unknown }[]
}

const cellKey = (id: string, columnId: string) => `${id} ${columnId}`

/** Each edit is saved as it is made and can be taken back; what is refused stays in its cell with the reason. */
export function useReorderPointEditing(grid: RefObject<PartsListHandle | null>, isOn: boolean) {
  const [refusals, setRefusals] = useState<EditRefusal<ReorderPointRow>[]>([])
  const [cautions, setCautions] = useState<ReorderPointRow[]>([])
  const [steps, setSteps] = useState<ReorderPointStep[]>([])
  const [selected, setSelected] = useState<ReorderPointRow[]>([])
  const [waiting, setWaiting] = useState(0)
  const refused = useRef(new Map<string, EditRefusal<ReorderPointRow>>())
  const known = useRef(new Map<string, ReorderPointRow>())
  const tail = useRef<Promise<void>>(Promise.resolve())

  const cellEdit = useCallback(
    (
      columnId: string,
      choices?: { value: string; label: string }[],
    ): CellEdit<ReorderPointRow> | undefined => {
      const found = editedFields.find(({ field }) => field === columnId)
      if (!found) return undefined
      return {
        isEditable: () => true,
        text: (row) => typedText(row, found.field),
        refusal: (row) => refused.current.get(cellKey(row.id, columnId)),
        ...(choices ? { choices } : {}),
      }
    },
    [],
  )

  function setRefusal(key: string, refusal: EditRefusal<ReorderPointRow> | null) {
    if (refusal) refused.current.set(key, refusal)
    else refused.current.delete(key)
    setRefusals([...refused.current.values()])
  }

  /** The newest of the row given and the one that came back last. */
  function newest(row: ReorderPointRow): ReorderPointRow {
    const last = known.current.get(row.id)
    return last && last.version > row.version ? last : row
  }

  function show(rows: readonly ReorderPointRow[]) {
    for (const row of rows) known.current.set(row.id, row)
    grid.current?.showRows(rows)
  }

  /** Shows what was saved, with a word of caution about the rows that want one. */
  function showSaved(rows: readonly ReorderPointRow[]) {
    show(rows)
    const ids = new Set(rows.map(({ id }) => id))
    setCautions((past) => [
      ...past.filter(({ id }) => !ids.has(id)),
      ...rows.filter(({ caution }) => caution),
    ])
  }

  /** One after another, so that an edit has the version the one before it made. */
  function enqueue(act: () => Promise<void>) {
    setWaiting((count) => count + 1)
    tail.current = tail.current.then(act).finally(() => setWaiting((count) => count - 1))
  }

  function keepStep(
    field: ReorderPointField,
    name: string,
    before: readonly ReorderPointRow[],
    after: readonly ReorderPointRow[],
  ) {
    const rows = after.flatMap((row, index) => {
      const past = before[index]
      return past && past.version !== row.version
        ? [{ id: row.id, before: past[field], after: row[field] }]
        : []
    })
    if (rows.length > 0) setSteps((past) => [...past, { field, name, rows }].slice(-longestHistory))
  }

  function handleEdit(row: ReorderPointRow, columnId: string, text: string) {
    const field = editedFields.find((one) => one.field === columnId)
    if (!field) return
    const key = cellKey(row.id, columnId)
    const refuse = (message: string, isStale = false) => {
      setRefusal(key, { row, columnId, text, message, isStale })
      grid.current?.redrawRow(row.id)
    }
    const read = readTypedChange(field, text)
    if (!read.ok) return refuse(read.message)
    enqueue(async () => {
      const base = newest(row)
      try {
        const after = await saveReorderPoint(base, read.change)
        setRefusal(key, null)
        showSaved([after])
        keepStep(field.field, `${field.label} of ${row.itemCode}`, [base], [after])
      } catch (error) {
        const [current] = currentOf(error)
        if (current) show([{ ...base, ...current }])
        refuse(refusalMessage(error, field.field), current !== undefined)
      }
    })
  }

  function takeBack({ row, columnId }: EditRefusal<ReorderPointRow>) {
    setRefusal(cellKey(row.id, columnId), null)
    grid.current?.redrawRow(row.id)
  }

  function undo() {
    const step = steps.at(-1)
    if (!step) return
    setSteps((past) => past.filter((one) => one !== step))
    enqueue(async () => {
      try {
        const changes = undoChanges(step, (id) => known.current.get(id))
        if (!changes) throw new Error('It was changed again since.')
        const former = changes.flatMap(({ id, version: _, ...change }) => {
          const row = known.current.get(id)
          return row ? [{ row, change: change as ReorderPointChange }] : []
        })
        showSaved(await saveReorderPoints(former))
        toast.success(`${step.name} is as it was.`)
      } catch (error) {
        toast.error(`${step.name} was not taken back. ${faultSentence(error)}`)
        grid.current?.refresh()
      }
    })
  }

  /** One field of all rows selected, all of them or none; throws what stands against it. */
  async function changeSelected(field: ReorderPointField, change: ReorderPointChange): Promise<void> {
    const before = selected.map(newest)
    try {
      const after = await saveReorderPoints(before.map((row) => ({ row, change })))
      showSaved(after)
      const label = editedFields.find((one) => one.field === field)?.label ?? field
      keepStep(field, `${label} of ${after.length} rows`, before, after)
    } catch (error) {
      const rowOf = new Map(before.map((row) => [row.id, row]))
      show(
        currentOf(error).flatMap((current) => {
          const row = rowOf.get(`${current.itemId}-${current.cribId}`)
          return row ? [{ ...row, ...current }] : []
        }),
      )
      throw error
    }
  }

  useUndoKey(isOn, undo)
  return {
    ...{ cellEdit, handleEdit, takeBack, undo, changeSelected, selected, setSelected },
    ...{ refusals, cautions, steps, isBusy: waiting > 0 },
    leaveCautions: () => setCautions([]),
  }
}

export type ReorderPointEditing = ReturnType<typeof useReorderPointEditing>

/** Why one field's change was not taken, in words that stand beside its cell. */
function refusalMessage(error: unknown, field: ReorderPointField): string {
  if (!(error instanceof ApiError)) return faultSentence(error)
  if (error.code === 'stale-version')
    return 'Someone else changed this row meanwhile; it is shown as it is now.'
  const own = error.fieldProblems.find(({ path }) => path === field) ?? error.fieldProblems[0]
  return own?.message ?? error.message
}

/** What is there now, which a refusal of a stale edit brings along: one row, or those of many. */
function currentOf(error: unknown): ReorderPointResponse[] {
  if (!(error instanceof ApiError)) return []
  const current = error.problem?.current as ReorderPointResponse | ReorderPointResponse[] | null | undefined
  return current ? [current].flat() : []
}
