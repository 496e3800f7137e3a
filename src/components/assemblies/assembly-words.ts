import { isOverTolerance } from '@/core/assemblies/assembly-figures'
import type { LengthUnit } from '@/core/units/length-unit'
import { differenceWords } from '@/lib/assembly-sentences'
import type { AssemblyPart, AssemblyPlace, AssemblyRow } from '@/schemas/assembly'
import { conditionNames } from '../catalogue/stock-words'

/** Where something is: a bin by its crib and code, a machine by its code, anything else by its name. */
export function placeWords({ cribCode, kind, code, name }: AssemblyPlace): string {
  if (cribCode !== null) return `${cribCode} ${code}`
  return kind === 'machine' ? code : name
}

/** Where an assembly is now, in as few words as a list has room for. */
export function spotWords({ state, machine, pocket, place }: AssemblyRow): string {
  if (state === 'planned') return 'Not built'
  if (state === 'brokenDown') return 'Broken down'
  if (machine) return pocket === null ? machine.code : `${machine.code}, pocket ${pocket}`
  return place?.name ?? ''
}

/** Where a part is, or where the most of it lies. */
export function partPlaceWords({ place, condition, bins, isTrackedByPiece, pieceTag }: AssemblyPart): string {
  const piece = isTrackedByPiece && pieceTag ? `${pieceTag} · ` : ''
  if (place && condition) return `${piece}${placeWords(place)}, ${conditionNames[condition].toLowerCase()}`
  const [fullest, ...others] = bins
  if (!fullest) return `${piece}None in any bin`
  const more = others.length > 0 ? ` and ${others.length} more` : ''
  const inCondition = conditionNames[fullest.condition].toLowerCase()
  return `${piece}${placeWords(fullest.place)}, ${inCondition}: ${fullest.quantity}${more}`
}

export interface MeasuredDifference {
  text: string
  isOver: boolean
}

/** A measured figure against the calculated one. */
export function difference(
  measuredMm: number,
  calculatedMm: number,
  toleranceMm: number,
  unit: LengthUnit,
): MeasuredDifference {
  return {
    text: differenceWords(measuredMm, calculatedMm, unit),
    isOver: isOverTolerance(measuredMm, calculatedMm, toleranceMm),
  }
}
