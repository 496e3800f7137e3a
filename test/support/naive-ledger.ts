/** A movement as the naive ledger sees it: names of places, no kinds. */
export interface NaiveMovement {
  item: string
  quantity: number
  from: string
  fromCondition: string
  to: string
  toCondition: string
}

export interface NaivePlace {
  isOutside: boolean
  /** The crib whose bin it is; null for any other place. */
  binOfCrib: string | null
}

/**
 * The books kept the simplest way there is: every movement in a list, and every question answered by going through all
 * of it again. Written from the rules alone, to be compared with the database.
 */
export class NaiveLedger {
  private readonly movements: NaiveMovement[] = []

  constructor(private readonly places: ReadonlyMap<string, NaivePlace>) {}

  /** Takes all of them, or none where some place of the shop would hold less than nothing in the end. */
  post(batch: readonly NaiveMovement[]): boolean {
    const before = this.movements.length
    this.movements.push(...batch)
    const ends = batch.map((movement) => [movement.item, movement.from, movement.fromCondition] as const)
    const isShort = ends.some(
      ([item, place, condition]) =>
        !this.places.get(place)?.isOutside && this.balance(item, place, condition) < 0,
    )
    if (isShort) this.movements.length = before
    return !isShort
  }

  balance(item: string, place: string, condition: string): number {
    let sum = 0
    for (const movement of this.movements) {
      if (movement.item !== item) continue
      if (movement.to === place && movement.toCondition === condition) sum += movement.quantity
      if (movement.from === place && movement.fromCondition === condition) sum -= movement.quantity
    }
    return sum
  }

  onHand(item: string, crib: string): number {
    let sum = 0
    for (const [place, { binOfCrib }] of this.places) {
      if (binOfCrib !== crib) continue
      for (const condition of ['new', 'used', 'reground']) sum += this.balance(item, place, condition)
    }
    return sum
  }
}
