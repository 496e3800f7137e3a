import type { Lab } from './lab'

/** One file `test/bench/<name>.bench.ts` exports one of these as `bench`; `make bench ONLY=<name>` runs it alone. */
export interface Bench {
  name: string
  /** Measures, and answers one figure a limit. What it starts, it starts through the lab, which ends it. */
  run(lab: Lab): Promise<Figure[]>
}

/** KB and MB are of 1024, as where the limits were first measured. */
export type FigureUnit = 'times' | 'ms' | 's' | 'KB' | 'MB' | 'points' | '/s'

export type Limit = { atMost: number } | { atLeast: number }

export interface Figure {
  /** What was measured, as it stands in the table. */
  name: string
  value: number
  unit: FigureUnit
  /** Null where the figure is reported alone. */
  limit: Limit | null
  /** Of a ratio: what is ours and what it is held against, measured in turn within this run. */
  sides?: { ours: number; other: number; unit: FigureUnit }
  /** How many measurements the figure was made from; of a ratio, those of each side. */
  samples: number
  note?: string
}

/** A ratio and its two sides in one. */
export function ratioFigure(
  name: string,
  sides: NonNullable<Figure['sides']>,
  atMost: number,
  samples: number,
  note?: string,
): Figure {
  const value = sides.ours / sides.other
  return { name, value, unit: 'times', limit: { atMost }, sides, samples, ...(note ? { note } : {}) }
}

export function isWithin({ value, limit }: Pick<Figure, 'value' | 'limit'>): boolean {
  if (limit === null) return true
  return 'atMost' in limit ? value <= limit.atMost : value >= limit.atLeast
}
