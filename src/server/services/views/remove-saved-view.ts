import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { removeSavedView as deleteView } from '../../db/stores/saved-view-store'
import { inTransaction } from '../../db/transaction'
import { getRemovableView } from './saved-view-rules'

export async function removeSavedView(actor: Actor, id: string): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const view = await getRemovableView(trx, actor, id)
    await deleteView(trx, view.id)
  })
}
