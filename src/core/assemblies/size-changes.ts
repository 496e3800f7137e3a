import { type AssemblyPartKind, partItemKind, type SizeChange } from './types'

/** The sizes a check goes by, part by part; a cost or a description is none. */
const sizeFields: Readonly<Record<ReturnType<typeof partItemKind>, readonly string[]>> = {
  cutter: [
    'form',
    'cuttingDiameterMm',
    'cornerRadiusMm',
    'taperHalfAngleDeg',
    'pointAngleDeg',
    'tipDiameterMm',
    'lengthOfCutMm',
    'fluteLengthMm',
    'neckDiameterMm',
    'neckTaperHalfAngleDeg',
    'reachLengthMm',
    'neckTransitionAngleDeg',
    'shankDiameterMm',
    'overallLengthMm',
    'substrate',
  ],
  holder: [
    'gaugeLengthMm',
    'bore',
    'boreDepthMm',
    'minimumGripMm',
    'gripStartMm',
    'sideLockInsertionMm',
    'segments',
  ],
  collet: ['series', 'minimumMm', 'maximumMm', 'lengthMm', 'minimumGripMm'],
  extension: [
    'projectionMm',
    'bore',
    'boreDepthMm',
    'minimumGripMm',
    'gripStartMm',
    'shankDiameterMm',
    'segments',
  ],
}

/** A difference below this is the rounding of a length. */
const sameMm = 1e-9

type Sizes = Readonly<Record<string, unknown>>

/**
 * The sizes of a part that a check goes by, and nothing else of its row.
 *
 * @example
 * sizesOf('collet', { code: 'C-1', series: 'ER16', minimumMm: 3, maximumMm: 4 }) // => { series: 'ER16', minimumMm: 3, maximumMm: 4 }
 */
export function sizesOf(kind: AssemblyPartKind, row: object): Record<string, unknown> {
  const members: Sizes = { ...row }
  return Object.fromEntries(
    sizeFields[partItemKind(kind)].flatMap((field) =>
      members[field] == null ? [] : [[field, members[field]]],
    ),
  )
}

/**
 * What differs between two states of one part's sizes.
 *
 * Shapes     Two records of sizes; a size that is absent and one that is null are both not given.
 * Result     One entry a size that differs, in the order of the sizes; an outline is one size.
 * Tolerance  Numbers that differ by no more than 1e-9 are the same.
 *
 * @example
 * sizeChanges('collet', { minimumMm: 3, maximumMm: 4 }, { minimumMm: 3, maximumMm: 5 }) // => [{ field: 'maximumMm', before: 4, after: 5 }]
 */
export function sizeChanges(kind: AssemblyPartKind, before: object, after: object): SizeChange[] {
  const [old, now]: [Sizes, Sizes] = [{ ...before }, { ...after }]
  return sizeFields[partItemKind(kind)]
    .filter((field) => !isSame(old[field] ?? null, now[field] ?? null))
    .map((field) => ({ field, before: old[field] ?? null, after: now[field] ?? null }))
}

function isSame(one: unknown, other: unknown): boolean {
  if (typeof one === 'number' && typeof other === 'number') return Math.abs(one - other) <= sameMm
  if (one === null || other === null || typeof one !== 'object' || typeof other !== 'object')
    return one === other
  const [a, b]: [Sizes, Sizes] = [{ ...one }, { ...other }]
  const names = new Set([...Object.keys(a), ...Object.keys(b)])
  return [...names].every((name) => isSame(a[name] ?? null, b[name] ?? null))
}
