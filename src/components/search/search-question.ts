import { findWorkMaterial } from '@/core/cutting/work-materials'
import type { ReachSettings } from '@/core/reach/types'
import { type CutterForm, cutterForms, type Substrate, substrates } from '@/core/tooling'
import {
  type ReachSearchBody,
  type SearchPurpose,
  type SearchRanking,
  searchPurposes,
  searchRankings,
} from '@/schemas/reach-search'
import { compileCheck, type FieldErrors } from '../reach/compile-check'
import { featureOnly } from '../reach/feature-only'
import type { ReachDraft } from '../reach/reach-draft'
import type { FieldKind } from '../reach/reach-fields'
import { draftQuery, queryDraft } from '../reach/reach-query'
import { fieldText, type Reading, readField } from '../reach/read-field'

/** The figures asked beside the feature, by the names the address bar gives them. */
export const searchTexts = {
  stepover: { label: 'Stepover', kind: 'length', path: 'scallop.stepoverMm' },
  cusp: { label: 'Highest cusp', kind: 'length', path: 'scallop.maximumHeightMm' },
  ratio: {
    label: 'Longest stick-out to diameter',
    kind: 'number',
    path: 'where.longestStickOutToDiameter',
  },
  ap: { label: 'Cut depth', kind: 'length', path: 'cut.depthOfCutMm' },
  ae: { label: 'Cut width', kind: 'length', path: 'cut.stepoverMm' },
  fz: { label: 'Feed a tooth', kind: 'length', path: 'cut.feedMm' },
  vc: { label: 'Cutting speed', kind: 'speed', path: 'cut.cuttingSpeedMPerMin' },
} as const satisfies Record<string, { label: string; kind: FieldKind; path: string }>
export type SearchText = keyof typeof searchTexts
export const searchTextNames = Object.keys(searchTexts) as SearchText[]

/** Those that say what cut is to be estimated, beside its material. */
export const cutTextNames = ['ap', 'ae', 'fz', 'vc'] as const satisfies readonly SearchText[]
export const cutMaterialPath = 'cut.materialNumber'

/** What is chosen, not typed: it asks again at once. */
export interface SearchChoices {
  rankBy: SearchRanking
  cribId: string | null
  machineId: string | null
  setUpId: string | null
  isInStockOnly: boolean
  forms: readonly CutterForm[]
  substrates: readonly Substrate[]
  /** A material of the shop's starting speeds. */
  material: string | null
}

/** A search as the person has it. */
export interface SearchDraft {
  check: ReachDraft
  purpose: SearchPurpose | null
  texts: Readonly<Record<SearchText, string>>
  /** Of the cut to be estimated: its number in the table. */
  cutMaterial: number | null
  choices: SearchChoices
}

/** How the address bar writes figures. */
const plain: Reading = { unit: 'mm', decimalComma: false }
const unreadMark = 'unread:'

/** The search an address stands for, its figures in the reader's unit. */
export function searchDraft(query: URLSearchParams, reading: Reading): SearchDraft {
  const purpose = searchPurposes.find((known) => known === query.get('for')) ?? null
  const texts = Object.fromEntries(
    searchTextNames.map((name) => [name, typedText(name, query.get(name), reading)]),
  ) as Record<SearchText, string>
  const cutMaterial = findWorkMaterial(Number(query.get('cut')))?.number ?? null
  return { check: askedCheck(query, reading), purpose, texts, cutMaterial, choices: searchChoices(query) }
}

/** Beside the feature a cutter may be named: what is looked for is then what holds it. */
function askedCheck(query: URLSearchParams, reading: Reading): ReachDraft {
  const draft = queryDraft(query.toString(), reading)
  const feature = featureOnly(draft)
  return { ...feature, picks: { ...feature.picks, cutter: draft.picks.cutter } }
}

