import { type ReachField, reachField } from '../reach/reach-fields'

/** What a pocket was asked by, and the field of the reach check that means the same. */
const sharedFields: readonly ReachField[] = [
  reachField('feature', 'depthMm'),
  reachField('feature', 'insideCornerRadiusMm'),
  reachField('feature', 'floorRadiusMm'),
]

/** The reach check of a cutter that was found, with the feature it was looked for. */
export function reachLink(cutterId: string, asked: URLSearchParams): string {
  const query = new URLSearchParams({ cutter: cutterId })
  for (const field of sharedFields) {
    const value = asked.get(field.name)
    if (value) query.set(field.query, value)
  }
  return `/reach?${query}`
}
