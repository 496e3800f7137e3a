import type { Permission } from '@/core/policies/permissions'
import type { FirstDay, FirstDayStep } from '@/schemas/first-day'
import { firstDaySteps } from '@/schemas/first-day'

export interface StepText {
  id: FirstDayStep
  title: string
  /** What it is for, in a sentence. */
  why: string
  /** How far it has come, from the data. */
  state: string
  link: { href: string; label: string; permission: Permission }
}

const count = (amount: number, one: string, many = `${one}s`) => `${amount} ${amount === 1 ? one : many}`

/** The five steps as the shop stands today. `settings` says its unit and clearances. */
export function stepTexts(firstDay: FirstDay, settings: string): StepText[] {
  const { cribs, bins, cutters, holders, collets, extensions, piecesInBins, people } = firstDay
  const texts: Record<FirstDayStep, Omit<StepText, 'id'>> = {
    settings: {
      title: 'Unit and clearances',
      why: 'Every verdict on reach keeps these clearances. Look at them once and save.',
      state: settings,
      link: { href: '/settings', label: 'Look at the settings', permission: 'administer' },
    },
    bins: {
      title: 'Cribs and bins',
      why: 'Stock lies in bins. Type them one by one, or a whole wall as a pattern such as A1 to F12.',
      state: `${count(cribs, 'crib')}, ${count(bins, 'bin')}.`,
      link: { href: '/locations', label: 'Go to the locations', permission: 'keepCrib' },
    },
    catalogue: {
      title: 'Catalogue',
      why: 'Cutters, holders, collets and extensions come in from CSV files with any headings.',
      state: `${count(cutters, 'cutter')}, ${count(holders, 'holder')}, ${count(collets, 'collet')}, ${count(extensions, 'extension')}.${missingKinds(firstDay)}`,
      link: { href: '/imports/new', label: 'Import a file', permission: 'keepCrib' },
    },
    stock: {
      title: 'Opening stock',
      why: 'What lies in the bins today, by one more CSV file: crib, item, bin, quantity, condition.',
      state: stockState(firstDay),
      link: { href: '/imports/new?kind=stock', label: 'Import opening stock', permission: 'keepCrib' },
    },
    people: {
      title: 'People',
      why: 'Each person gets an account of their own and a link to choose a password.',
      state: people === 1 ? 'Nobody but you.' : `${count(people, 'person', 'people')}.`,
      link: { href: '/people', label: 'Add people', permission: 'administer' },
    },
  }
  if (piecesInBins > 0) texts.stock.state = `${count(piecesInBins, 'piece')} in bins.`
  return firstDaySteps.map((id) => ({ id, ...texts[id] }))
}

function missingKinds({ cutters, holders, collets }: FirstDay): string {
  if (cutters === 0) return ' The reach check needs cutters and holders.'
  if (holders === 0) return ' The reach check needs holders too.'
  return collets === 0 ? ' A collet chuck needs its collets too.' : ''
}

function stockState({ bins, cutters, holders }: FirstDay): string {
  if (bins === 0) return 'Nothing in a bin. It needs bins first.'
  return cutters + holders === 0 ? 'Nothing in a bin. It needs the catalogue first.' : 'Nothing in a bin yet.'
}
