import { type ReachField, reachField } from '../reach/reach-fields'

/** What a pocket was asked by, and the field of the reach check, and of a search, that means the same. */
const sharedFields: readonly ReachField[] = [
  reachField('feature', 'depthMm'),
  reachField('feature', 'insideCornerRadiusMm'),
  reachField('feature', 'floorRadiusMm'),
]

function featureQuery(asked: URLSearchParams): URLSearchParams {
  const query = new URLSearchParams()
  for (const field of sharedFields) {
    const value = asked.get(field.name)
    if (value) query.set(field.query, value)
  }
  return query
}

/** The reach check of a cutter that was found, with the feature it was looked for. */
export function reachLink(cutterId: string, asked: URLSearchParams): string {
  return `/reach?${new URLSearchParams([['cutter', cutterId], ...featureQuery(asked)])}`
}

/** The search of the crib for the same feature, in what holds the cutters too. */
export function searchLink(asked: URLSearchParams): string {
  const query = featureQuery(asked)
  if (asked.get('inStock') === 'yes') query.set('stock', 'yes')
  return `/search?${query}`
}
