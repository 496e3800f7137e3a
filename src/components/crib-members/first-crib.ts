import type { CribChoice } from '@/hooks/use-cribs'

/** The crib one most likely means: one's own, else the one with most members, else the first by code. */
export function firstCrib(cribs: readonly CribChoice[], homeCribId: string | null): CribChoice | undefined {
  const own = cribs.find(({ id }) => id === homeCribId)
  return own ?? cribs.toSorted((one, other) => other.members - one.members)[0]
}
