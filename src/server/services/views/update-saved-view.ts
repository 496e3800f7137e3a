import { AppError } from '@/lib/app-error'
import type { SavedViewResponse, UpdateSavedViewRequest } from '@/schemas/saved-view'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { updateSavedView as writeView } from '../../db/stores/saved-view-store'
import { inTransaction } from '../../db/transaction'
import { explainingTakenName, getOwnView, readOwnView, visibleView } from './saved-view-rules'

/** Renames a view, shares it or not, or has it show something else. */
export async function updateSavedView(
  actor: Actor,
  id: string,
  { version, ...fields }: UpdateSavedViewRequest,
): Promise<SavedViewResponse> {
  await explainingTakenName(fields.name, () =>
    inTransaction(db(), async (trx) => {
      const view = await getOwnView(trx, actor, id)
      if (view.version !== version) {
        throw new AppError('stale-version', 'This view was changed elsewhere meanwhile.', {
          extra: { current: visibleView(actor, view) },
        })
      }
      await writeView(trx, id, fields)
    }),
  )
  return readOwnView(actor, id)
}
