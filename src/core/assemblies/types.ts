import type { Clearances, Feature, ReachAnswer } from '../reach/types'
import type { Bore, ColletGeometry, CutterGeometry, ExtensionGeometry, HolderGeometry } from '../tooling'

/** `brokenDown` may be built again: the recipe stays. */
export const assemblyStates = ['planned', 'built', 'brokenDown'] as const
export type AssemblyState = (typeof assemblyStates)[number]

/**
 * What an assembly is put together from, in the order a person does it. A `collet` holds the cutter; an `extensionCollet`
 * holds the extension's own shank in the holder.
 */
export const assemblyPartKinds = ['cutter', 'collet', 'extension', 'extensionCollet', 'holder'] as const
export type AssemblyPartKind = (typeof assemblyPartKinds)[number]

/**
 * The kind of item a part is of.
 *
 * @example
 * partItemKind('extensionCollet') // => 'collet'
 */
export function partItemKind(part: AssemblyPartKind): Exclude<AssemblyPartKind, 'extensionCollet'> {
  return part === 'extensionCollet' ? 'collet' : part
}

export type HoldingSizes<Geometry> = Geometry & { bore: Bore }

/** What an extension is held by is its own shank; null or absent where that was not entered. */
export type ExtensionSizes = HoldingSizes<ExtensionGeometry> & { shankDiameterMm?: number | null }

/** The sizes of every part; a cutter's are those of its piece where that was measured. */
export interface AssemblyTools {
  cutter: CutterGeometry
  holder: HoldingSizes<HolderGeometry>
  collet: ColletGeometry | null
  extension: ExtensionSizes | null
  extensionCollet: ColletGeometry | null
}

/** One size of a part before and after: a plain value, a bore or the segments of an outline. */
export interface SizeChange {
  field: string
  before: unknown
  after: unknown
}

/** A check kept with an assembly. */
export interface KeptCheck {
  id: string
  feature: Feature
  /** null: the shop's own, whatever they are. */
  clearances: Partial<Clearances> | null
}

/** What the books know of a part that should be with a built assembly. */
export interface PartPresence {
  /** Pieces of it there, in that condition; of a tagged piece 1 or 0. */
  held: number
  /** Pieces that all assemblies there take for theirs. */
  claimed: number
}

export interface PartNow {
  kind: AssemblyPartKind
  isArchived: boolean
  /** null while it has no place: the assembly is not built. */
  presence: PartPresence | null
}

export const offsetNames = ['gaugeLength', 'diameter', 'cornerRadius'] as const
export type OffsetName = (typeof offsetNames)[number]

export const findingCodes = [
  'sizesChanged',
  'offsetChanged',
  'checkFails',
  'checkFailsAsMeasured',
  'checkImpossible',
  'partGone',
  'partArchived',
] as const
export type FindingCode = (typeof findingCodes)[number]

/** What looking again found, with what its sentence needs. */
export type FindingDetail =
  /** Sizes differ from those taken over; whether that matters is said by the others. */
  | { code: 'sizesChanged'; part: AssemblyPartKind; changes: SizeChange[] }
  /** What was noted in the control is no longer so. */
  | { code: 'offsetChanged'; offset: OffsetName; beforeMm: number; afterMm: number }
  | { code: 'checkFails'; checkId: string; feature: Feature; answer: ReachAnswer }
  /** The check holds as calculated, not at the stick-out that was measured. */
  | { code: 'checkFailsAsMeasured'; checkId: string; feature: Feature; answer: ReachAnswer }
  /** The sizes make no tool that could be checked. */
  | { code: 'checkImpossible'; checkId: string; message: string }
  | { code: 'partGone'; part: AssemblyPartKind; held: number; claimed: number }
  | { code: 'partArchived'; part: AssemblyPartKind }

export interface Finding {
  /** What it is about: found again, it is the same finding. */
  key: string
  /** Something no longer holds; otherwise it is what changed and holds all the same. */
  isFault: boolean
  checkId: string | null
  detail: FindingDetail
}
