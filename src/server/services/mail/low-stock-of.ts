import { itemPagePath } from '@/lib/catalogue-paths'
import { sizeWords } from '@/lib/size-words'
import type { AlertResponse } from '@/schemas/reordering'
import type { Database } from '../../db/connection'
import { findCrib } from '../../db/stores/crib-store'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import type { LowStock } from '../../emails/low-stock-mail'
import { env } from '../../env'

/** What a mail about these alerts of a crib says. */
export async function lowStockOf(
  db: Database,
  cribId: string,
  alerts: readonly AlertResponse[],
): Promise<LowStock> {
  const crib = await findCrib(db, cribId)
  const { shopName, lengthUnit } = await readShopSettings(db)
  const site = env().publicUrl.replace(/\/$/, '')
  return {
    shopName,
    cribName: crib?.name ?? '',
    listUrl: `${site}/alerts`,
    lines: alerts.map((alert) => ({
      ...alert,
      description: alert.description || (alert.size ? sizeWords(alert.size, lengthUnit) : ''),
      url: `${site}${alert.itemKind ? itemPagePath(alert.itemKind, alert.itemId) : '/alerts'}`,
      isOverMeanwhile: alert.closedAt !== null,
    })),
  }
}
