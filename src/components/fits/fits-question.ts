import type { ToolingKind } from '@/core/stock/kinds'

interface QuestionField {
  /** As the API and the address bar have it. */
  name: string
  label: string
  kind: 'length' | 'lengthOrZero' | 'text'
  hint?: string
  isOptional?: boolean
}

export interface FitsQuestion {
  id: 'pocket' | 'shank' | 'series' | 'bore'
  label: string
  fields: readonly QuestionField[]
  /** What may fit, in the order it is looked for. */
  kinds: readonly ToolingKind[]
}

const pocket: FitsQuestion = {
  id: 'pocket',
  label: 'A feature',
  kinds: ['cutter'],
  fields: [
    { name: 'insideCornerRadiusMm', label: 'Inside corner radius', kind: 'length' },
    { name: 'depthMm', label: 'Depth', kind: 'length' },
    {
      name: 'floorRadiusMm',
      label: 'Floor radius allowed',
      kind: 'lengthOrZero',
      hint: 'Blank for any; 0 asks for a square end.',
      isOptional: true,
    },
  ],
}

export const fitsQuestions: readonly FitsQuestion[] = [
  pocket,
  {
    id: 'shank',
    label: 'A shank',
    kinds: ['collet', 'holder', 'extension'],
    fields: [{ name: 'shankDiameterMm', label: 'Shank diameter', kind: 'length' }],
  },
  {
    id: 'series',
    label: 'A collet chuck',
    kinds: ['collet', 'cutter'],
    fields: [{ name: 'series', label: 'Series of its collets', kind: 'text', hint: 'Such as ER20.' }],
  },
  {
    id: 'bore',
    label: 'A fixed bore',
    kinds: ['cutter'],
    fields: [{ name: 'boreDiameterMm', label: 'Bore diameter', kind: 'length' }],
  },
]

/** The question an address asks: the one named, else the one whose fields it carries, else the first. */
export function questionOf(params: URLSearchParams): FitsQuestion {
  const from = params.get('from')
  return (
    fitsQuestions.find(({ id }) => id === from) ??
    fitsQuestions.find(({ fields }) => fields.some(({ name }) => params.has(name))) ??
    pocket
  )
}
