import AxeBuilder from '@axe-core/playwright'
import type { Page } from '@playwright/test'
import { expect, signIn, test } from '../support/browser'

const chuck = 'h.A=100&h.depth=75&h.grip=10&h.segments=nut:18x28'
const necked = 'c.form=square&c.DC=3.175&c.APMX=6.35&c.LCF=6.35&c.DN=3&c.LU=38.1&c.DMM=3.175&c.OAL=76.2'
const ball = 'c.form=ball&c.DC=6&c.APMX=12&c.LCF=12&c.DMM=6&c.OAL=80'

const verdict = (page: Page) => page.getByTestId('verdict')
const field = (page: Page, name: string) => page.getByRole('textbox', { name: new RegExp(`^${name}`) })
const slider = (page: Page, name: string) => page.getByRole('slider', { name, exact: true })

test.beforeEach(async ({ page }) => {
  await signIn(page, 'cribManager')
  await page.request.patch('/api/me', { data: { lengthUnit: 'mm' } })
})

test.afterEach(async ({ page }) => {
  await page.request.patch('/api/me', { data: { lengthUnit: null } })
})

test('nothing is answered before anything was given, and an example is one click away', async ({ page }) => {
  await page.goto('/reach')
  await expect(verdict(page)).toHaveText('Does it reach?')
  await page.getByRole('button', { name: 'Try a worked example' }).click()
  await expect(verdict(page)).toHaveText(
    'Reaches 25 mm at 39.5 mm stick-out. The transition touches next, at 38.16 mm.',
  )
  await expect(page).toHaveURL(/depth=25&.*c\.DC=3\.175/)
})

test('the verdict, the drawing and the figures agree on the hand case', async ({ page }) => {
  await page.goto(`/reach?depth=25&${necked}&${chuck}`)
  await expect(verdict(page)).toHaveText(
    'Reaches 25 mm at 39.5 mm stick-out. The transition touches next, at 38.16 mm.',
  )
  await expect(
    page.getByRole('img', { name: /^Section of a square end mill of 3\.175 mm, 39\.5 mm out/ }),
  ).toBeVisible()
  await expect(page.getByRole('row', { name: /^Spindle face 139 mm$/i })).toBeVisible()
  await expect(page.getByText('the end of the neck: only full shank is clamped')).toBeVisible()
})

test('a row of the first touches marks its part on the drawing', async ({ page }) => {
  await page.goto(`/reach?depth=25&${necked}&${chuck}`)
  const nut = page.getByRole('button', { name: 'nut', exact: true })
  await nut.click()
  await expect(nut).toHaveAttribute('aria-pressed', 'true')
  await expect(page.locator('svg text', { hasText: 'nut 39 mm' })).toBeInViewport()
})

test('the stick-out follows the arrow keys, the buttons and the typed field', async ({ page }) => {
  await page.goto(`/reach?depth=25&${necked}&${chuck}`)
  const stickOut = slider(page, 'Stick-out')
  await expect(stickOut).toHaveAttribute('aria-valuetext', '39.5 mm')
  await stickOut.press('ArrowUp')
  await expect(stickOut).toHaveAttribute('aria-valuetext', '40 mm')
  await expect(field(page, 'Stick-out')).toHaveValue('40')
  await page.getByRole('button', { name: /^Stick-out longer/ }).click()
  await expect(verdict(page)).toContainText('at 40.5 mm stick-out')
  await field(page, 'Stick-out').fill('30')
  await expect(verdict(page)).toContainText('Impossible. A stick-out of 30 mm is 9.19 mm too short')
  await page.getByRole('button', { name: 'Use what is needed, 39.5 mm' }).click()
  await expect(verdict(page)).toContainText('Reaches 25 mm at 39.5 mm')
})

test('the depth is dragged until the transition is in the way', async ({ page }) => {
  await page.goto(`/reach?depth=36&${necked}&${chuck}`)
  await expect(verdict(page)).toContainText('Reaches 36 mm')
  const handle = slider(page, 'Depth')
  const box = await handle.boundingBox()
  if (!box) throw new Error('The handle is not on the page.')
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
  await page.mouse.move(x, y)
  await page.mouse.down()
  await page.mouse.move(x, y - 30, { steps: 6 })
  await expect(verdict(page)).toContainText('short of')
  await expect(verdict(page)).toContainText('The transition touches first, at 38.16 mm')
  await page.mouse.up()
  await expect(page).not.toHaveURL(/depth=36&/)
  await page.reload()
  await expect(verdict(page)).toContainText('The transition touches first, at 38.16 mm')
})

