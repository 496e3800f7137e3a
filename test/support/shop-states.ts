import type { Page } from '@playwright/test'
import { expect } from '@playwright/test'
import type { Role } from '@/core/policies/permissions'
import type { PageState } from './accessible-states'
import { signedInAs, uniqueCode } from './api'
import { createCutter, createShelf, putOnShelf, siteDatabase } from './api-stock'
import { createNeckedTool, type NeckedToolRows } from './shop-rows'

const unreachable = 'Leadline cannot be reached'

const shows = (text: string | RegExp) => (page: Page) => expect(page.getByText(text).first()).toBeVisible()

const withoutServer = (pattern: RegExp) => async (page: Page) => {
  await page.route(pattern, (route) => route.abort())
  await page.reload()
  await expect(page.getByText(unreachable).first()).toBeVisible()
}

const opens = async (page: Page, name: string | RegExp) => {
  await page.getByRole('button', { name }).first().click()
  await expect(page.getByRole('dialog')).toBeVisible()
}

const listbox = (page: Page) => page.getByRole('listbox').getByRole('option').first()

interface Twins {
  kept: string
  merged: string
  /** Measures the same, and is tracked piece by piece with a tagged piece in a bin. */
  tracked: string
}

/** Three cutters of one geometry that stand in a group of their own. */
async function createTwins(): Promise<Twins> {
  const crib = await signedInAs('cribManager')
  const db = siteDatabase()
  const shelf = await createShelf(crib)
  const overallLengthMm = 700 + Math.floor(Math.random() * 1e7) / 1e5
  const codes = [uniqueCode('AKEEP'), uniqueCode('BGOES'), uniqueCode('CTAG')]
  const ids: string[] = []
  for (const code of codes) ids.push(await createCutter(crib, { code, overallLengthMm }))
  const [, merged = '', tracked = ''] = ids
  await putOnShelf(db, crib, { itemId: merged, binId: shelf.binId, quantity: 4 })
  await db('reorder_points').insert({
    item_id: merged,
    crib_id: shelf.cribId,
    reorder_point: 5,
    order_up_to: 9,
  })
  await db('items').where('id', tracked).update({ is_tracked_by_piece: true })
  await db('pieces').insert({ item_id: tracked, tag: uniqueCode('TAG') })
  await db.destroy()
  return { kept: codes[0] ?? '', merged: codes[1] ?? '', tracked: codes[2] ?? '' }
}

/** A crib with a bin in a drawer, both archived. */
async function archiveDrawer(): Promise<{ drawer: string; bin: string }> {
  const crib = await signedInAs('cribManager')
  const { cribLocationId } = await createShelf(crib)
  const add = async (kind: string, code: string, parentId: string): Promise<string> =>
    (await crib.post('/api/locations', { kind, code, name: `The ${kind}`, parentId })).body.id
  const [drawer, bin] = [uniqueCode('DR'), uniqueCode('BIN')]
  const drawerId = await add('drawer', drawer, cribLocationId)
  await crib.remove(`/api/locations/${await add('bin', bin, drawerId)}`)
  await crib.remove(`/api/locations/${drawerId}`)
  return { drawer, bin }
}

async function createRows(): Promise<NeckedToolRows> {
  const db = siteDatabase()
  return createNeckedTool(db, await signedInAs('cribManager')).finally(() => db.destroy())
}

/** Opens the preview of a merge of these two. */
async function previewMerge(page: Page, kept: string, merged: string): Promise<void> {
  await page.getByRole('radio', { name: `Keep ${kept}` }).check()
  await page
    .getByRole('row', { name: new RegExp(merged) })
    .getByRole('button', { name: `Merge into ${kept}` })
    .click()
  await expect(page.getByRole('dialog')).toBeVisible()
}

const fillPattern = async (page: Page, first: string, last: string) => {
  await opens(page, 'Bins by a pattern')
  await page.getByLabel('First code').fill(first)
  await page.getByLabel('Last code').fill(last)
}

