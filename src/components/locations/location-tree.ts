import type { TreeLocationKind } from '@/core/stock/kinds'
import type { LocationResponse } from '@/schemas/location'

export interface LocationNode {
  location: LocationResponse
  children: LocationNode[]
}

const inOrder = new Intl.Collator('en', { numeric: true })

/** The places of the shop as they stand in each other: cribs first, then what is in no crib. */
export function locationTree(locations: LocationResponse[]): {
  cribs: LocationNode[]
  others: LocationResponse[]
} {
  const nodes = new Map(
    locations.map((location): [string, LocationNode] => [location.id, { location, children: [] }]),
  )
  for (const node of nodes.values()) {
    if (node.location.parentId) nodes.get(node.location.parentId)?.children.push(node)
  }
  for (const node of nodes.values()) {
    node.children.sort((one, other) => inOrder.compare(one.location.code, other.location.code))
  }
  return {
    cribs: [...nodes.values()].filter(({ location }) => location.kind === 'crib'),
    others: locations.filter(({ cribId }) => cribId === null),
  }
}

/** What may be put into a place of this kind, the likeliest first. */
export const kindsWithin: Record<TreeLocationKind, readonly ('cabinet' | 'drawer' | 'bin')[]> = {
  crib: ['cabinet', 'drawer', 'bin'],
  cabinet: ['drawer', 'bin'],
  drawer: ['bin'],
  bin: [],
}

/** A bin's code without what its drawer's says already: `A1-07` in A1 is `07`. */
export function shortCode(code: string, parentCode: string): string {
  const rest = code.startsWith(parentCode) ? code.slice(parentCode.length).replace(/^[-./\s]+/, '') : ''
  return rest || code
}
