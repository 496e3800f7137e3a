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
    refuseCrossedBands({ ...before.cutting, ...change.cutting })
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

/** The caution comes before the limit. */
function refuseCrossedBands(cutting: {
  stickOutCautionRatio?: number | undefined
  stickOutLimitRatio?: number | undefined
}): void {
  const { stickOutCautionRatio = 0, stickOutLimitRatio = Number.POSITIVE_INFINITY } = cutting
  if (stickOutCautionRatio <= stickOutLimitRatio) return
  const message = 'The limit is below where care begins.'
  throw new AppError('impossible', message, { errors: [{ path: 'cutting.stickOutLimitRatio', message }] })
}
