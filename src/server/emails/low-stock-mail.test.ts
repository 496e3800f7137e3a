import { describe, expect, test } from 'vitest'
import { type LowStockLine, lowStockMail } from './low-stock-mail'

const line: LowStockLine = {
  itemCode: 'EM-6',
  description: 'End mill <6 mm> & "long"',
  places: ['A1', 'B2'],
  onHand: 2,
  position: 3,
  reorderPoint: 4,
  suggestedQuantity: 10,
  supplierName: 'Tolliver Tool Supply',
  supplierPartNumber: 'T-600',
  leadTimeDays: 4,
  url: 'http://crib.example/cutters/7',
  isOverMeanwhile: false,
}
const low = {
  shopName: 'Skerry Lane Machine Works',
  cribName: 'Main crib',
  listUrl: 'http://crib.example/alerts',
  lines: [line],
}

describe('the low-stock mail', () => {
  test('it says what, where, how many, from whom, how many to order, and where to look, in text and HTML', () => {
    const mail = lowStockMail(low)
    expect(mail.subject).toBe('Low stock in Main crib: EM-6')
    for (const body of [mail.text, mail.html]) {
      for (const said of ['EM-6', 'A1, B2', 'Tolliver Tool Supply', 'T-600', '10', line.url, low.listUrl]) {
        expect(body).toContain(said)
      }
    }
    expect(mail.text).toContain(
      'On hand: 2\n  Available and coming: 3\n  Reorder point: 4\n  Suggested order: 10',
    )
  })

  test('it lets no text of the shop become HTML', () => {
    const { html } = lowStockMail({ ...low, cribName: '<script>alert(1)</script>' })
    expect(html).toContain('End mill &lt;6 mm&gt; &amp; &quot;long&quot;')
    expect(html).not.toContain('<script>')
  })

  test('it counts what it tells of, and shows fifty at most', () => {
    const lines = Array.from({ length: 61 }, (_, at) => ({ ...line, itemCode: `EM-${at}` }))
    const mail = lowStockMail({ ...low, lines })
    expect(mail.subject).toBe('Low stock in Main crib: 61 items')
    expect(mail.text).toContain('11 more stand in the list.')
    expect(mail.text).not.toContain('EM-50')
  })

  test('it says what is not known, and what is over', () => {
    const { text } = lowStockMail({
      ...low,
      lines: [{ ...line, places: [], supplierName: null, reorderPoint: null, isOverMeanwhile: true }],
    })
    expect(text).toContain('Bin: none yet')
    expect(text).toContain('Supplier: none named')
    expect(text).toContain('Meanwhile it is above its reorder point again.')
    expect(text).not.toContain('Reorder point:')
  })
})
