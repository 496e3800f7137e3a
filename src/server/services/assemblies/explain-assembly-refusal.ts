import { AppError } from '@/lib/app-error'
import { isUniqueViolation } from '../../db/database-errors'
import { explainingMovementRefusals } from '../stock/explain-movement-refusal'

/** Runs a change of an assembly and says in a sentence what books and machines have against it. */
export async function explainingAssemblyRefusals<Answer>(work: () => Promise<Answer>): Promise<Answer> {
  try {
    return await explainingMovementRefusals(work)
  } catch (error) {
    if (isUniqueViolation(error, 'assemblies_one_of_pocket_idx'))
      throw taken('pocket', 'Another assembly is in this pocket: take it out first.')
    if (isUniqueViolation(error, 'assemblies_one_of_tool_number_idx'))
      throw taken('toolNumber', 'Another assembly in this machine has this tool number.')
    if (isUniqueViolation(error, 'assembly_parts_one_place_of_piece_idx'))
      throw taken('parts', 'Another built assembly has this piece.')
    throw error
  }
}

function taken(path: string, message: string): AppError {
  return new AppError('wrong-state', message, { errors: [{ path, message }] })
}
