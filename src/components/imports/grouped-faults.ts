import type { RowProblem } from '@/schemas/import'

export interface FaultGroup {
  column: string
  message: string
  rows: number
}

/** Faults that several rows share, the commonest first: of each how many rows have it. */
export function groupedFaults(rows: readonly { problems: readonly RowProblem[] }[]): FaultGroup[] {
  const groups = new Map<string, FaultGroup>()
  for (const { problems } of rows) {
    const own = new Map(problems.map(({ column, message }) => [`${column}\n${message}`, { column, message }]))
    for (const [key, fault] of own) {
      const group = groups.get(key) ?? { ...fault, rows: 0 }
      group.rows += 1
      groups.set(key, group)
    }
  }
  return [...groups.values()].filter((group) => group.rows > 1).sort((a, b) => b.rows - a.rows)
}