function typedText(name: SearchText, written: string | null, reading: Reading): string {
  if (written === null) return ''
  if (written.startsWith(unreadMark)) return written.slice(unreadMark.length)
  const read = readField(searchTexts[name].kind, written, plain)
  return read.ok ? fieldText(searchTexts[name].kind, read.value, reading) : written
}

export function searchChoices(query: URLSearchParams): SearchChoices {
  return {
    rankBy: searchRankings.find((known) => known === query.get('rank')) ?? 'stiffness',
    cribId: idOrNull(query.get('crib')),
    machineId: idOrNull(query.get('machine')),
    setUpId: idOrNull(query.get('setup')),
    isInStockOnly: query.get('stock') === 'yes',
    forms: listed(query.get('forms'), cutterForms),
    substrates: listed(query.get('tool'), substrates),
    material: query.get('material')?.slice(0, 200) || null,
  }
}

function idOrNull(text: string | null): string | null {
  return text !== null && /^[1-9]\d{0,17}$/.test(text) ? text : null
}

function listed<Word extends string>(text: string | null, known: readonly Word[]): Word[] {
  const words = (text ?? '').split(',')
  return known.filter((word) => words.includes(word))
}

/** The address of a search. A figure that cannot be read goes along as it was typed, marked so. */
export function searchQuery(draft: SearchDraft, reading: Reading): URLSearchParams {
  const query = new URLSearchParams(draftQuery(draft.check, reading))
  if (draft.purpose) query.set('for', draft.purpose)
  if (draft.cutMaterial !== null) query.set('cut', String(draft.cutMaterial))
  for (const name of searchTextNames) {
    const written = draft.texts[name].trim()
    if (written === '' || !isTextAsked(name, draft)) continue
    const { kind } = searchTexts[name]
    const read = readField(kind, written, reading)
    query.set(name, read.ok ? fieldText(kind, read.value, plain) : `${unreadMark}${written}`)
  }
  return withChoices(query, draft.choices)
}

/** The same question with other choices. */
export function withChoices(asked: URLSearchParams, choices: SearchChoices): URLSearchParams {
  const query = new URLSearchParams(asked)
  const set = (name: string, text: string | null) => (text ? query.set(name, text) : query.delete(name))
  set('rank', choices.rankBy === 'stiffness' ? null : choices.rankBy)
  set('crib', choices.cribId)
  set('machine', choices.machineId)
  set('setup', choices.setUpId)
  set('stock', choices.isInStockOnly ? 'yes' : null)
  set('forms', choices.forms.join(','))
  set('tool', choices.substrates.join(','))
  set('material', choices.material)
  return query
}

/** What leaves something of the crib out; the material says only where to start. */
export const noFilters = {
  cribId: null,
  machineId: null,
  setUpId: null,
  isInStockOnly: false,
  forms: [],
  substrates: [],
} as const satisfies Partial<SearchChoices>

export const noChoices: SearchChoices = { ...noFilters, rankBy: 'stiffness', material: null }

/** The request an address makes, or what is wrong with it, by the request's own names of the places. */
export type CompiledSearch =
  | { state: 'empty' }
  | { state: 'refused'; errors: FieldErrors }
  | { state: 'asked'; request: ReachSearchBody }

const noRows = { cutter: null, holder: null, collet: null, extension: null }

