import type { Page } from '@playwright/test'
import { expect } from '@playwright/test'
import type { Role } from '@/core/policies/permissions'
import type { ShownAssemblies } from './kept-assemblies'
import type { MachineRows } from './machine-rows'
import type { NeckedToolRows } from './shop-rows'

/** A state of a page: where it is, who sees it, and what is done until it stands. */
export interface PageState {
  name: string
  role: Role | null
  path: string
  /** Answers once what is to be looked at is there. */
  reach: (page: Page) => Promise<unknown>
}

const unreachable = 'Leadline cannot be reached'

export const neckedCheck =
  'c.form=square&c.DC=3.175&c.APMX=6.35&c.LCF=6.35&c.DN=3&c.LU=38.1&c.DMM=3.175&c.OAL=76.2' +
  '&h.A=100&h.depth=75&h.grip=10&h.segments=nut:18x28'

const shows = (text: string | RegExp) => (page: Page) => expect(page.getByText(text).first()).toBeVisible()
const heading = (name: string | RegExp) => (page: Page) =>
  expect(page.getByRole('heading', { name }).first()).toBeVisible()
const verdict = (text: string) => (page: Page) => expect(page.getByTestId('verdict')).toContainText(text)

/** Presses a button, then waits for the dialog it opens. */
const opens = (name: string | RegExp) => async (page: Page) => {
  await page.getByRole('button', { name }).first().click()
  await expect(page.getByRole('dialog')).toBeVisible()
}

const listRow = (page: Page) =>
  expect(page.locator('[row-id], main li a').filter({ visible: true }).first()).toBeVisible()

/** Opens a dialog and sends what cannot be taken, so that the faults stand beside their fields. */
const refused = (open: string | RegExp, send: string) => async (page: Page) => {
  await opens(open)(page)
  await page.getByRole('dialog').getByRole('button', { name: send }).click()
  await expect(page.getByRole('dialog').locator('[aria-invalid="true"]').first()).toBeVisible()
}

/** Opens a dialog and types into a field what cannot be read. */
const refusedAfter = (open: string, field: string, text: string) => async (page: Page) => {
  await opens(open)(page)
  const typed = page.getByRole('dialog').getByLabel(field)
  await typed.fill(text)
  await expect(typed).toHaveAttribute('aria-invalid', 'true')
}

const withoutServer = (pattern: RegExp) => async (page: Page) => {
  await page.route(pattern, (route) => route.abort())
  await page.reload()
  await expect(page.getByText(unreachable).first()).toBeVisible()
}

/** What the pages are shown of. */
export interface StateRows {
  rows: NeckedToolRows
  importId: string
  extensionId: string
  machine: MachineRows
  assemblies: ShownAssemblies
  /** The path of a one-time address that still opens. */
  invitation: string
}

