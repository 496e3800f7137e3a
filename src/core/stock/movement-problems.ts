import type { Condition, LocationKind, MovementKind } from './kinds'

export interface MovementEnd {
  kind: LocationKind
  /** Null for what is in no crib. */
  cribId: string | null
}

export interface MovementProblem {
  path: 'kind' | 'fromLocationId' | 'toLocationId'
  message: string
}

const shelves: readonly LocationKind[] = ['bin']
const hands: readonly LocationKind[] = ['person', 'machine']
const anywhere: readonly LocationKind[] = ['bin', 'person', 'machine', 'regrind', 'inTransit']

interface Course {
  /** Pairs of ends it may run between, in words beside each. */
  runs: readonly { from: readonly LocationKind[]; to: readonly LocationKind[] }[]
  fromMessage: string
  toMessage: string
}

/** Movements a person may post by hand; the others come from their documents. */
const courses = {
  issue: {
    runs: [{ from: shelves, to: hands }],
    fromMessage: 'An issue takes from a bin.',
    toMessage: 'An issue goes to a person or a machine.',
  },
  return: {
    runs: [{ from: hands, to: shelves }],
    fromMessage: 'A return comes from a person or a machine.',
    toMessage: 'A return goes to a bin.',
  },
  relocation: {
    runs: [{ from: shelves, to: shelves }],
    fromMessage: 'A relocation takes from a bin.',
    toMessage: 'A relocation goes to a bin.',
  },
  transfer: {
    runs: [
      { from: shelves, to: ['inTransit'] },
      { from: ['inTransit'], to: shelves },
    ],
    fromMessage: 'A transfer leaves a bin, or arrives from a place in transit.',
    toMessage: 'A transfer from a bin goes to a place in transit, and from there to a bin.',
  },
  regrind: {
    runs: [
      { from: shelves, to: ['regrind'] },
      { from: ['regrind'], to: shelves },
    ],
    fromMessage: 'A regrind leaves a bin, or comes back from the grinder.',
    toMessage: 'A regrind goes from a bin to the grinder, and from there to a bin.',
  },
  scrap: {
    runs: [{ from: anywhere, to: ['scrap'] }],
    fromMessage: 'Scrap comes from a place in the shop.',
    toMessage: 'Scrap goes to no place of the shop: leave this out.',
  },
} as const satisfies Partial<Record<MovementKind, Course>>

export type PostedMovementKind = keyof typeof courses

/** Whether a person may post this kind; receipts and adjustments come from their documents, reversals have their own call. */
export function isPostedByHand(kind: MovementKind): kind is PostedMovementKind {
  return kind in courses
}

/**
 * What is wrong with where a movement runs, or null: its kind fixes between which kinds of place it may.
 *
 * Shapes     Two ends, each with its kind and crib.
 * Result     The first fault, with the field it belongs to.
 * Source     stock.md, movements and rule 7; the database's trigger says the same.
 *
 * @example
 * movementProblem('issue', { kind: 'bin', cribId: '1' }, { kind: 'bin', cribId: '1' })?.path // => 'toLocationId'
 */
export function movementProblem(
  kind: PostedMovementKind,
  from: MovementEnd,
  to: MovementEnd,
): MovementProblem | null {
  const course: Course = courses[kind]
  const runs = course.runs.filter((run) => run.from.includes(from.kind))
  if (runs.length === 0) return { path: 'fromLocationId', message: course.fromMessage }
  if (!runs.some((run) => run.to.includes(to.kind)))
    return { path: 'toLocationId', message: course.toMessage }
  if (kind === 'relocation' && from.cribId !== to.cribId) {
    return { path: 'toLocationId', message: 'That bin is in another crib: a relocation stays in its crib.' }
  }
  return null
}

/**
 * Whether two ends are one: same place, same condition. Such a movement would move nothing.
 *
 * @example
 * isNoMove({ locationId: '4', condition: 'new' }, { locationId: '4', condition: 'used' }) // => false
 */
export function isNoMove(
  from: { locationId: string; condition: Condition },
  to: { locationId: string; condition: Condition },
): boolean {
  return from.locationId === to.locationId && from.condition === to.condition
}
