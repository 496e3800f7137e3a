import type { Page } from '@playwright/test'
import type { Knex } from 'knex'
import { type ApiClient, signedInAs } from '../support/api'
import { siteDatabase } from '../support/api-stock'
import { expect, sidewaysOverrunPx, signIn, test } from '../support/browser'
import {
  type AssemblyRows,
  buildAssembly,
  createAssemblyRows,
  createMachine,
  keepAssembly,
  untilRechecked,
} from '../support/kept-assemblies'
import { readScanCode } from '../support/read-scan-code'

let db: Knex
let crib: ApiClient
let rows: AssemblyRows

test.beforeAll(async () => {
  db = siteDatabase()
  crib = await signedInAs('cribManager')
})
test.afterAll(() => db.destroy())
test.beforeEach(async () => {
  rows = await createAssemblyRows(db, crib)
})

const reachQuery = () =>
  `/reach?depth=25&cutter=${rows.cutterId}&holder=${rows.holderId}&collet=${rows.colletId}`

test('from a check that reaches to a tool in a pocket, measured, and apart again', async ({ page }) => {
  const machine = await createMachine(db)
  await signIn(page, 'cribManager')
  await page.goto(reachQuery())
  await expect(page.getByTestId('verdict')).toContainText('Reaches 25 mm')
  await page.getByRole('button', { name: 'Keep as assembly' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Name').fill('Deep pocket')
  await dialog.getByLabel('Tool number').fill('twelve')
  await dialog.getByRole('button', { name: 'Keep it' }).click()
  await expect(dialog.getByText(/is not a whole number/)).toBeVisible()
  await dialog.getByLabel('Tool number').fill('12')
  await dialog.getByRole('button', { name: 'Keep it' }).click()

  await expect(page.getByRole('heading', { level: 1 })).toContainText('Deep pocket')
  const figures = page.getByRole('region', { name: 'Figures' })
  await expect(figures).toContainText('Stick-out to set39.5 mm')
  await expect(figures).toContainText('Gauge length to expect139.5 mm')

  await page.getByRole('button', { name: 'Build' }).click()
  await dialog.getByLabel('Where it goes').selectOption({ label: `${machine.code} · Mill ${machine.code}` })
  await dialog.getByLabel('Pocket').fill('99')
  await dialog.getByRole('button', { name: 'Build it' }).click()
  await expect(dialog.getByText(/has 20 pockets/).first()).toBeVisible()
  await dialog.getByLabel('Pocket').fill('7')
  await dialog.getByRole('button', { name: 'Build it' }).click()
  await expect(page.getByText(`${machine.code}, pocket 7`).first()).toBeVisible()

  await page.getByRole('button', { name: 'Measure' }).click()
  await dialog.getByLabel('Gauge length').fill('139.62')
  await expect(dialog.getByText('+0.12 mm to the calculated gauge length')).toBeVisible()
  await dialog.getByRole('button', { name: 'Keep it' }).click()
  await expect(figures).toContainText('+0.12 mm, more than the 0.05 mm allowed')

  await page.goto('/assemblies?inMachine=true')
  await expect(page.getByRole('rowheader', { name: `${machine.code} ·` })).toBeVisible()
  await page.getByRole('searchbox', { name: 'Search' }).fill(rows.cutterCode)
  await page.getByRole('searchbox', { name: 'Search' }).press('Enter')
  const line = page.getByRole('row').filter({ hasText: rows.cutterCode })
  await expect(line).toContainText('139.62 mm')
  await expect(line).toContainText('+0.12 mm over')
  await line.getByRole('link', { name: /Deep pocket/ }).click()

  await page.getByRole('button', { name: 'Break down' }).click()
  const cutter = dialog.getByRole('group', { name: `Cutter ${rows.cutterCode}` })
  await cutter.getByLabel('What becomes of it').selectOption({ label: 'Broken: scrap' })
  await dialog.getByRole('button', { name: 'Break it down' }).click()
  await expect(page.getByText('Broken down').first()).toBeVisible()
  const stock = await crib.get(`/api/items/${rows.cutterId}/stock`)
  expect(stock.body).toMatchObject({ onHand: 4 })
  expect(await sidewaysOverrunPx(page)).toBe(0)
})

test('what was corrected marks the assembly, says before and after, and is taken over', async ({ page }) => {
  const { body: kept } = await keepAssembly(crib, rows)
  const holder = (await crib.get(`/api/holders/${rows.holderId}`)).body
  await crib.patch(`/api/holders/${rows.holderId}`, { version: holder.version, gaugeLengthMm: 98.5 })
  await untilRechecked(db, kept.id)
  await signIn(page, 'estimator')
  await page.goto(`/assemblies?marked=true&q=${rows.cutterCode}`)
  const line = page.getByRole('row').filter({ hasText: rows.cutterCode })
  await expect(line).toContainText('No longer holds')
  await line.getByRole('link').first().click()
  const mark = page.getByRole('region', { name: 'What no longer holds' })
  await expect(mark).toContainText('The gauge length to expect was 139.5 mm and is 138 mm now.')
  await expect(mark).toContainText('Holder: gauge length 100 mm → 98.5 mm.')
  await mark.getByRole('button', { name: 'Take the new sizes over' }).click()
  await expect(mark).toBeHidden()
  await expect(page.getByRole('region', { name: 'Figures' })).toContainText('138 mm')
})

test('a presetter’s file is shown against the calculated, refused by line, and taken over whole', async ({
  page,
}) => {
  const assembly = (await buildAssembly(crib, rows, (await keepAssembly(crib, rows)).body)).body
  await signIn(page, 'machinist')
  await page.goto('/assemblies')
  await page.getByRole('button', { name: 'Presetter file' }).click()
  const dialog = page.getByRole('dialog')
  const choose = (text: string) =>
    dialog.getByLabel('File').setInputFiles({
      name: 'presetter.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from(text),
    })
  await choose(`Assembly;Gauge length\n${assembly.number};139.53\n987654321;120\n`)
  await expect(dialog.getByRole('alert')).toContainText('Line 3, Assembly: There is no assembly 987654321.')
  await expect(dialog.getByRole('button', { name: 'Take it over' })).toBeDisabled()
  await choose(`Assembly;Gauge length\n${assembly.number};139.53\n`)
  await expect(dialog.getByRole('row', { name: `${assembly.number} 139.53 mm +0.03 mm` })).toBeVisible()
  await dialog.getByRole('button', { name: 'Take it over' }).click()
  await page.goto(`/assemblies/${assembly.id}`)
  await expect(page.getByRole('region', { name: 'Figures' })).toContainText('Presetter')
})

for (const [paper, width, height] of [
  ['A4', 794, 1123],
  ['Letter', 816, 1056],
] as const) {
  test(`the set-up sheet on ${paper} says what to set and to expect, and its code leads back here`, async ({
    page,
  }) => {
    await crib.patch(`/api/holders/${rows.holderId}`, {
      version: (await crib.get(`/api/holders/${rows.holderId}`)).body.version,
      nutTorqueNm: 56,
    })
    const { body: kept } = await keepAssembly(crib, rows, { name: 'Deep pocket', toolNumber: 12 })
    await signIn(page, 'machinist')
    await page.setViewportSize({ width, height })
    await page.goto(`/assemblies/${kept.id}`)
    const sheet = page.getByRole('article', { name: 'Set-up sheet' })
    await expect(sheet).toBeHidden()
    await page.emulateMedia({ media: 'print', colorScheme: 'dark' })
    await expect(sheet).toBeVisible()
    await expect(page.getByRole('banner')).toBeHidden()
    await expect(page.getByRole('button')).toHaveCount(0)
    for (const said of [
      `Assembly ${kept.number}`,
      'Stick-out to set39.5 mm',
      'Gauge length to expect139.5 mm',
      'Nut torque56 N·m',
      rows.holderCode,
      'A-1',
      'Wall 25 mm deep',
      'Computed, not proven',
      'Eye protection, guarded spindle',
    ])
      await expect(sheet).toContainText(said)
    await expect(sheet.getByRole('img', { name: /^Section of a square end mill/ })).toBeVisible()
    const picture = await sheet.getByRole('img', { name: /^Code to scan/ }).screenshot({ scale: 'device' })
    const { grey, side } = await greyOf(page, picture)
    expect(new URL(readScanCode(grey, side.width, side.height)).pathname).toBe(`/assemblies/${kept.id}`)
    const pages = (await page.pdf({ format: paper })).toString('latin1').match(/\/Type\s*\/Page\b/g)
    expect(pages).toHaveLength(1)
  })
}

test('another feature is kept with the assembly that is there already', async ({ page }) => {
  const { body: kept } = await keepAssembly(crib, rows, { name: 'Deep pocket' })
  await signIn(page, 'machinist')
  await page.goto(`${reachQuery().replace('depth=25', 'depth=30')}&stickout=39.5`)
  await page.getByRole('button', { name: 'Keep as assembly' }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Keep it', { exact: true }).selectOption({
    label: `With assembly ${kept.number}, Deep pocket`,
  })
  await dialog.getByRole('button', { name: 'Keep it' }).click()
  const checks = page.getByRole('region', { name: 'Kept for' })
  await expect(checks).toContainText('Wall 25 mm deep')
  await expect(checks).toContainText('Wall 30 mm deep')
})

test('nothing is kept of figures that are typed over the catalogue', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto(`${reachQuery()}&c.OAL=80`)
  await expect(page.getByTestId('verdict')).toContainText('Reaches 25 mm')
  await expect(page.getByText('pick cutter and holder from the crib as they are there')).toBeVisible()
  await expect(page.getByRole('button', { name: 'Keep as assembly' })).toHaveCount(0)
})

