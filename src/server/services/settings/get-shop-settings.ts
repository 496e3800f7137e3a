import { db } from '../../db/connection'
import { readShopSettings, type ShopSettings } from '../../db/stores/shop-settings-store'

/** The shop's settings as they are now. */
export function getShopSettings(): Promise<ShopSettings> {
  return readShopSettings(db())
}
