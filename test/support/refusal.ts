import { expect } from 'vitest'
import { brokenConstraint, databaseErrorCode } from '@/server/db/database-errors'

/** Expects PostgreSQL to refuse, with this SQLSTATE and, where one is named, by this constraint. */
export async function expectRefusal(
  work: PromiseLike<unknown>,
  code: string,
  constraint?: string,
): Promise<void> {
  let error: unknown = 'nothing was refused'
  try {
    await work
  } catch (thrown) {
    error = thrown
  }
  expect(databaseErrorCode(error), String(error)).toBe(code)
  if (constraint) expect(brokenConstraint(error)).toBe(constraint)
}
