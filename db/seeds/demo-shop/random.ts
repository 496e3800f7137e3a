/** A small generator of numbers that look random and are the same at every run (mulberry32, public domain). */
export interface Random {
  /** From 0 up to, not including, 1. */
  next(): number
  /** A whole number from `least` to `most`, both included. */
  whole(least: number, most: number): number
  pick<Value>(values: readonly Value[]): Value
  /** How often something happens that happens `mean` times on average (Poisson, by Knuth's product). */
  times(mean: number): number
}

export function randomFrom(seed: number): Random {
  let state = seed
  function next(): number {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
  }
  return {
    next,
    whole: (least, most) => least + Math.floor(next() * (most - least + 1)),
    pick: (values) => values[Math.floor(next() * values.length)]!,
    times(mean) {
      const limit = Math.exp(-mean)
      let count = 0
      for (let product = next(); product > limit; product *= next()) count += 1
      return count
    },
  }
}
