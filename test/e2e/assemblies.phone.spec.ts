import type { Knex } from 'knex'
import { type ApiClient, signedInAs } from '../support/api'
import { siteDatabase } from '../support/api-stock'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'
import { createAssemblyRows, createMachine } from '../support/kept-assemblies'

let db: Knex
let crib: ApiClient

test.beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
})
test.afterAll(() => db.destroy())

test('at the machine, in gloves: keep it, build it, measure it, put it in, break it down', async ({
  page,
}) => {
  const rows = await createAssemblyRows(db, crib)
  const machine = await createMachine(db)
  const me = await signIn(page, 'machinist')
  await page.goto(`/reach?depth=25&cutter=${rows.cutterId}&holder=${rows.holderId}&collet=${rows.colletId}`)
  await page.getByRole('button', { name: 'Keep as assembly' }).tap()
  const dialog = page.getByRole('dialog')
  await dialog.getByRole('button', { name: 'Keep it' }).tap()
  await expect(page.getByRole('heading', { level: 1, name: /^Assembly \d+$/ })).toBeVisible()
  expect(await sidewaysOverrunPx(page)).toBe(0)

  const build = page.getByRole('button', { name: 'Build' })
  expect((await build.boundingBox())?.height).toBeGreaterThanOrEqual(64)
  await build.tap()
  const send = dialog.getByRole('button', { name: 'Build it' })
  expect((await send.boundingBox())?.height).toBeGreaterThanOrEqual(64)
  await send.tap()
  await expect(page.getByRole('main').getByText(me.name).first()).toBeVisible()

  await page.getByRole('button', { name: 'Measure' }).tap()
  await dialog.getByLabel('Gauge length').fill('139')
  await expect(dialog.getByText(/more than the 0.05 mm allowed/)).toBeVisible()
  await dialog.getByRole('button', { name: 'Keep it' }).tap()
  const mark = page.getByRole('region', { name: 'What no longer holds' })
  await expect(mark).toContainText('A stick-out of 39 mm is 0.19 mm too short')
  expect(await sidewaysOverrunPx(page)).toBe(0)
  await page.getByRole('button', { name: 'Measure' }).tap()
  await dialog.getByLabel('Gauge length').fill('139.48')
  await dialog.getByRole('button', { name: 'Keep it' }).tap()
  await expect(mark).toBeHidden()

  await page.getByRole('button', { name: 'Move' }).tap()
  await dialog.getByLabel('Where it goes').selectOption({ label: `${machine.code} · Mill ${machine.code}` })
  await dialog.getByLabel('Pocket').fill('3')
  await dialog.getByLabel('Tool number').fill('3')
  await dialog.getByRole('button', { name: 'Put it in' }).tap()
  await expect(page.getByText(`${machine.code}, pocket 3`).first()).toBeVisible()

  await page.getByRole('button', { name: 'Break down' }).tap()
  await expect(dialog.getByText('take it out first')).toBeVisible()
  await dialog.getByRole('button', { name: 'Break it down' }).tap()
  await expect(page.getByText('Broken down').first()).toBeVisible()
  const { body } = await crib.get(`/api/items/${rows.cutterId}/stock`)
  expect(body.balances).toEqual([
    expect.objectContaining({ locationId: rows.shelf.binId, condition: 'new', quantity: 4 }),
    expect.objectContaining({ locationId: rows.shelf.binId, condition: 'used', quantity: 1 }),
  ])
})