test('an assembly that is not there, and a list without a server, each say so', async ({ page }) => {
  await signIn(page, 'machinist')
  await page.goto('/assemblies/999999999')
  await expect(page.getByText('There is nothing at this address')).toBeVisible()
  await page.route(/\/api\/assemblies\?/, (route) => route.abort())
  await page.goto('/assemblies')
  await expect(page.getByText('Leadline cannot be reached')).toBeVisible()
  await page.unroute(/\/api\/assemblies\?/)
  await page.getByRole('button', { name: 'Try again' }).click()
  await expect(page.getByText('Leadline cannot be reached')).toBeHidden()
})

/** The picture as a camera sees it, unpacked by the browser itself. */
async function greyOf(
  page: Page,
  png: Buffer,
): Promise<{ grey: Uint8ClampedArray; side: { width: number; height: number } }> {
  const read = await page.evaluate(
    async (source) => {
      const image = new Image()
      image.src = source
      await image.decode()
      const canvas = document.createElement('canvas')
      canvas.width = image.width * 3
      canvas.height = image.height * 3
      const context = canvas.getContext('2d')
      if (!context) throw new Error('no canvas')
      context.imageSmoothingEnabled = false
      context.drawImage(image, 0, 0, canvas.width, canvas.height)
      const { data } = context.getImageData(0, 0, canvas.width, canvas.height)
      const grey = Array.from({ length: data.length / 4 }, (_, at) => data[4 * at + 1] ?? 0)
      return { grey, width: canvas.width, height: canvas.height }
    },
    `data:image/png;base64,${png.toString('base64')}`,
  )
  return { grey: Uint8ClampedArray.from(read.grey), side: { width: read.width, height: read.height } }
}