test('nose, wall and axis are dragged as well, and the drawing stays under the hand', async ({ page }) => {
  await page.goto(`/reach?depth=30&stickout=40&${ball}&${chuck}`)
  const drag = async (name: string, byX: number, byY: number) => {
    const box = await slider(page, name).boundingBox()
    if (!box) throw new Error(`There is no handle ${name}.`)
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
    await page.mouse.move(x, y)
    await page.mouse.down()
    await page.mouse.move(x + byX, y + byY, { steps: 5 })
    const held = await slider(page, name).boundingBox()
    expect(Math.abs((held?.x ?? 0) - box.x - byX), `${name} stays under the hand`).toBeLessThan(12)
    expect(Math.abs((held?.y ?? 0) - box.y - byY), `${name} stays under the hand`).toBeLessThan(12)
    await page.mouse.up()
  }
  await drag('Stick-out', 0, -60)
  const stickOutMm = Number(await slider(page, 'Stick-out').getAttribute('aria-valuenow'))
  expect(stickOutMm).toBeGreaterThan(43)
  await expect(field(page, 'Stick-out')).toHaveValue(String(stickOutMm))
  await drag('Tilt', -80, 8)
  expect(Number(await slider(page, 'Tilt').getAttribute('aria-valuenow'))).toBeGreaterThan(3)
  await drag('Draft', 24, 0)
  expect(Number(await slider(page, 'Draft').getAttribute('aria-valuenow'))).toBeGreaterThan(3)
})

test('tilt and draft step by key, and tilt is offered to a ball on an open wall alone', async ({ page }) => {
  await page.goto(`/reach?depth=30&tilt=14.5&stickout=40&${ball}&${chuck}`)
  await slider(page, 'Tilt').press('ArrowRight')
  await expect(verdict(page)).toHaveText(
    'Reaches 30 mm at 40 mm stick-out. The nut touches next, at 41.59 mm.',
  )
  await slider(page, 'Draft').press('PageUp')
  await expect(field(page, 'Draft')).toHaveValue('5')
  await page.goto(`/reach?depth=25&${necked}&${chuck}`)
  await expect(slider(page, 'Draft')).toBeVisible()
  await expect(slider(page, 'Tilt')).toHaveCount(0)
})

test('what cannot be read or cannot be stands beside its field, and no old verdict with it', async ({
  page,
}) => {
  await page.goto(`/reach?depth=25&${necked}&${chuck}`)
  const depth = field(page, 'Depth')
  await depth.fill('25 cubits')
  await expect(depth).toHaveAttribute('aria-invalid', 'true')
  await expect(verdict(page)).toHaveText('No verdict yet. One field needs another look.')
  await depth.fill('25')
  await field(page, 'Tilt').fill('10')
  await expect(verdict(page)).toHaveText('No verdict yet. Only a tool with a ball tip may be tilted.')
  await depth.fill('')
  await expect(page.getByText('Reaches 25 mm')).toHaveCount(0)
})

test('a cutter and a chuck are picked from the crib by keyboard, and a changed size is marked', async ({
  page,
}) => {
  const holders = await page.request.get('/api/holders?limit=50')
  const { rows } = (await holders.json()) as {
    rows: { id: string; code: string; bore: { kind: string; series?: string } }[]
  }
  const chuckRow = rows.find(({ bore }) => bore.kind === 'collet' && bore.series === 'ER16')
  if (!chuckRow) throw new Error('The demo shop has no ER16 chuck.')
  await page.goto(`/reach?depth=10&holder=${chuckRow.id}`)
  const cutter = page.getByRole('region', { name: 'Cutter' })
  const picker = cutter.getByRole('combobox', { name: 'Pick from the crib' })
  await picker.fill('ball')
  await expect(cutter.getByRole('option').first()).toBeVisible()
  await picker.press('ArrowDown')
  await picker.press('Enter')
  await expect(page).toHaveURL(/cutter=\d+/)
  await expect(cutter.getByText(/Ball Ø/)).toBeVisible()
  const collet = page.getByRole('region', { name: 'Collet' })
  await collet.getByRole('combobox').click()
  await expect(collet.getByText(/^Those that fit ER16 and hold a shank of/)).toBeVisible()
  await cutter.getByText('Its sizes').click()
  const overall = cutter.getByLabel(/^Overall length/)
  await overall.press('ControlOrMeta+a')
  await overall.pressSequentially('99')
  await expect(overall).toBeFocused()
  await expect(cutter.getByText(/^Changed from the catalogue’s/)).toBeVisible()
  await expect(page).toHaveURL(/c\.OAL=99/)
  await cutter.getByRole('button', { name: 'Undo' }).click()
  await expect(cutter.getByText(/^Changed from the catalogue’s/)).toHaveCount(0)
})