/** Every page, with the dialogs it opens and the faults it shows. */
export function pageStates({
  rows,
  importId,
  extensionId,
  machine,
  assemblies,
  invitation,
}: StateRows): PageState[] {
  const cutter = `/cutters/${rows.cutterId}`
  const onMachine = `/machines/${machine.machineId}`
  const planned = `/assemblies/${assemblies.plannedId}`
  const marked = `/assemblies/${assemblies.markedId}`
  const state = (role: Role | null, path: string, name: string, reach: PageState['reach']) => ({
    role,
    path,
    name,
    reach,
  })
  return [
    state(null, '/sign-in', 'sign in', heading('Sign in')),
    state(null, '/sign-in', 'sign in refused', async (page) => {
      await page.getByLabel('E-mail address').fill('nobody@leadline.example')
      await page.getByLabel('Password').fill('not a password')
      await page.getByRole('button', { name: 'Sign in' }).click()
      await expect(page.getByRole('alert').filter({ hasText: /\w/ })).toBeVisible()
    }),
    state(null, invitation, 'an invitation, refused', async (page) => {
      await page.getByLabel('Password').fill('short')
      await page.getByRole('button', { name: 'Set password' }).click()
      await expect(page.getByLabel('Password')).toHaveAttribute('aria-invalid', 'true')
    }),
    state(null, '/invitation/made-up', 'a dead invitation', heading('This address no longer opens')),
    state(null, '/setup/made-up', 'a dead setup', heading(/./)),

    state('machinist', '/reach', 'reach, nothing given', verdict('Does it reach?')),
    state('machinist', `/reach?depth=25&${neckedCheck}`, 'reach holds', verdict('Reaches 25 mm')),
    state(
      'machinist',
      `/reach?depth=45&draft=2&obstacles=5x9&${neckedCheck}`,
      'reach collides',
      verdict('.'),
    ),
    state(
      'machinist',
      `/reach?depth=25&${neckedCheck}`,
      'reach, a field that cannot be read',
      async (page) => {
        await page.getByRole('textbox', { name: /^Depth/ }).fill('25 cubits')
        await verdict('One field needs another look')(page)
      },
    ),
    state('machinist', '/reach', 'reach, picking from the crib', async (page) => {
      const cutters = page.getByRole('region', { name: 'Cutter', exact: true })
      await cutters.getByRole('combobox', { name: 'Pick from the crib' }).fill(rows.cutterCode)
      await expect(cutters.getByRole('listbox').getByRole('option')).toHaveCount(1)
    }),
    state('machinist', `/reach?cutter=${rows.cutterId}&depth=10`, 'reach, a cutter picked', async (page) => {
      await expect(page.getByRole('link', { name: rows.cutterCode })).toBeVisible()
    }),
    state(
      'machinist',
      '/search',
      'finding a tool, nothing asked',
      shows('The crib is searched for everything'),
    ),
    state(
      'machinist',
      '/search?depth=25&opening=20&corner=3&for=finishing&stepover=0.3&cusp=0.01',
      'what reaches and what falls short',
      async (page) => {
        await shows(/assemblies reach/)(page)
        await heading('Falls short')(page)
      },
    ),
    state(
      'cribManager',
      '/search?depth=25&rank=cost',
      'what reaches, by its cost',
      shows('Cost of its parts'),
    ),
    state('machinist', '/search', 'finding a tool, refused', async (page) => {
      await page.getByRole('button', { name: 'Find', exact: true }).click()
      await shows('Enter the depth.')(page)
    }),
    state('machinist', '/search?depth=25', 'finding a tool, failed', withoutServer(/\/api\/reach\/search/)),
    state(
      'machinist',
      '/ball-speed?cuttingDiameterMm=6&depthOfCutMm=0.3&tiltDeg=0&spindleRpm=20000&stepoverMm=0.3',
      'ball-end speed',
      shows('The dead tip is in the cut and rubs'),
    ),
    state('machinist', '/assemblies', 'assemblies', shows('Deep pocket')),
    state('machinist', '/assemblies?q=zzzzzzzzzz', 'assemblies, none found', shows('No assembly matches')),
    state('machinist', '/assemblies', 'assemblies, failed', withoutServer(/\/api\/assemblies\?/)),
    state('machinist', '/assemblies', 'assemblies, a presetter’s file', opens('Presetter file')),
    state('machinist', planned, 'an assembly, planned', shows('Stick-out to set')),
    state('machinist', planned, 'an assembly, building', opens('Build')),
    state('machinist', planned, 'an assembly, changing', refusedAfter('Change', 'Stick-out', 'a bit')),
    state('cribManager', marked, 'an assembly that no longer holds', shows('don’t run it as it was noted')),
    state('cribManager', marked, 'an assembly, measuring', refusedAfter('Measure', 'Gauge length', 'long')),
    state('cribManager', marked, 'an assembly, moving', opens('Move')),
    state('cribManager', marked, 'an assembly, breaking down', opens('Break down')),
    state('machinist', '/not-allowed', 'not allowed', (page) =>
      expect(page.getByRole('main')).toContainText(/\w/),
    ),
    state('machinist', '/no-such-page', 'no such page', shows('There is nothing at this address')),
    state('machinist', '/account', 'account', heading('Password')),
    state('machinist', cutter, 'a cutter, issuing', opens('Issue')),
    state('machinist', cutter, 'a cutter, returning', opens('Return')),

    state('cribManager', '/cutters', 'cutters', listRow),
    state('cribManager', '/cutters?q=zzzzzzzzzz', 'cutters, nothing found', shows('No cutter matches')),
    state('cribManager', '/cutters', 'cutters, failed', withoutServer(/\/api\/cutters\?/)),
    state('cribManager', '/cutters', 'cutters, adding', refused('Add a cutter', 'Add the cutter')),
    state('cribManager', '/holders', 'holders', listRow),
    state('cribManager', '/holders', 'holders, adding', refused('Add a holder', 'Add the holder')),
    state('cribManager', '/collets', 'collets', listRow),
    state('cribManager', '/extensions', 'extensions', listRow),
    state('cribManager', cutter, 'a cutter', shows('Adjustment 5')),
    state('cribManager', cutter, 'a cutter, edited', opens('Edit')),
    state('cribManager', cutter, 'a cutter, not archived', async (page) => {
      await opens('Archive')(page)
      await page.getByRole('button', { name: 'Archive it' }).click()
      await expect(page.getByRole('dialog').getByRole('alert')).toBeVisible()
    }),
    state('cribManager', cutter, 'a cutter, reversing', opens('Reverse')),
    state('cribManager', cutter, 'a cutter, its parts failed', withoutServer(/\/api\/items\//)),
    state('cribManager', cutter, 'a cutter, a stale edit', async (page) => {
      await opens('Edit')(page)
      await page.getByRole('dialog').getByLabel('Maker', { exact: true }).fill('Mine')
      const { version } = await (await page.request.get(`/api${cutter}`)).json()
      await page.request.patch(`/api${cutter}`, { data: { version, maker: `Theirs ${version}` } })
      await page.getByRole('dialog').getByRole('button', { name: 'Save the changes' }).click()
      await shows('Nothing of yours was saved')(page)
    }),
    state('cribManager', `/holders/${rows.holderId}`, 'a holder', shows('What fits it')),
    state('cribManager', `/collets/${rows.colletId}`, 'a collet', shows('What fits it')),
    state('cribManager', `/extensions/${extensionId}`, 'an extension', shows('What fits it')),
    state('cribManager', '/fixtures', 'fixtures', listRow),
    state('cribManager', '/fixtures', 'fixtures, adding', refused('Add a fixture', 'Add the fixture')),
    state('cribManager', '/machines', 'machines', shows(machine.code)),
    state('cribManager', '/machines', 'machines, adding', refused('Add a machine', 'Save')),
    state('cribManager', onMachine, 'a machine', shows('Takes gauge lengths from')),
    state(
      'cribManager',
      `${onMachine}?holder=${machine.longHolder.id}&stickOutMm=40`,
      'a machine, a tool too long',
      shows('too long by 5 mm'),
    ),
    state('cribManager', onMachine, 'a machine, changed', opens('Change the machine')),
    state('cribManager', onMachine, 'a set-up, adding', refused('Add a set-up', 'Save')),
    state('cribManager', onMachine, 'a set-up, changed', opens('Change the set-up')),
    state('cribManager', '/locations', 'locations', shows('All that lies in it')),
    state('cribManager', '/locations', 'locations, a bin', opens('Bin A-1')),
    state('cribManager', '/locations', 'locations, adding', refused('Add a crib', 'Add')),
    state('cribManager', '/locations', 'locations, failed', withoutServer(/\/api\/locations/)),
    state('cribManager', '/imports', 'imports', heading('Imports')),
    state('cribManager', '/imports/new', 'a new import', heading('Example files')),
    state('cribManager', '/imports/new', 'a new import without a file', async (page) => {
      await page.getByRole('button', { name: 'Upload and check' }).click()
      await shows('Choose a file first.')(page)
    }),
    state('cribManager', `/imports/${importId}`, 'an import, rejects', shows('is not a length')),
    state(
      'cribManager',
      `/imports/${importId}?show=columns`,
      'an import, columns',
      shows('known by its heading'),
    ),
    state('cribManager', `/imports/${importId}`, 'an import, cancelling', opens('Cancel the import')),

    state('admin', '/people', 'people', heading('People')),
    state('admin', '/people', 'people, adding', refused('Add a person', 'Add and make the invitation')),
    state('admin', '/people', 'people, a one-time address', async (page) => {
      await page.getByRole('row').filter({ hasText: 'no password yet' }).last().getByRole('button').click()
      await page.getByRole('button', { name: 'Make a new invitation' }).click()
      await expect(page.getByLabel('One-time address to set a password')).toBeVisible()
    }),
    state('admin', '/settings', 'settings', heading('Shop settings')),
    state('admin', '/settings', 'settings refused', async (page) => {
      await page.getByLabel('Hole tolerance').fill('a bit')
      await expect(page.getByLabel('Hole tolerance')).toHaveAttribute('aria-invalid', 'true')
    }),
  ]
}

/** What only a desk has. */
export const deskStates: PageState[] = [
  {
    name: 'cutters, choosing columns',
    role: 'cribManager',
    path: '/cutters',
    reach: async (page) => {
      await listRow(page)
      await page.getByRole('button', { name: 'Columns' }).click()
      await expect(page.getByRole('list', { name: 'Shown', exact: true })).toBeVisible()
    },
  },
]

/** What only a phone has. */
export const phoneStates: PageState[] = [
  { name: 'the menu', role: 'admin', path: '/account', reach: opens('Menu') },
  { name: 'sorting and filtering', role: 'machinist', path: '/cutters', reach: opens(/^Filters/) },
]
