import { AppError } from '@/lib/app-error'
import type { ShopSettingsResponse, UpdateShopSettingsRequest } from '@/schemas/shop-settings'
import type { Actor } from '../../auth/actor'
import { db } from '../../db/connection'
import { createAuditEntry } from '../../db/stores/audit-store'
import {
  readShopSettings,
  updateShopSettings as writeShopSettings,
} from '../../db/stores/shop-settings-store'
import { inTransaction } from '../../db/transaction'

/** Changes the shop's settings; what is worked out afterwards uses them at once. */
export async function updateShopSettings(
  actor: Actor,
  request: UpdateShopSettingsRequest,
): Promise<ShopSettingsResponse> {
  return inTransaction(db(), async (trx) => {
    const before = await readShopSettings(trx)
    const { version, ...change } = request
    if (!(await writeShopSettings(trx, version, change))) {
      throw new AppError('stale-version', 'Someone changed the settings meanwhile.', {
        extra: { current: before },
      })
    }
    const after = await readShopSettings(trx)
    await createAuditEntry(trx, {
      actorId: actor.id,
      action: 'settings-changed',
      entity: 'shop',
      entityId: null,
      before,
      after,
    })
    return after
  })
}
