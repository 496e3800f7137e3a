import type { Feature } from '@/core/reach/types'

export interface NamedFeature {
  name: string
  feature: Feature
}

/** From one that nearly every cutter can make to one that few can. */
export const benchFeatures: readonly NamedFeature[] = [
  { name: 'shallow wall', feature: { kind: 'wall', depthMm: 3 } },
  {
    name: 'drafted pocket',
    feature: { kind: 'wall', depthMm: 30, draftDeg: 1, insideCornerRadiusMm: 6, floorRadiusMm: 1 },
  },
  { name: 'deep slot', feature: { kind: 'wall', depthMm: 60, openingWidthMm: 30 } },
  { name: 'leaning wall', feature: { kind: 'wall', depthMm: 40, draftDeg: 5, insideCornerRadiusMm: 8 } },
]

const depthsMm = [4, 8, 12, 18, 25, 32, 40, 55]
const draftsDeg = [0, 0, 0, 0.5, 1, 3, 5]
const holesMm = [5, 6, 8, 10, 12.7, 20]

/** Forty of a part: pockets, walls of several drafts, holes, a few with a boss or a tilted ball. */
export const fortyFeatures: readonly Feature[] = Array.from({ length: 40 }, (_, at): Feature => {
  const depthMm = depthsMm[(at * 3) % depthsMm.length] ?? 10
  if (at % 4 === 3) return { kind: 'hole', depthMm, diameterMm: holesMm[at % holesMm.length] ?? 8 }
  if (at % 10 === 4) return { kind: 'wall', depthMm, draftDeg: 3, tiltDeg: 10 + at / 4 }
  const draftDeg = draftsDeg[(at * 5) % draftsDeg.length] ?? 0
  if (at % 10 === 6) return { kind: 'wall', depthMm, draftDeg, obstacles: [{ setbackMm: 8, riseMm: 20 }] }
  return {
    kind: 'wall',
    depthMm,
    draftDeg,
    insideCornerRadiusMm: at % 3 === 0 ? 5 : null,
    openingWidthMm: at % 3 === 1 ? 24 : null,
    floorRadiusMm: at % 2 === 0 ? 1 : null,
  }
})
