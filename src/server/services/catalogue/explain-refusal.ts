import { AppError } from '@/lib/app-error'
import { databaseErrorCode, isUniqueViolation, ledgerErrorCodes } from '../../db/database-errors'

/** Runs a change of the catalogue and says in a sentence what the database has against it. */
export async function explainingRefusals<Answer>(
  code: string | undefined,
  work: () => Promise<Answer>,
): Promise<Answer> {
  try {
    return await work()
  } catch (error) {
    if (isUniqueViolation(error, 'items_code_idx')) {
      throw new AppError('code-taken', `Another item has the code ${code ?? 'given'}.`, {
        errors: [{ path: 'code', message: 'Another item has this code.' }],
      })
    }
    if (databaseErrorCode(error) === ledgerErrorCodes.stillInUse) {
      throw new AppError('still-in-use', 'There are pieces of this item in stock, in hands or on their way.')
    }
    throw error
  }
}
