'use client'

import { type RefObject, useCallback, useRef, useState } from 'react'
import type { CellEdit } from '@/components/grid/parts-list-column'
import type { PartsListHandle } from '@/components/grid/parts-list-grid'
import { type ReorderPointChange, saveReorderPoint } from '@/hooks/use-reorder-points'
import { ApiError } from '@/lib/api-client'
import { faultSentence } from '@/lib/field-faults'
import type { ReorderPointResponse, ReorderPointRow } from '@/schemas/reordering'
import { type EditedField, editedFields, readTypedChange, typedText } from './reorder-point-fields'

export interface Refusal {
  row: ReorderPointRow
  field: EditedField
  text: string
  message: string
}

/** Each edit is saved as it is made; what is refused stays in its cell with the reason until it is mended. */
export function useReorderPointEditing(grid: RefObject<PartsListHandle | null>) {
  const [refusals, setRefusals] = useState<Refusal[]>([])
  const [selected, setSelected] = useState<ReorderPointRow[]>([])
  const refused = useRef(new Map<string, Refusal>())
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
        refusal: (row) => refused.current.get(keyOf(row, columnId)),
        ...(choices ? { choices } : {}),
      }
    },
    [],
  )

  function note(row: ReorderPointRow, columnId: string, refusal: Refusal | null) {
    const key = keyOf(row, columnId)
    if (refusal) refused.current.set(key, refusal)
    else refused.current.delete(key)
    setRefusals([...refused.current.values()])
    grid.current?.redrawRow(row.id)
  }

  async function save(row: ReorderPointRow, change: ReorderPointChange): Promise<void> {
    const last = known.current.get(row.id)
    const base = last && last.version > row.version ? last : row
    try {
      show(await saveReorderPoint(base, change))
    } catch (error) {
      const current = currentOf(error)
      if (current) show({ ...base, ...current })
      throw error
    }
  }

  function show(row: ReorderPointRow) {
    known.current.set(row.id, row)
    grid.current?.showRows([row])
  }

  function handleEdit(row: ReorderPointRow, columnId: string, text: string) {
    const field = editedFields.find((one) => one.field === columnId)
    if (!field) return
    const refuse = (message: string) => note(row, columnId, { row, field, text, message })
    const read = readTypedChange(field, text)
    if (!read.ok) return refuse(read.message)
    tail.current = tail.current.then(() =>
      save(row, read.change).then(
        () => note(row, columnId, null),
        (error: unknown) => refuse(sentenceOf(error)),
      ),
    )
  }

  /** One field of all rows selected, one row after another; answers what was not taken. */
  async function changeSelected(
    change: ReorderPointChange,
  ): Promise<{ row: ReorderPointRow; message: string }[]> {
    const faults: { row: ReorderPointRow; message: string }[] = []
    for (const row of selected) {
      try {
        await save(row, change)
      } catch (error) {
        faults.push({ row, message: sentenceOf(error) })
      }
    }
    return faults
  }

  return { cellEdit, handleEdit, changeSelected, selected, setSelected, refusals, takeBack: note }
}

function keyOf(row: ReorderPointRow, columnId: string): string {
  return `${row.id} ${columnId}`
}

function sentenceOf(error: unknown): string {
  return error instanceof ApiError ? (error.fieldProblems[0]?.message ?? error.message) : faultSentence(error)
}

function currentOf(error: unknown): ReorderPointResponse | null {
  if (!(error instanceof ApiError) || error.code !== 'stale-version') return null
  return (error.problem?.current as ReorderPointResponse | null | undefined) ?? null
}
