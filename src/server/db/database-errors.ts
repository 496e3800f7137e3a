/** The SQLSTATEs that Leadline's own triggers raise; the constraint's name says which rule it was. */
export const ledgerErrorCodes = {
  appendOnly: 'LL001',
  writtenByDatabase: 'LL002',
  locationRule: 'LL003',
  wrongPlaces: 'LL010',
  wrongReversal: 'LL011',
  pieceRule: 'LL012',
  archived: 'LL013',
  stockBelowZero: 'LL014',
  pieceNotThere: 'LL015',
  stillInUse: 'LL016',
  reorderPointMoved: 'LL017',
  halfMerge: 'LL018',
  assemblyRule: 'LL019',
} as const

interface DatabaseError {
  code: string
  severity: string
  detail?: string
  constraint?: string
}

/** Told by its fields, not its class: the bundled server and Knex may each hold a copy of pg. */
function isDatabaseError(error: unknown): error is DatabaseError {
  return error instanceof Error && 'severity' in error && 'code' in error
}

/** The SQLSTATE of an error that PostgreSQL answered; undefined for any other error. */
export function databaseErrorCode(error: unknown): string | undefined {
  return isDatabaseError(error) ? error.code : undefined
}

/** The constraint that an error of PostgreSQL names; undefined where it names none. */
export function brokenConstraint(error: unknown): string | undefined {
  return isDatabaseError(error) ? error.constraint : undefined
}

export interface StockShortage {
  itemId: string
  locationId: string
  condition: string
  held: number
  wanted: number
}

/** What is there where a movement would have left less than nothing; null for any other error. */
export function findStockShortage(error: unknown): StockShortage | null {
  if (!isDatabaseError(error) || error.code !== ledgerErrorCodes.stockBelowZero || !error.detail) return null
  return JSON.parse(error.detail)
}

/** Whether PostgreSQL refused this because a row with the same key is there already. */
export function isUniqueViolation(error: unknown, constraint: string): boolean {
  return databaseErrorCode(error) === '23505' && brokenConstraint(error) === constraint
}
