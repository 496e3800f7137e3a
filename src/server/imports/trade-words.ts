import type { Condition } from '@/core/stock/kinds'
import type { CutterForm, HolderSegmentPart, Substrate } from '@/core/tooling'

/** Words the trade writes for the closed lists of the catalogue. Common practice throughout; no source but use. */

function plain(text: string): string {
  return text
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/[^a-z0-9]+/g, ' ')
    .trim()
}

type Words<Value extends string> = readonly (readonly [pattern: RegExp, value: Value])[]

/**
 * Tried in this order, so that what narrows the meaning comes first: a tapered ball is tapered, a spot drill a drill
 * (its outline is a cone and a cylinder), a tap drill a drill.
 */
const forms: Words<CutterForm> = [
  [/\bthread ?mill(s|ing|er)?\b/, 'threadMill'],
  [/\bdrill mill\b|\bchamfer(s|ing)?\b|\bcountersinks?\b|\bdeburr(ing)?\b/, 'chamfer'],
  [/\bdrills?\b|\bspotting\b|\bspot\b/, 'drill'],
  [/\breamers?\b|\breaming\b/, 'reamer'],
  [/\btaps?\b|\btapping\b/, 'tap'],
  [/\bface ?mill(s|ing)?\b|\bshell ?mill(s)?\b/, 'faceMill'],
  [
    /\bslot(ting)? (cutter|mill|saw)s?\b|\bslitting\b|\bslotting\b|\bt ?slot\b|\bkey ?(seat|way|cutter)\b|\bwoodruff\b/,
    'slotting',
  ],
  [/\btaper(ed)?\b/, 'tapered'],
  [/\bball\b|\bballnose\b|\bball ?(nose|end)\b|\bbn\b|\bbnem\b|\bspherical\b/, 'ball'],
  [
    /\bbull\b|\bbullnose\b|\bcorner ?rad(ius)?\b|\bradius\b|\btorus\b|\btoroidal\b|\bcr\b|\brad\b/,
    'cornerRadius',
  ],
  [/\bsquare\b|\bflat\b|\bend ?mill(s)?\b|\bem\b|\bsq\b|\bsharp\b|\brough(er|ing)\b/, 'square'],
]

/** A step drill's or a centre drill's two diameters are one outline too few here. */
const unknownForms =
  /\bcent(er|re) ?drills?\b|\bstep ?drills?\b|\bcounter ?bores?\b|\bdovetails?\b|\blollipops?\b|\bundercut/

const formNames: Readonly<Record<string, CutterForm>> = {
  cornerradius: 'cornerRadius',
  facemill: 'faceMill',
  threadmill: 'threadMill',
}

const substrateWords: Words<Substrate> = [
  [
    /\bcarbide\b|\bsolid carb\b|\bvhm\b|\bhm\b|\btungsten\b|\bcarb\b|\bsc\b|\bwc\b|\bhartmetall\b|\bmicrograin\b/,
    'carbide',
  ],
  [
    /\bhss\w*\b|\bhsco\b|\bhss e\b|\bhigh speed steel\b|\bcobalt\b|\bpm\b|\bm ?2\b|\bm ?35\b|\bm ?42\b|\bco ?[58]\b/,
    'hss',
  ],
]

const partWords: Words<HolderSegmentPart> = [
  [/\bnut\b|\bcap\b/, 'nut'],
  [/\bholder\b|\bbody\b|\bnose\b|\bflange\b|\bchuck\b|\btaper\b|\bcone\b/, 'holder'],
]

const conditionWords: Words<Condition> = [
  [/\breground\b|\bregrind\b|\bresharpened\b|\bsharpened\b/, 'reground'],
  [/\bworn\b|\bdull\b|\bdead\b/, 'worn'],
  [/\bused\b|\bopened\b/, 'used'],
  [/\bnew\b|\bunused\b|\bsealed\b/, 'new'],
]

function find<Value extends string>(words: Words<Value>, text: string): Value | undefined {
  const written = plain(text)
  return words.find(([pattern]) => pattern.test(written))?.[1]
}

/** The form a cell names: `BALL NOSE`, `Bull nose EM`, `jobber drill`; undefined where none is known. */
export function formNamed(text: string): CutterForm | undefined {
  const written = plain(text)
  if (Object.hasOwn(formNames, written)) return formNames[written]
  return unknownForms.test(written) ? undefined : find(forms, text)
}

export function substrateNamed(text: string): Substrate | undefined {
  return find(substrateWords, text)
}

export function partNamed(text: string): HolderSegmentPart | undefined {
  return find(partWords, text)
}

export function conditionNamed(text: string): Condition | undefined {
  return find(conditionWords, text)
}
