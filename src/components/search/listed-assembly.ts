import type { Clearances, Feature } from '@/core/reach/types'
import { askedFeature } from '@/core/search/asked-feature'
import { decimalText } from '@/core/units/decimal-text'
import { type LengthUnit, lengthDecimals } from '@/core/units/length-unit'
import type { ReachSearchBody, SearchNearMissResponse, SearchOptionResponse } from '@/schemas/reach-search'
import { draftQuery } from '../reach/reach-query'
import type { Reading } from '../reach/read-field'
import { type SectionScene, sectionScene } from '../reach/section-scene'
import type { SearchDraft } from './search-question'

export type SearchedAssembly = SearchOptionResponse | SearchNearMissResponse

/** What every line of the answer is shown with. */
export interface AssemblyListing {
  feature: Feature
  request: ReachSearchBody
  draft: SearchDraft
  unit: LengthUnit
  clearances: Clearances
  /** Of the machine chosen; null where there is none, or where it is not known. */
  spindleNoseDiameterMm: number | null
  isChosen: (key: string) => boolean
  /** No more fit side by side. */
  isFull: boolean
  onChoose: (key: string) => void
}

export function sceneOfAssembly(
  assembly: SearchedAssembly,
  { feature, clearances }: Pick<AssemblyListing, 'feature' | 'clearances'>,
): SectionScene | null {
  const { cutter, holder, extension, stickOut } = assembly
  return sectionScene({ feature, cutter, holder, extension, stickOutMm: stickOut.usedMm, clearances })
}

/** The parts in the order they are fetched and put together, by what the trade calls each. */
export function partsOf({ cutter, collet, extension, extensionCollet, holder }: SearchedAssembly) {
  return [
    { word: 'Cutter', row: cutter, tag: cutter.piece?.tag ?? null },
    ...(collet ? [{ word: 'Collet', row: collet, tag: null }] : []),
    ...(extension ? [{ word: 'Extension', row: extension, tag: null }] : []),
    ...(extensionCollet ? [{ word: 'Its collet', row: extensionCollet, tag: null }] : []),
    { word: 'Holder', row: holder, tag: null },
  ]
}

const pieceFields = [
  ['cuttingDiameterMm', 'c.DC'],
  ['cornerRadiusMm', 'c.RE'],
  ['lengthOfCutMm', 'c.APMX'],
  ['fluteLengthMm', 'c.LCF'],
  ['reachLengthMm', 'c.LU'],
  ['overallLengthMm', 'c.OAL'],
] as const

/**
 * The reach check of an assembly, ready in its address; of a measured piece with the piece's own figures, and in the
 * spindle of the machine chosen.
 */
export function reachCheckPath(
  assembly: SearchedAssembly,
  { draft, spindleNoseDiameterMm }: Pick<AssemblyListing, 'draft' | 'spindleNoseDiameterMm'>,
  reading: Reading,
): string {
  const { cutter, holder, collet, extension, stickOut } = assembly
  const query = new URLSearchParams(
    draftQuery(
      {
        ...draft.check,
        picks: {
          cutter: cutter.id,
          holder: holder.id,
          collet: collet?.id ?? null,
          extension: extension?.id ?? null,
        },
      },
      reading,
    ),
  )
  if (cutter.piece) {
    for (const [field, name] of pieceFields) {
      const figure = cutter[field]
      if (figure !== null) query.set(name, decimalText(figure, 0, lengthDecimals))
    }
  }
  if (spindleNoseDiameterMm !== null)
    query.set('h.spindle', decimalText(spindleNoseDiameterMm, 0, lengthDecimals))
  query.set('stickout', decimalText(stickOut.usedMm, 0, lengthDecimals))
  return `/reach?${query}`
}

/** What is kept of an option: its parts, its stick-out, and the feature that was asked of it. */
export function keptOption(assembly: SearchedAssembly, { feature, request }: AssemblyListing) {
  const { cutter, holder, collet, extension, extensionCollet, stickOut } = assembly
  const { shankMm, holderMm } = request.clearances ?? {}
  const isOwnClearance = shankMm != null || holderMm != null
  return {
    feature: askedFeature({ feature, purpose: request.purpose ?? null }),
    cutter: cutter.piece ? { pieceId: cutter.piece.id } : { id: cutter.id },
    holder: { id: holder.id },
    collet: collet && { id: collet.id },
    extension: extension && { id: extension.id },
    extensionCollet: extensionCollet && { id: extensionCollet.id },
    stickOutMm: stickOut.usedMm,
    clearances: isOwnClearance
      ? { ...(shankMm == null ? {} : { shankMm }), ...(holderMm == null ? {} : { holderMm }) }
      : null,
  }
}
