/**
 * The least so many of any number of items, by an order in which no two are alike.
 *
 * A heap with the greatest on top, so that an item that can't enter costs one comparison.
 *
 * @example
 * (() => {
 *   const list = new BestList(2, (a, b) => a - b)
 *   for (const item of [3, 1, 2]) list.offer(item)
 *   return list.sorted()
 * })() // => [1, 2]
 */
export class BestList<Item> {
  private readonly heap: Item[] = []

  constructor(
    private readonly size: number,
    private readonly compare: (a: Item, b: Item) => number,
  ) {}

  /** The greatest of a full list; null while there is room. */
  get last(): Item | null {
    return this.heap.length < this.size ? null : (this.heap[0] ?? null)
  }

  get canTakeAny(): boolean {
    return this.size > 0
  }

  offer(item: Item): void {
    if (this.size === 0) return
    if (this.heap.length < this.size) {
      this.heap.push(item)
      this.rise(this.heap.length - 1)
    } else if (this.compare(item, this.heap[0]!) < 0) {
      this.heap[0] = item
      this.sink(0)
    }
  }

  /** Least first. */
  sorted(): Item[] {
    return [...this.heap].sort(this.compare)
  }

  private rise(from: number): void {
    let at = from
    while (at > 0) {
      const above = (at - 1) >> 1
      if (this.compare(this.heap[at]!, this.heap[above]!) <= 0) return
      this.swap(at, above)
      at = above
    }
  }

  private sink(from: number): void {
    let at = from
    for (;;) {
      let greatest = at
      for (const below of [2 * at + 1, 2 * at + 2])
        if (below < this.heap.length && this.compare(this.heap[below]!, this.heap[greatest]!) > 0)
          greatest = below
      if (greatest === at) return
      this.swap(at, greatest)
      at = greatest
    }
  }

  private swap(one: number, other: number): void {
    const item = this.heap[one]!
    this.heap[one] = this.heap[other]!
    this.heap[other] = item
  }
}