test('a person of the other unit reads the same check in inches', async ({ page }) => {
  await page.goto(`/reach?depth=25.4&${necked}&${chuck}`)
  await page.getByRole('button', { name: 'Inches' }).click()
  await expect(verdict(page)).toHaveText(
    'Reaches 1.000 in at 1.555 in stick-out. The transition touches next, at 1.502 in.',
  )
  await expect(field(page, 'Depth')).toHaveValue('1')
  await expect(slider(page, 'Stick-out')).toHaveAttribute('aria-valuetext', '1.555 in')
})

test('it prints on one sheet of either paper, cautions on it', async ({ page }) => {
  await page.goto(`/reach?depth=25&${necked}&${chuck}`)
  await expect(page.getByRole('img', { name: /^Section of/ })).toBeVisible()
  for (const format of ['A4', 'Letter']) {
    const pdf = await page.pdf({ format, printBackground: true })
    expect(pdf.toString('latin1').match(/\/Type\s*\/Page\b(?!s)/g), format).toHaveLength(1)
  }
  await page.emulateMedia({ media: 'print' })
  await expect(page.getByText('A calculated reach is not a proven program')).toBeVisible()
  await expect(page.getByText('DN 3 mm', { exact: false })).toBeVisible()
})

test('it has no fault an accessibility checker finds, holding, colliding or empty', async ({ page }) => {
  for (const query of [
    '',
    `depth=25&${necked}&${chuck}`,
    `depth=45&draft=2&obstacles=5x9&${necked}&${chuck}`,
  ]) {
    await page.goto(`/reach?${query}`)
    await expect(verdict(page)).toBeVisible()
    const { violations } = await new AxeBuilder({ page }).analyze()
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([])
  }
})

test('the figures of a drawing keep off the wall and the nut', async ({ page }) => {
  await page.goto(`/reach?depth=30&tilt=15&${ball}&${chuck}`)
  const tilt = await page.getByRole('main').getByText('tilt 15°', { exact: true }).boundingBox()
  const wall = await slider(page, 'Draft').boundingBox()
  if (!tilt || !wall) throw new Error('the tilt, or the wall, is not drawn')
  expect(tilt.x + tilt.width).toBeLessThan(wall.x + wall.width / 2)

  await page.goto(`/reach?depth=38&draft=1.5&${necked}&${chuck}`)
  const words = await page.getByText(/^nut touches next/).boundingBox()
  const nose = await slider(page, 'Stick-out').boundingBox()
  if (!words || !nose) throw new Error('the first touch, or the nose, is not drawn')
  expect(words.y).toBeGreaterThan(nose.y + nose.height / 2)
})

test('the setback of an obstacle and an inside corner are dimensioned, and keep off the other figures', async ({
  page,
}) => {
  await page.goto(`/reach?depth=25&obstacles=5x9&corner=4&opening=30&${necked}&${chuck}`)
  const drawing = page.getByRole('img', { name: /inside corners of 4 mm radius/ })
  await expect(drawing).toBeVisible()
  const boxes = []
  for (const name of [
    /^set back 5$/,
    /^inside corner R4$/,
    /^opening 30$/,
    /^depth 25$/,
    /^nut touches next/,
  ]) {
    const box = await drawing.getByText(name).boundingBox()
    expect(box, String(name)).not.toBeNull()
    if (box) boxes.push(box)
  }
  for (const [index, one] of boxes.entries())
    for (const other of boxes.slice(index + 1))
      expect(
        one.x + one.width <= other.x ||
          other.x + other.width <= one.x ||
          one.y + one.height <= other.y ||
          other.y + other.height <= one.y,
      ).toBe(true)
})