/** Reads a search once; `reading` says how its texts are meant. */
export function compileSearch(draft: SearchDraft, reading: Reading, settings: ReachSettings): CompiledSearch {
  const { check, purpose, choices } = draft
  const cutterId = check.picks.cutter
  const { feature, clearances, unread } = compileCheck(check, { rows: noRows, reading, settings })
  const errors: Record<string, string> = { ...unread }
  const figures = new Map<SearchText, number>()
  for (const name of searchTextNames) {
    if (!isTextAsked(name, draft)) continue
    const read = readField(searchTexts[name].kind, draft.texts[name], reading)
    if (!read.ok) errors[searchTexts[name].path] = read.message
    else if (typeof read.value === 'number') figures.set(name, read.value)
  }
  addMissing(draft, feature, figures, errors)
  addMissingOfCut(draft, feature?.kind === 'hole', errors)
  if (Object.keys(errors).length > 0) return { state: 'refused', errors }
  if (!feature) return { state: 'empty' }
  const [stepoverMm, maximumHeightMm] = [figures.get('stepover'), figures.get('cusp')]
  return {
    state: 'asked',
    request: {
      feature,
      purpose,
      scallop: stepoverMm && maximumHeightMm ? { stepoverMm, maximumHeightMm } : null,
      cut: cutOf(draft, figures),
      clearances: clearances.shankMm === null && clearances.holderMm === null ? null : clearances,
      where: {
        cribId: choices.cribId,
        machineId: choices.machineId,
        setUpId: choices.setUpId,
        cutterId,
        inStockOnly: choices.isInStockOnly,
        forms: choices.forms.length > 0 ? [...choices.forms] : null,
        substrates: choices.substrates.length > 0 ? [...choices.substrates] : null,
        material: choices.material,
        longestStickOutToDiameter: figures.get('ratio') ?? null,
      },
      rankBy: choices.rankBy,
      perCutter: cutterId === null ? 1 : null,
      sentenceUnit: reading.unit,
    },
  }
}

/** A cusp is asked about of a finished surface alone. */
function isTextAsked(name: SearchText, { purpose }: Pick<SearchDraft, 'purpose'>): boolean {
  return (name !== 'stepover' && name !== 'cusp') || purpose === 'finishing'
}

function cutOf(
  { cutMaterial }: SearchDraft,
  figures: ReadonlyMap<SearchText, number>,
): ReachSearchBody['cut'] {
  const feedMm = figures.get('fz')
  if (cutMaterial === null || feedMm === undefined) return null
  return {
    materialNumber: cutMaterial,
    feedMm,
    depthOfCutMm: figures.get('ap') ?? null,
    stepoverMm: figures.get('ae') ?? null,
    cuttingSpeedMPerMin: figures.get('vc') ?? null,
  }
}

/** A cut is given whole or not at all; in a hole a drill needs neither depth nor width. */
function addMissingOfCut(
  { cutMaterial, texts }: SearchDraft,
  isHole: boolean,
  errors: Record<string, string>,
): void {
  const isTyped = cutTextNames.some((name) => texts[name].trim() !== '')
  if (cutMaterial === null && !isTyped) return
  if (cutMaterial === null) errors[cutMaterialPath] ??= 'Choose the material too, or leave the cut blank.'
  for (const name of isHole ? (['fz'] as const) : (['ap', 'ae', 'fz'] as const)) {
    if (texts[name].trim() !== '') continue
    errors[searchTexts[name].path] ??= `Enter the ${searchTexts[name].label.toLowerCase()}.`
  }
}

/** What a search can't do without; nothing typed at all is no fault yet. */
function addMissing(
  { check, purpose }: SearchDraft,
  feature: { kind: string; diameterMm?: number } | null,
  figures: ReadonlyMap<SearchText, number>,
  errors: Record<string, string>,
): void {
  const isTouched = Object.values(check.texts.feature).some((text) => text.trim() !== '')
  if (isTouched && !feature && !errors['feature.depthMm']) errors['feature.depthMm'] = 'Enter the depth.'
  if (feature?.kind === 'hole' && feature.diameterMm == null && !errors['feature.diameterMm'])
    errors['feature.diameterMm'] = 'Enter the diameter of the hole.'
  if (purpose !== 'finishing' || figures.has('stepover') === figures.has('cusp')) return
  const missing = figures.has('stepover') ? 'cusp' : 'stepover'
  errors[searchTexts[missing].path] ??=
    `Give the ${searchTexts[missing].label.toLowerCase()} too, or neither.`
}
