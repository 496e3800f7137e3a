import { AppError } from '@/lib/app-error'
import {
  brokenConstraint,
  databaseErrorCode,
  isUniqueViolation,
  ledgerErrorCodes,
} from '../../db/database-errors'

const sentences: Record<string, string> = {
  locations_ranks_of_tree: 'A cabinet stands in a crib, a drawer in a crib or cabinet, a bin in any of them.',
  locations_parent_in_use: 'Where it should stand is archived: bring that back first.',
  locations_parent_in_crib: 'A location stays in its crib.',
}

/** Runs a change of locations and says in a sentence what the database has against it. */
export async function explainingLocationRefusals<Answer>(
  code: string | undefined,
  work: () => Promise<Answer>,
): Promise<Answer> {
  try {
    return await work()
  } catch (error) {
    if (
      isUniqueViolation(error, 'locations_crib_id_code_idx') ||
      isUniqueViolation(error, 'cribs_code_idx')
    ) {
      throw new AppError('code-taken', `The code ${code ?? 'given'} is taken.`, {
        errors: [{ path: 'code', message: 'Another location has this code.' }],
      })
    }
    if (databaseErrorCode(error) === ledgerErrorCodes.stillInUse) {
      throw new AppError(
        'still-in-use',
        'There is stock in it, or something that is still in use stands in it.',
      )
    }
    const sentence = sentences[brokenConstraint(error) ?? '']
    if (sentence)
      throw new AppError('impossible', sentence, { errors: [{ path: 'parentId', message: sentence }] })
    throw error
  }
}