/** What fits, duplicates and merges, starting speeds, the first day, ball-end speed and the locations, in every state. */
export async function shopStates(): Promise<PageState[]> {
  const rows = await createRows()
  const twins = await createTwins()
  const archived = await archiveDrawer()
  const state = (role: Role, path: string, name: string, reach: PageState['reach']): PageState => ({
    role,
    path,
    name,
    reach,
  })
  const ball = '/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=30&spindleRpm=20000&maximumRpm=18000'
  const duplicates = '/duplicates?kind=cutter'
  return [
    state('machinist', '/fits', 'what fits, nothing asked', shows('What you have')),
    state('machinist', '/fits', 'what fits, asked without figures', async (page) => {
      await page.getByRole('button', { name: 'Find what fits' }).click()
      await shows('Enter inside corner radius.')(page)
    }),
    state(
      'machinist',
      '/fits?insideCornerRadiusMm=4&depthMm=10',
      'what fits a pocket',
      shows('cutters could'),
    ),
    state(
      'machinist',
      '/fits?insideCornerRadiusMm=0.001&depthMm=900',
      'what fits, none',
      shows('No cutter in'),
    ),
    state(
      'machinist',
      '/fits?insideCornerRadiusMm=4&depthMm=10',
      'a pocket, failed',
      withoutServer(/\/api\/fits/),
    ),
    state('machinist', '/fits?shankDiameterMm=3.175', 'what holds a shank', shows('A fixed bore takes')),
    state('machinist', '/fits?shankDiameterMm=3.175', 'a shank, failed', withoutServer(/\/api\/fits/)),
    state('machinist', '/fits?series=ER16', 'what a chuck takes', shows('A fixed bore takes')),
    state('machinist', ball, 'ball-end speed, capped', shows(/is over the spindle’s limit/)),
    state('machinist', ball, 'ball-end speed, picking a holder', async (page) => {
      await page.getByRole('combobox', { name: 'Holder, from the crib' }).fill(rows.holderCode)
      await expect(listbox(page)).toBeVisible()
    }),
    state('machinist', `${ball}&holder=${rows.holderId}`, 'ball-end speed, a holder without RPMX', (page) =>
      shows('no highest speed (RPMX) for this holder')(page),
    ),
    state('machinist', `${ball}&holder=999999999`, 'ball-end speed, a holder that is none', (page) =>
      shows('There is no such holder.')(page),
    ),
    state('machinist', ball, 'ball-end speed, what cannot be read', async (page) => {
      await page.getByRole('textbox', { name: 'Depth of cut' }).fill('a bit')
      await shows('the drawing and the figures are of the cut before')(page)
    }),
    state('machinist', ball, 'ball-end speed, a material chosen', async (page) => {
      await page.getByLabel('Start from a material').selectOption({ index: 1 })
      await shows('A start, not a limit.')(page)
    }),
    state('machinist', '/starting-speeds', 'starting speeds', shows('Steel')),
    state('machinist', '/locations', 'locations of a machinist', shows('All that lies in it')),

    state('cribManager', duplicates, 'duplicates', shows('measure the same.')),
    state('cribManager', duplicates, 'duplicates, none', async (page) => {
      await page.route(/\/api\/duplicates\?/, (route) => route.fulfill({ json: { groups: [], total: 0 } }))
      await page.reload()
      await shows('No two cutters in use measure the same.')(page)
    }),
    state('cribManager', duplicates, 'duplicates, failed', withoutServer(/\/api\/duplicates/)),
    state('cribManager', duplicates, 'a merge previewed', async (page) => {
      await previewMerge(page, twins.kept, twins.merged)
      await shows('takes over the reorder point (5, up to 9)')(page)
    }),
    state('cribManager', duplicates, 'a merge that cannot be made', async (page) => {
      await previewMerge(page, twins.kept, twins.tracked)
      await shows('It cannot be made.')(page)
    }),
    state('cribManager', duplicates, 'a merge whose preview failed', async (page) => {
      await page.route(/\/api\/duplicates\/merge/, (route) => route.abort())
      await previewMerge(page, twins.kept, twins.merged)
      await shows(unreachable)(page)
    }),
    state('cribManager', duplicates, 'a merge that got no answer', async (page) => {
      await page.route(/\/api\/duplicates\/merge$/, (route) => route.abort())
      await previewMerge(page, twins.kept, twins.merged)
      await page.getByRole('button', { name: 'Merge them' }).click()
      await shows(unreachable)(page)
    }),
    state('cribManager', '/starting-speeds', 'starting speeds, adding, refused', async (page) => {
      await page.getByRole('button', { name: 'Add a material' }).click()
      await page.getByRole('button', { name: 'Save' }).click()
      await expect(page.locator('[aria-invalid="true"]').first()).toBeVisible()
    }),
    state('cribManager', '/starting-speeds', 'starting speeds, not saved', async (page) => {
      await page.route(/\/api\/starting-speeds$/, (route) =>
        route.request().method() === 'POST' ? route.abort() : route.continue(),
      )
      await page.getByRole('button', { name: 'Add a material' }).click()
      await page.getByRole('textbox', { name: 'Material' }).fill('Zinc')
      await page.getByRole('textbox', { name: 'Low end' }).fill('100')
      await page.getByRole('textbox', { name: 'High end' }).fill('200')
      await page.getByRole('button', { name: 'Save' }).click()
      await shows(unreachable)(page)
    }),
    state('cribManager', '/starting-speeds', 'starting speeds, changing', async (page) => {
      await page
        .getByRole('button', { name: /^Change / })
        .first()
        .click()
      await expect(page.getByRole('button', { name: 'Remove' })).toBeVisible()
    }),
    state(
      'cribManager',
      `/cutters/${rows.cutterId}`,
      'a cutter’s speeds, its holder picked',
      async (page) => {
        const speeds = page.getByRole('region', { name: 'Starting speeds' })
        await speeds.getByRole('combobox').fill(rows.holderCode)
        await speeds.getByRole('option').first().click()
        await shows('no highest speed (RPMX) for this holder')(page)
      },
    ),
    state('cribManager', '/first-day', 'the first day', shows('Cribs and bins')),
    state('cribManager', '/first-day', 'bins by a pattern', async (page) => {
      await fillPattern(page, 'Q1', 'T24')
      await shows('96 bins, Q1 to T24')(page)
    }),
    state('cribManager', '/first-day', 'bins by a pattern that is none', async (page) => {
      await fillPattern(page, 'Q1', 'T')
      await shows('Both codes need the same pattern')(page)
    }),
    state('cribManager', '/locations', 'locations, a pattern', async (page) => {
      await fillPattern(page, 'Q1', 'Q3')
      await shows('3 bins, Q1 to Q3')(page)
    }),
    state('cribManager', '/locations', 'locations, what is archived', async (page) => {
      await page.getByText(/^Archived \(/).click()
      await expect(page.getByRole('button', { name: `Bring back ${archived.bin}` })).toBeVisible()
    }),
    state('cribManager', '/locations', 'locations, not brought back', async (page) => {
      await page.getByText(/^Archived \(/).click()
      await page.getByRole('button', { name: `Bring back ${archived.bin}` }).click()
      await shows('bring that back first')(page)
    }),

    state('admin', '/first-day', 'the first day of an admin', shows('Add people')),
    state('admin', '/people', 'people, nobody else', async (page) => {
      await page.route(/\/api\/users/, async (route) => {
        const { rows: people } = await (await route.fetch()).json()
        await route.fulfill({ json: { rows: people.slice(0, 1), nextCursor: null, total: 1 } })
      })
      await page.reload()
      await shows('Nobody but you yet.')(page)
    }),
  ]
}
