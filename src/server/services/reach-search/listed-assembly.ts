import type { CuttingSettings } from '@/core/cutting/cut-answer'
import { type StickOutBands, stickOutBand } from '@/core/cutting/stick-out-caution'
import { can } from '@/core/policies/permissions'
import { reachAnswer } from '@/core/reach/reach-answer'
import type { ReachAnswer } from '@/core/reach/types'
import { assemblyRequest } from '@/core/search/assembly-request'
import type { SearchOption } from '@/core/search/types'
import type { ToolingKind } from '@/core/stock/kinds'
import type { CutterGeometry } from '@/core/tooling'
import { bandSentence } from '@/lib/cut-sentences'
import { messageKinds, messageSentence } from '@/lib/reach-sentences'
import type { AssemblyNames } from '@/lib/search-sentences'
import type { CatalogueTypes } from '@/schemas/catalogue'
import type { CutterResponse } from '@/schemas/cutter'
import type { ReachSearchRequest, SearchOptionResponse } from '@/schemas/reach-search'
import type { Actor } from '../../auth/actor'
import type { PiecePlace } from '../../db/read-models/tooling-stock'
import type { CribTables, CutterSource } from './crib-tables'
import type { MachineLimits } from './machine-limits'
import { type MaterialSpeeds, startingSpeed } from './material-speeds'
import type { PartRows } from './named-parts'
import { assemblyQuestion } from './search-question'
import { cutCautions, estimatedCut, type SearchedCut } from './searched-cut'

type Feature = NonNullable<ReachSearchRequest['feature']>

/** What every line of a list is made with. */
export interface ListingContext {
  actor: Actor
  crib: CribTables
  rows: PartRows
  piecePlaces: Map<string, PiecePlace>
  body: ReachSearchRequest
  limits: MachineLimits
  speeds: MaterialSpeeds | null
  cutting: CuttingSettings
  cut: SearchedCut | null
  currency: string
}

/** An assembly of the answer, before it is said why it stands where it stands. */
export type ListedAssembly = Omit<SearchOptionResponse, 'reason' | 'builtAs'>

type Kind = ToolingKind
type Part = { [K in Kind]: { kind: K; row: CatalogueTypes[K]['row'] } }[Kind]

/**
 * An assembly of the search with everything a person needs: its rows, the reach check of it, where its parts lie. Null
 * where a part went out of the catalogue since.
 */
export function listedAssembly(
  option: SearchOption,
  feature: Feature,
  context: ListingContext,
): ListedAssembly | null {
  const { crib, rows, body } = context
  const { tooling } = crib.tables
  const source = crib.cutterSources[option.cutterIndex]
  const geometry = tooling.cutters[option.cutterIndex]?.geometry
  const cutter = source && geometry ? cutterOf(source, geometry, rows, context.piecePlaces) : null
  const holder = rows.holders.get(tooling.holders[option.holderIndex]?.id ?? '')
  const [collet, extensionCollet] = [option.colletIndex, option.extensionColletIndex].map((index) =>
    index === null ? null : (rows.collets.get(tooling.collets[index]?.id ?? '') ?? null),
  )
  const extension =
    option.extensionIndex === null
      ? null
      : (rows.extensions.get(tooling.extensions[option.extensionIndex]?.id ?? '') ?? null)
  const isWhole =
    (option.colletIndex === null || collet != null) &&
    (option.extensionIndex === null || extension != null) &&
    (option.extensionColletIndex === null || extensionCollet != null)
  if (!cutter || !holder || !isWhole) return null
  const asked = assemblyQuestion(feature, body, context.limits)
  const answer = reachAnswer({
    ...assemblyRequest(crib.tables, asked, option),
    sideLoadN: body.sideLoadN ?? null,
    stickOutMm: option.stickOutMm,
  })
  const parts = partsOf({ cutter, holder, collet, extension, extensionCollet })
  const isExtensionUnchecked =
    option.extensionIndex !== null && tooling.extensions[option.extensionIndex]?.shankDiameterMm == null
  const estimate = estimateOf(answer, cutter, holder, context)
  return {
    key: keyOf(option, crib),
    cutter,
    holder,
    collet: collet ?? null,
    extension,
    extensionCollet: extensionCollet ?? null,
    reach: saidAnswer(answer, body.sentenceUnit),
    cautions: [
      ...(estimate && context.cut ? cutCautions({ cutter }, estimate, context.cut, body.sentenceUnit) : []),
      ...cautionsOf(answer, body.sentenceUnit),
      ...bandCautions(answer, context.cutting),
      ...(isExtensionUnchecked ? [extensionCaution(extension?.code ?? '')] : []),
    ],
    stickOut: answer.stickOut,
    stiffness: { ...answer.stiffness, timesStiffest: null },
    stock: assemblyStock(parts),
    speed: startingSpeed(cutter, context.speeds, {
      holder: holder.maximumRpm,
      spindle: context.limits.maximumRpm,
    }),
    estimate,
    ...(can(context.actor.role, 'seeCosts') ? { cost: costOf(parts, context.currency) } : {}),
  }
}

function estimateOf(
  { stiffness }: ReachAnswer,
  cutter: SearchOptionResponse['cutter'],
  holder: SearchOptionResponse['holder'],
  { cut, limits, cutting }: ListingContext,
): SearchOptionResponse['estimate'] {
  if (!cut) return null
  const { complianceUmPerN, stickOutToDiameter } = stiffness
  const assembly = { cutter, holderMaximumRpm: holder.maximumRpm, complianceUmPerN, stickOutToDiameter }
  return estimatedCut(assembly, cut, limits, cutting)
}

