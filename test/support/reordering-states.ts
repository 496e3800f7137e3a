import { expect, type Page } from '@playwright/test'
import type { Knex } from 'knex'
import { type PageState, refused, shows, withoutServer } from './accessible-states'
import type { ApiClient } from './api'
import { uniqueCode } from './api'
import { createCutter, createShelf, putOnShelf } from './api-stock'

interface ReorderingRows {
  cribId: string
  code: string
  supplierName: string
  mailId: string
}

/** An item that is low in a crib without members, its supplier, a mail that was kept and one that could not go. */
export async function createReorderingRows(db: Knex, crib: ApiClient): Promise<ReorderingRows> {
  const shelf = await createShelf(crib)
  const code = uniqueCode('STATE')
  const itemId = await createCutter(crib, { code, description: 'Square end mill, 6 mm, 3 flutes' })
  await putOnShelf(db, crib, { itemId, binId: shelf.binId, quantity: 2 })
  const supplierName = uniqueCode('Tallow Supply')
  const supplier = await crib.post('/api/suppliers', { name: supplierName, leadTimeDays: 6 })
  await crib.send('PUT', `/api/reorder-points/${itemId}/${shelf.cribId}`, {
    body: { reorderPoint: 4, orderUpTo: 4, packSize: 5, supplierId: supplier.body.id },
  })
  return {
    cribId: shelf.cribId,
    code,
    supplierName,
    mailId: await createMails(db, shelf.cribId, crib.user.id),
  }
}

async function createMails(db: Knex, cribId: string, userId: string): Promise<string> {
  const recipient = `${uniqueCode('reader').toLowerCase()}@leadline.example`
  const newest = await db('outbox').max('event_id as last').first()
  await db('outbox').insert({
    ...{
      kind: 'low_stock',
      event_id: Number(newest?.last ?? 0) + 1_000_000_000,
      crib_id: cribId,
      user_id: userId,
    },
    ...{ recipient, attempts: 3, next_attempt_at: '2090-01-01T00:00:00Z' },
    last_error: 'The server refused: 550 no such mailbox.',
  })
  const source = [
    `To: ${recipient}`,
    'Subject: Low stock in a crib of the tests: EM-6-3',
    'Content-Type: text/html; charset=utf-8',
    '',
    '<p>One item has fallen to its reorder point.</p>',
  ].join('\r\n')
  const [mail] = await db('caught_mails')
    .insert({ message_id: null, recipients: [recipient], source: Buffer.from(source) })
    .returning('id')
  return mail.id
}

const chooses = (cribId: string, then: (page: Page) => Promise<unknown>) => async (page: Page) => {
  await page.getByRole('combobox', { name: 'Crib' }).selectOption(cribId)
  await then(page)
}

/** Low stock, reorder points, suppliers, members and mail, with their dialogs and faults. */
export function reorderingStates({ cribId, code, supplierName, mailId }: ReorderingRows): PageState[] {
  const state = (role: PageState['role'], path: string, name: string, reach: PageState['reach']) => ({
    ...{ role, path, name, reach },
  })
  const points = `/reorder-points?cribId=${cribId}`
  return [
    state('machinist', '/alerts', 'low stock, read only', chooses(cribId, shows(code))),
    state('machinist', points, 'reorder points, read only', shows(code)),
    state('machinist', '/suppliers', 'suppliers, read only', shows(supplierName)),

    state('cribManager', '/alerts', 'low stock', chooses(cribId, shows('has no members'))),
    state('cribManager', '/alerts', 'low stock, failed', withoutServer(/\/api\/alerts\?.*limit=500/)),
    state('cribManager', '/alerts', 'low stock, nothing', async (page) => {
      await page.route(/\/api\/alerts\?.*limit=500/, (route) =>
        route.fulfill({ json: { rows: [], nextCursor: null, total: 0 } }),
      )
      await page.reload()
      await shows('Nothing is low')(page)
    }),
    state('cribManager', points, 'reorder points', shows(code)),
    state(
      'cribManager',
      `${points}&q=zzzzzzzzzz`,
      'reorder points, nothing found',
      shows('No reorder point matches'),
    ),
    state('cribManager', points, 'reorder points, failed', withoutServer(/\/api\/reorder-points\?/)),
    state(
      'cribManager',
      points,
      'reorder points, adding',
      refused('Add a reorder point', 'Add the reorder point'),
    ),
    state('cribManager', points, 'reorder points, their menu', async (page) => {
      await page.getByRole('button', { name: 'More', exact: true }).click()
      await expect(page.getByRole('menuitem', { name: 'Paste rows' })).toBeVisible()
    }),
    state('cribManager', '/suppliers', 'suppliers', shows(supplierName)),
    state('cribManager', '/suppliers', 'suppliers, adding', refused('Add a supplier', 'Add the supplier')),
    state('cribManager', '/suppliers', 'suppliers, failed', withoutServer(/\/api\/suppliers/)),
    state('cribManager', '/suppliers', 'suppliers, not archived', async (page) => {
      await page.getByRole('button', { name: supplierName }).click()
      await page.getByRole('button', { name: 'Archive' }).click()
      await expect(page.getByRole('dialog').getByRole('alert')).toContainText(
        'Give it another supplier first.',
      )
    }),
    state('cribManager', '/crib-members', 'members of a crib', chooses(cribId, shows('@leadline.example'))),
    state('cribManager', '/crib-members', 'members, failed', withoutServer(/\/api\/cribs\/\d+\/members/)),
    state(
      'cribManager',
      '/imports/new?kind=reorderPoints',
      'a new import of reorder points',
      shows('and from whom'),
    ),

    state('admin', '/mail', 'mail, one that does not go', shows('no such mailbox')),
    state('admin', `/mail/${mailId}`, 'a mail that was kept', shows('A mail that was kept here')),
    state('admin', '/mail/999999999', 'no such mail', shows('There is nothing at this address')),
    state('admin', '/mail/preview', 'mail templates', shows('Mail templates')),
  ]
}
