/** What one act changed, so that it can be taken back. */
export type EditStep = RowsStep | FoundStep

/** Row by row: an edit, or a change of the rows selected. */
export interface RowsStep {
  field: string
  /** As a person would say it: `DC of EM-12`, `Maker of 14 cutters`. */
  name: string
  rows: readonly { id: string; before: unknown; after: unknown }[]
}

/** A change of everything found, whose rows the server keeps. */
export interface FoundStep {
  name: string
  foundId: string
}

/** The last acts that can be taken back; older ones are let go. */
export const longestHistory = 50

export function withStep(steps: readonly EditStep[], step: EditStep): EditStep[] {
  return [...steps, step].slice(-longestHistory)
}

/** The same step the other way round: taking this one back makes it again. */
export function reversedStep(step: RowsStep): RowsStep {
  return { ...step, rows: step.rows.map(({ id, before, after }) => ({ id, before: after, after: before })) }
}

/**
 * What takes a step back, or null where a row says otherwise by now: someone else, or a later edit, changed it since.
 */
export function undoChanges(
  step: RowsStep,
  rowOf: (id: string) => { version: number } | undefined,
): { id: string; version: number; [field: string]: unknown }[] | null {
  const changes = step.rows.map(({ id, before, after }) => {
    const row = rowOf(id)
    const now: unknown = row && (row as Record<string, unknown>)[step.field]
    return row && now === after ? { id, version: row.version, [step.field]: before } : null
  })
  return changes.every((change) => change !== null) ? changes : null
}