function cutterOf(
  source: CutterSource,
  geometry: CutterGeometry,
  { cutters }: PartRows,
  places: Map<string, PiecePlace>,
): SearchOptionResponse['cutter'] | null {
  const row = cutters.get(source.itemId)
  if (!row) return null
  const place = source.piece && places.get(source.piece.id)
  if (!source.piece || !place) return { ...row, piece: null }
  const stock = { ...place.stock, isLow: row.stock.isLow }
  return { ...row, ...measuredFigures(row, geometry), stock, piece: { id: source.piece.id, tag: place.tag } }
}

/** The row with the piece's own figures in place of the catalogue's. */
function measuredFigures(row: CutterResponse, geometry: CutterGeometry): Partial<CutterResponse> {
  return {
    cuttingDiameterMm: geometry.cuttingDiameterMm,
    cornerRadiusMm: geometry.cornerRadiusMm ?? row.cornerRadiusMm,
    lengthOfCutMm: geometry.lengthOfCutMm ?? row.lengthOfCutMm,
    fluteLengthMm: geometry.fluteLengthMm ?? row.fluteLengthMm,
    reachLengthMm: geometry.reachLengthMm ?? row.reachLengthMm,
    overallLengthMm: geometry.overallLengthMm,
  }
}

function keyOf(option: SearchOption, { tables: { tooling } }: CribTables): string {
  const id = (list: readonly { id: string }[], index: number | null) =>
    index === null ? '' : (list[index]?.id ?? '')
  return [
    id(tooling.cutters, option.cutterIndex),
    id(tooling.holders, option.holderIndex),
    id(tooling.collets, option.colletIndex),
    id(tooling.extensions, option.extensionIndex),
    id(tooling.collets, option.extensionColletIndex),
  ].join('.')
}

/** In the order they are fetched and put together. */
function partsOf(assembly: {
  cutter: SearchOptionResponse['cutter']
  holder: SearchOptionResponse['holder']
  collet: SearchOptionResponse['collet'] | undefined
  extension: SearchOptionResponse['extension']
  extensionCollet: SearchOptionResponse['collet'] | undefined
}): Part[] {
  const { cutter, collet, extension, extensionCollet, holder } = assembly
  return [
    { kind: 'cutter', row: cutter },
    ...(collet ? [{ kind: 'collet' as const, row: collet }] : []),
    ...(extension ? [{ kind: 'extension' as const, row: extension }] : []),
    ...(extensionCollet ? [{ kind: 'collet' as const, row: extensionCollet }] : []),
    { kind: 'holder', row: holder },
  ]
}

/** As many whole assemblies as the part there is least of; an item that is needed twice is there half as often. */
function assemblyStock(parts: Part[]): SearchOptionResponse['stock'] {
  const needed = new Map<string, number>()
  for (const { row } of parts) needed.set(row.id, (needed.get(row.id) ?? 0) + 1)
  const whole = (count: (row: Part['row']) => number) =>
    Math.max(0, Math.min(...parts.map(({ row }) => Math.floor(count(row) / (needed.get(row.id) ?? 1)))))
  const seen = new Set<string>()
  return {
    onHand: whole((row) => row.stock.onHand),
    available: whole((row) => row.stock.available),
    locations: parts.flatMap(({ kind, row }) => {
      if (seen.has(row.id)) return []
      seen.add(row.id)
      return row.stock.locations.map((place) => ({ ...place, part: kind, itemId: row.id }))
    }),
  }
}

function costOf(parts: Part[], currency: string): NonNullable<SearchOptionResponse['cost']> {
  const costs = parts.map(({ row }) => row.unitCost ?? null)
  const isKnown = costs.every((cost) => cost !== null)
  return { amount: isKnown ? costs.reduce((sum, cost) => sum + (cost ?? 0), 0) : null, currency }
}

function saidAnswer(
  answer: ReachAnswer,
  unit: ReachSearchRequest['sentenceUnit'],
): SearchOptionResponse['reach'] {
  const messages = answer.messages.map((message) => ({
    code: message.code,
    text: messageSentence(message, unit),
  }))
  return { ...answer, messages }
}

function cautionsOf(answer: ReachAnswer, unit: ReachSearchRequest['sentenceUnit']): string[] {
  return answer.messages
    .filter(({ code }) => messageKinds[code] === 'caution')
    .map((message) => messageSentence(message, unit))
}

/** How far it stands out for its diameter, where the shop takes care of that. */
function bandCautions({ stiffness }: ReachAnswer, bands: StickOutBands): string[] {
  const ratio = stiffness.stickOutToDiameter
  const sentence = bandSentence(stickOutBand(ratio, bands), ratio, bands)
  return sentence === null ? [] : [sentence]
}

function extensionCaution(code: string): string {
  return `The shank of ${code} is not in the catalogue: what holds the extension is not checked.`
}

/** What the assembly is called by. */
export function namesOf({ holder, collet, extension }: ListedAssembly): AssemblyNames {
  return { holder: holder.code, collet: collet?.code ?? null, extension: extension?.code ?? null }
}

/** Parts that cannot be fetched now, in words. */
export function missingPartWords(assembly: ListedAssembly): string[] {
  return partsOf(assembly)
    .filter(({ row }) => row.stock.available <= 0)
    .map(({ kind, row }) => `${kind} ${row.code}`)
}
