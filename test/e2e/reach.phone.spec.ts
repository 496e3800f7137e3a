import { expect, signIn, test } from '../support/browser'

const check =
  'depth=25&c.form=square&c.DC=3.175&c.APMX=6.35&c.LCF=6.35&c.DN=3&c.LU=38.1&c.DMM=3.175&c.OAL=76.2' +
  '&h.A=100&h.depth=75&h.grip=10&h.segments=nut:18x28'

test.beforeEach(async ({ page }) => {
  await signIn(page, 'admin')
  await page.request.patch('/api/me', { data: { lengthUnit: 'mm' } })
  await page.goto(`/reach?${check}`)
  await expect(page.getByTestId('verdict')).toContainText('Reaches 25 mm')
})

test.afterEach(async ({ page }) => {
  await page.request.patch('/api/me', { data: { lengthUnit: null } })
})

test('verdict, drawing and stick-out come first, and nothing runs off the side', async ({ page }) => {
  await expect(page.getByRole('img', { name: /^Section of/ })).toBeVisible()
  const verdict = await page.getByTestId('verdict').boundingBox()
  const drawing = await page.getByRole('img', { name: /^Section of/ }).boundingBox()
  const fields = await page.getByRole('region', { name: 'Feature' }).boundingBox()
  expect(verdict?.y).toBeLessThan(drawing?.y ?? 0)
  expect(drawing?.y).toBeLessThan(fields?.y ?? 0)
  const overflow = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)
  expect(overflow).toBeLessThanOrEqual(0)
})

test('the stick-out is stepped with gloves on, everything else with a finger', async ({ page }) => {
  const longer = page.getByRole('button', { name: /^Stick-out longer/ })
  const box = await longer.boundingBox()
  expect(Math.min(box?.width ?? 0, box?.height ?? 0)).toBeGreaterThanOrEqual(64)
  await longer.tap()
  await expect(page.getByTestId('verdict')).toContainText('at 40 mm stick-out')
  for (const name of ['Wall', 'Hole', 'At the tip', 'Whole assembly', 'Print']) {
    const target = await page.getByRole('button', { name, exact: true }).boundingBox()
    expect(target?.height, name).toBeGreaterThanOrEqual(44)
  }
  for (const handle of await page.getByRole('slider').all()) {
    const target = await handle.boundingBox()
    expect(Math.min(target?.width ?? 0, target?.height ?? 0)).toBeGreaterThanOrEqual(44)
  }
})

test('on a phone the words of the first touch stand at the foot of the drawing, off every figure', async ({
  page,
}) => {
  await page.goto(`/reach?obstacles=5x9&corner=4&opening=30&${check}`)
  const drawing = page.getByRole('img', { name: /^Section of/ })
  const words = drawing.getByText('nut touches next, 30 mm')
  await expect(words).toBeVisible()
  const foot = await words.boundingBox()
  expect(foot).not.toBeNull()
  for (const figure of [/^depth 25$/, /^reach 30$/, /^rises 9$/, /^opening 30$/, /^back 5$/, /^corner R4$/]) {
    const box = await drawing.getByText(figure).boundingBox()
    expect(box, String(figure)).not.toBeNull()
    expect((box?.y ?? 0) + (box?.height ?? 0)).toBeLessThanOrEqual(foot?.y ?? 0)
  }
})
