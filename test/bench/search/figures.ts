/** The figures a bench answers, in the shape of the runner's own. */
export type FigureUnit = 'times' | 'ms' | 's' | 'MB'

export interface Figure {
  name: string
  value: number
  unit: FigureUnit
  limit: { atMost: number } | { atLeast: number } | null
  sides?: { ours: number; other: number; unit: FigureUnit }
  samples: number
  note?: string
}

/** The middle value; of an even number, the upper of the two in the middle. */
export function middle(values: readonly number[]): number {
  const sorted = [...values].sort((one, other) => one - other)
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN
}

/** Processor seconds this process and its threads took: other work on the machine costs them little. */
export function processorSeconds(run: () => unknown): number {
  const before = process.cpuUsage()
  run()
  const { user, system } = process.cpuUsage(before)
  return (user + system) / 1e6
}
