import type { Permission } from '@/core/policies/permissions'

export interface NavigationLink {
  href: string
  label: string
  permission: Permission
}

export interface NavigationGroup {
  label: string
  links: readonly NavigationLink[]
}

/** First of all while a shop still lacks what it begins with. */
export const firstDayGroup: NavigationGroup = {
  label: 'Begin',
  links: [{ href: '/first-day', label: 'First day', permission: 'keepCrib' }],
}

/** The places of the product, in the order of the work: ask, look up, bring in, keep. */
export const navigationGroups: readonly NavigationGroup[] = [
  {
    label: 'Calculate',
    links: [
      { href: '/search', label: 'Find a tool', permission: 'see' },
      { href: '/reach', label: 'Reach', permission: 'see' },
      { href: '/ball-speed', label: 'Ball-end speed', permission: 'see' },
      { href: '/starting-speeds', label: 'Speeds', permission: 'see' },
    ],
  },
  {
    label: 'Catalogue',
    links: [
      { href: '/cutters', label: 'Cutters', permission: 'see' },
      { href: '/holders', label: 'Holders', permission: 'see' },
      { href: '/collets', label: 'Collets', permission: 'see' },
      { href: '/extensions', label: 'Extensions', permission: 'see' },
      { href: '/fixtures', label: 'Fixtures', permission: 'see' },
      { href: '/fits', label: 'Fits', permission: 'see' },
    ],
  },
  {
    label: 'Crib',
    links: [
      { href: '/assemblies', label: 'Assemblies', permission: 'see' },
      { href: '/machines', label: 'Machines', permission: 'see' },
      { href: '/locations', label: 'Locations', permission: 'see' },
      { href: '/alerts', label: 'Low stock', permission: 'see' },
      { href: '/imports', label: 'Imports', permission: 'keepCrib' },
    ],
  },
  {
    label: 'Shop',
    links: [
      { href: '/people', label: 'People', permission: 'administer' },
      { href: '/settings', label: 'Settings', permission: 'administer' },
    ],
  },
]
