import { AppError } from '@/lib/app-error'

/**
 * Works through a list, one computation after another. Before each the process does what else is waiting, and where
 * nobody waits for the answer any more the rest is not computed.
 */
export async function inTurns<Item, Result>(
  items: readonly Item[],
  signal: AbortSignal,
  compute: (item: Item, index: number) => Result,
): Promise<Result[]> {
  const results: Result[] = []
  for (const [index, item] of items.entries()) {
    await new Promise((resolve) => setImmediate(resolve))
    if (signal.aborted) throw new AppError('search-cancelled', 'The search was stopped. Nothing was changed.')
    results.push(compute(item, index))
  }
  return results
}
