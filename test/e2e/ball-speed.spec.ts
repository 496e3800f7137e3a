import AxeBuilder from '@axe-core/playwright'
import { expect, signIn, test } from '../support/browser'

const field = (name: string) => `input[name="${name}"]`

test.beforeEach(async ({ page }) => {
  await signIn(page, 'estimator')
  await page.request.patch('/api/me', { data: { lengthUnit: 'mm' } })
})

test.afterEach(async ({ page }) => {
  await page.request.patch('/api/me', { data: { lengthUnit: null } })
})

test('the hand case stands first as a sentence, with the tilt that lifts the tip out', async ({ page }) => {
  await page.goto('/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=0&spindleRpm=20000')
  await expect(page.getByText('cuts at 164.3 m/min, on a diameter of 2.615 mm')).toBeVisible()
  await expect(page.getByText('lean the tool more than 25.84°')).toBeVisible()
  await expect(page.getByRole('img', { name: /^Drawing\. At 20/ })).toBeVisible()
})

test('typing a size as people write it changes the answer and the address, which opens the same cut again', async ({
  page,
}) => {
  await page.goto('/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=0&spindleRpm=20000')
  await page.locator(field('cuttingDiameterMm')).fill('1/2')
  await page.locator(field('wantedSpeedMPerMin')).fill('300')
  await expect(page.locator(field('spindleRpm'))).toHaveValue('24755')
  await expect(page).toHaveURL(/cuttingDiameterMm=12\.7&.*wantedSpeedMPerMin=300/)
  await page.reload()
  await expect(page.locator(field('spindleRpm'))).toHaveValue('24755')
})

test('the tilt steps with the arrow keys until the dead tip is clear', async ({ page }) => {
  await page.goto('/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=25&spindleRpm=20000')
  await expect(page.getByText('The dead tip is in the cut and rubs')).toBeVisible()
  await page.getByRole('slider', { name: 'Tilt, by dragging' }).press('ArrowRight')
  await expect(page.locator(field('tiltDeg'))).toHaveValue('26')
  await expect(page.getByText('The dead tip is out of the cut')).toBeVisible()
})

test('stepover and scallop height work each other out', async ({ page }) => {
  await page.goto('/ball-speed?cuttingDiameterMm=10&depthOfCutMm=1&tiltDeg=0&stepoverMm=6')
  await expect(page.locator(field('scallopHeightMm'))).toHaveValue('1')
  await page.locator(field('scallopHeightMm')).fill('5 µm')
  await expect(page.locator(field('stepoverMm'))).toHaveValue('0.4471')
})

test('what cannot be is said beside its field, and the drawing keeps the cut before', async ({ page }) => {
  await page.goto('/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=0')
  await page.locator(field('stepoverMm')).fill('7')
  await expect(page.locator(field('stepoverMm'))).toHaveAttribute('aria-invalid', 'true')
  await expect(page.getByText('more than the cutting diameter').first()).toBeVisible()
  await expect(page.getByText('of the cut before')).toBeVisible()
  await page.goto('/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=0')
  await page.locator(field('depthOfCutMm')).fill('#80')
  await expect(page.getByText('“#80” is not a length').first()).toBeVisible()
  await expect(page.getByText(/^Read as/)).toHaveCount(0)
})

test('a person of the other unit sees the same cut in inches and SFM', async ({ page }) => {
  await page.goto('/ball-speed?cuttingDiameterMm=12.7&depthOfCutMm=0.254&tiltDeg=0&spindleRpm=10000')
  await page.getByRole('button', { name: 'Inches' }).click()
  await expect(page.locator(field('cuttingDiameterMm'))).toHaveValue('0.5')
  await expect(page.locator(field('depthOfCutMm'))).toHaveValue('0.01')
  await expect(page.getByText('the 1/2 (0.500) in ball cuts at 366.5 SFM')).toBeVisible()
})

test('no rule of accessibility that a program can check is broken', async ({ page }) => {
  await page.goto('/ball-speed')
  await expect(page.getByText('Passes 0.3 mm apart')).toBeVisible()
  const { violations } = await new AxeBuilder({ page }).analyze()
  expect(violations).toEqual([])
})
