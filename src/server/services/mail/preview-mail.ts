import { db } from '../../db/connection'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { type LowStockLine, lowStockMail } from '../../emails/low-stock-mail'
import type { MailContent } from '../../emails/mail-content'
import { env } from '../../env'

const sample: Omit<LowStockLine, 'url'> = {
  itemCode: 'EM-6-3',
  description: 'Square end mill, 6 mm, 3 flutes',
  places: ['A-12'],
  onHand: 2,
  position: 2,
  reorderPoint: 4,
  suggestedQuantity: 10,
  supplierName: 'Tolliver Tool Supply',
  supplierPartNumber: 'T-6003',
  leadTimeDays: 4,
  isOverMeanwhile: false,
}

/** Every template with made-up figures, under the shop's own name. */
export async function previewMails(): Promise<{ name: string; content: MailContent }[]> {
  const { shopName } = await readShopSettings(db())
  const listUrl = `${env().publicUrl.replace(/\/$/, '')}/alerts`
  const first = { ...sample, url: listUrl }
  const second = {
    ...first,
    itemCode: 'DR-8.5',
    description: 'Drill, 8.5 mm',
    places: [],
    onHand: 0,
    position: 0,
    supplierName: null,
    isOverMeanwhile: true,
  }
  const low = { shopName, cribName: 'Main crib', listUrl }
  return [
    { name: 'One item is low', content: lowStockMail({ ...low, lines: [first] }) },
    { name: 'Several items are low', content: lowStockMail({ ...low, lines: [first, second] }) },
  ]
}
