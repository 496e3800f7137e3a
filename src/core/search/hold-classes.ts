import { colletFitsBore, colletHolds, fixedBoreHolds } from '@/core/holding/holds'
import type { Bore, ColletGeometry } from '@/core/tooling'

/** A way to hold a shank: by a bore alone, or by a collet in it. */
export interface HoldingWay {
  /** Place in the list of owners. */
  owner: number
  /** -1 for a bore alone. */
  collet: number
}

/** Every way to hold one class of shanks: shanks that the very same bores and collets take. */
export interface HoldClasses {
  /** Class of every shank asked about, in the order given. */
  classOf: Int32Array
  /** Ways of each class, by holders and by extensions. */
  byHolder: HoldingWay[][]
  byExtension: HoldingWay[][]
}

/** A distinct bore or collet range, and who offers it. */
interface Grip {
  holds: (shankMm: number) => boolean
  byHolder: HoldingWay[]
  byExtension: HoldingWay[]
}

/**
 * Sorts shanks into classes by what of the crib takes them.
 *
 * Assumes a bore that is null takes nothing, since nobody knows.
 *
 * Shapes     `shanksMm`: any number, repeats allowed. A null collet is refused and holds nothing.
 * Units      Millimetres, diameters.
 * Result     Ways in the order of owners, then of collets.
 * Tolerance  That of `fixedBoreHolds` and `colletHolds`.
 *
 * @example
 * holdClasses([6, 6.01, 8], [{ kind: 'fixed', diameterMm: 6 }], [], []).classOf.join() // => '0,0,1'
 */
export function holdClasses(
  shanksMm: readonly number[],
  holderBores: readonly (Bore | null)[],
  extensionBores: readonly (Bore | null)[],
  collets: readonly (ColletGeometry | null)[],
): HoldClasses {
  const grips = distinctGrips(holderBores, extensionBores, collets)
  const classes = new Map<string, number>()
  const ofShank = new Map<number, number>()
  const byHolder: HoldingWay[][] = []
  const byExtension: HoldingWay[][] = []
  const classFor = (shankMm: number): number => {
    const holding = grips.map((_, index) => index).filter((index) => grips[index]?.holds(shankMm))
    const key = holding.join()
    const known = classes.get(key)
    if (known !== undefined) return known
    byHolder.push(waysOf(holding.flatMap((index) => grips[index]?.byHolder ?? [])))
    byExtension.push(waysOf(holding.flatMap((index) => grips[index]?.byExtension ?? [])))
    classes.set(key, classes.size)
    return classes.size - 1
  }
  const classOf = Int32Array.from(shanksMm, (shankMm) => {
    const known = ofShank.get(shankMm) ?? classFor(shankMm)
    ofShank.set(shankMm, known)
    return known
  })
  return { classOf, byHolder, byExtension }
}

const waysOf = (ways: HoldingWay[]) => ways.sort((a, b) => a.owner - b.owner || a.collet - b.collet)

function distinctGrips(
  holderBores: readonly (Bore | null)[],
  extensionBores: readonly (Bore | null)[],
  collets: readonly (ColletGeometry | null)[],
): Grip[] {
  const grips = new Map<string, Grip>()
  const gripFor = (key: string, holds: Grip['holds']): Grip => {
    const grip = grips.get(key) ?? { holds, byHolder: [], byExtension: [] }
    grips.set(key, grip)
    return grip
  }
  const fitting = colletsBySeries([...holderBores, ...extensionBores], collets)
  const add = (side: 'byHolder' | 'byExtension') => (bore: Bore | null, owner: number) => {
    if (bore?.kind === 'fixed')
      gripFor(`bore ${bore.diameterMm}`, (shankMm) => fixedBoreHolds(bore.diameterMm, shankMm))[side].push({
        owner,
        collet: -1,
      })
    if (bore?.kind === 'collet')
      for (const { collet, geometry } of fitting.get(bore.series) ?? [])
        gripFor(
          `collet ${geometry.minimumMm} ${geometry.maximumMm}`,
          (shankMm) => colletHolds(geometry, shankMm).holds,
        )[side].push({ owner, collet })
  }
  holderBores.forEach(add('byHolder'))
  extensionBores.forEach(add('byExtension'))
  return [...grips.values()]
}

/** The collets that fit each series of bores, as it is written there. */
function colletsBySeries(
  bores: readonly (Bore | null)[],
  collets: readonly (ColletGeometry | null)[],
): Map<string, { collet: number; geometry: ColletGeometry }[]> {
  const bySeries = new Map<string, { collet: number; geometry: ColletGeometry }[]>()
  for (const bore of bores) {
    if (bore?.kind !== 'collet' || bySeries.has(bore.series)) continue
    const fitting = collets.flatMap((geometry, collet) =>
      geometry && colletFitsBore(bore, geometry.series) ? [{ collet, geometry }] : [],
    )
    bySeries.set(bore.series, fitting)
  }
  return bySeries
}
