import { AppError } from '@/lib/app-error'
import { db } from '../../db/connection'
import {
  databaseErrorCode,
  findStockShortage,
  isUniqueViolation,
  ledgerErrorCodes,
  type StockShortage,
} from '../../db/database-errors'
import { readBalancesAt } from '../../db/read-models/item-stock'

/** Runs a posting and says in a sentence what the books have against it. */
export async function explainingMovementRefusals<Answer>(work: () => Promise<Answer>): Promise<Answer> {
  try {
    return await work()
  } catch (error) {
    const shortage = findStockShortage(error)
    if (shortage) throw await notEnough(shortage)
    if (isUniqueViolation(error, 'movements_reverses_id_key')) {
      throw new AppError('already-reversed', 'This movement has been reversed before.')
    }
    switch (databaseErrorCode(error)) {
      case ledgerErrorCodes.pieceNotThere:
        throw new AppError('not-enough-stock', 'This piece is not there, or not in that condition.', {
          errors: [{ path: 'pieceId', message: 'This piece is somewhere else.' }],
        })
      case ledgerErrorCodes.archived:
        throw new AppError('movement-not-possible', 'The item, or where it should go, is archived.')
      case ledgerErrorCodes.pieceRule:
        throw new AppError('movement-not-possible', 'This piece belongs to another item since a merge.')
      case ledgerErrorCodes.halfMerge:
        throw new AppError(
          'movement-not-possible',
          'This is half of a merge, and is not reversed by itself: its pieces are of the other item now.',
        )
      default:
        throw error
    }
  }
}

/** Says what is there in the condition asked for, and in the others, read after the refusal. */
async function notEnough(shortage: StockShortage): Promise<AppError> {
  const { itemId, locationId, condition, held, wanted } = shortage
  const balances = await readBalancesAt(db(), itemId, locationId)
  const detail = `Not enough there: ${held} ${condition}, ${wanted} wanted.`
  return new AppError('not-enough-stock', detail, {
    errors: [{ path: 'quantity', message: detail }],
    extra: { itemId, locationId, condition, available: held, wanted, balances },
  })
}
