/** The value that a share of all values does not exceed, by nearest rank: an actual measurement, nothing between two. */
export function percentile(values: readonly number[], share: number): number {
  if (!(share > 0 && share <= 1)) throw new RangeError('A percentile needs a share above 0 and at most 1.')
  const sorted = [...values].sort((one, other) => one - other)
  // Without the tiny step back, 0.95 × 100 would be a hair above 95 and mean the 96th.
  const found = sorted[Math.ceil(share * sorted.length - 1e-9) - 1]
  if (found === undefined) throw new RangeError('A percentile of no values.')
  return found
}

/** The middle value; of an even number, the mean of the two in the middle. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((one, other) => one - other)
  const upper = sorted[Math.floor(sorted.length / 2)]
  const lower = sorted[Math.floor((sorted.length - 1) / 2)]
  if (upper === undefined || lower === undefined) throw new RangeError('A median of no values.')
  return (lower + upper) / 2
}
