import type { Values } from './check-context'
import { type ReachField, reachField, type ToolSlot } from './reach-fields'

export interface FiguresGiven {
  featureKind: 'wall' | 'hole'
  feature: Values
  cutter: Values
  holder: Values
  /** null where none is used. */
  collet: Values | null
  extension: Values | null
  hasSegments: boolean
  hasExtensionSegments: boolean
  /** Picked, and not read from the crib yet. */
  unloaded: readonly ToolSlot[]
}

/** What a check can't do without and hasn't got yet, in the order it is asked for. */
export function missingFigures(given: FiguresGiven): string[] {
  return [
    ...missing(
      given.feature,
      'feature',
      given.featureKind === 'hole' ? ['diameterMm', 'depthMm'] : ['depthMm'],
    ),
    ...(given.unloaded.includes('cutter') ? ['the cutter from the crib'] : missingOfCutter(given.cutter)),
    ...(given.unloaded.includes('holder') ? ['the holder from the crib'] : missingOfHolder(given)),
    ...(given.unloaded.includes('extension') ? ['the extension from the crib'] : missingOfExtension(given)),
    ...(given.unloaded.includes('collet')
      ? ['the collet from the crib']
      : given.collet
        ? missing(given.collet, 'collet', ['series', 'minimumMm', 'maximumMm'])
        : []),
  ]
}

function missing(values: Values, group: ReachField['group'], names: readonly string[]): string[] {
  return names
    .filter((name) => values[name] == null)
    .map((name) => phrase(group, reachField(group, name).label))
}

function phrase(group: ReachField['group'], label: string): string {
  const name = label.toLowerCase()
  return group === 'feature' ? `the ${name}` : `the ${group}’s ${name}`
}

function missingOfCutter(cutter: Values): string[] {
  const lengths =
    cutter.lengthOfCutMm == null && cutter.fluteLengthMm == null ? ['the cutter’s length of cut'] : []
  const ofForm: Readonly<Record<string, readonly string[]>> = {
    cornerRadius: ['cornerRadiusMm'],
    tapered: ['taperHalfAngleDeg'],
    drill: ['pointAngleDeg'],
  }
  return [
    ...missing(cutter, 'cutter', ['cuttingDiameterMm', ...(ofForm[String(cutter.form)] ?? [])]),
    ...lengths,
    ...missing(cutter, 'cutter', ['shankDiameterMm', 'overallLengthMm']),
  ]
}

function missingOfHolder(given: FiguresGiven): string[] {
  const { holder, hasSegments, extension, collet } = given
  return [
    ...missing(holder, 'holder', ['gaugeLengthMm']),
    ...(hasSegments ? [] : ['the holder’s outline']),
    ...(extension ? [] : missingOfClamping(holder, 'holder', collet, given.unloaded)),
  ]
}

function missingOfExtension(given: FiguresGiven): string[] {
  const { extension, hasExtensionSegments, collet } = given
  if (!extension) return []
  return [
    ...missing(extension, 'extension', ['projectionMm']),
    ...(hasExtensionSegments ? [] : ['the extension’s outline']),
    ...missingOfClamping(extension, 'extension', collet, given.unloaded),
  ]
}

/** Whatever holds the shank must say how deep it goes and how much of it is held. */
function missingOfClamping(
  owner: Values,
  name: 'holder' | 'extension',
  collet: Values | null,
  unloaded: readonly ToolSlot[],
): string[] {
  const isGripKnown =
    owner.minimumGripMm != null ||
    owner.sideLockInsertionMm != null ||
    collet?.lengthMm != null ||
    collet?.minimumGripMm != null ||
    unloaded.includes('collet')
  const grip =
    owner.boreKind === 'collet' ? `a collet, or the ${name}’s least grip` : `the ${name}’s least grip`
  return [...missing(owner, name, ['boreDepthMm']), ...(isGripKnown ? [] : [grip])]
}
