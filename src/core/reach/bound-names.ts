/** What keeps a stick-out from being shorter. */
export type LowerBound = 'clearance' | 'floor' | 'obstacle' | 'flutes' | 'neck' | 'bore' | 'sideLock'

/** What keeps it from being longer. */
export type UpperBound = 'grip' | 'sideLock'
