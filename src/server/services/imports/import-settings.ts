import { currencyDecimals } from '@/lib/format-money'
import { db } from '../../db/connection'
import { readKeptMappings } from '../../db/stores/import-mapping-store'
import type { ImportRecord } from '../../db/stores/import-store'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import type { MappingSources } from '../../imports/column-mapping'
import type { ReadingSettings } from '../../imports/row-reader'

/** By what a file's columns are known and its cells are read: the import's own say, and the shop's. */
export async function importSettings(
  of: Pick<ImportRecord, 'kind' | 'unit' | 'decimals' | 'decimalsOrigin' | 'mapping' | 'defaults'>,
): Promise<{ sources: MappingSources; reading: ReadingSettings }> {
  const shop = await readShopSettings(db())
  const kept = await readKeptMappings(db(), of.kind)
  return {
    sources: { kind: of.kind, set: of.mapping, kept, currency: shop.currency },
    reading: {
      kind: of.kind,
      unit: of.unit,
      decimalComma: of.decimals ? of.decimals === 'comma' : shop.decimalComma,
      decimalsOrigin: of.decimalsOrigin ?? 'shop',
      defaults: of.defaults,
      currencyDecimals: currencyDecimals(shop.currency),
    },
  }
}
