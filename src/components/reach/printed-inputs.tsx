import { formatLength } from '@/lib/format-length'
import { catalogueValue } from './catalogue-values'
import { stockPlace } from './item-words'
import { isSlotUsed, type ReachDraft } from './reach-draft'
import { type FieldGroup, formNames, type ReachField, reachFields, toolSlots } from './reach-fields'
import type { InputsProps } from './reach-inputs'
import { type Reading, readField } from './read-field'

export interface PrintedInputsProps extends Pick<InputsProps, 'rows' | 'reading'> {
  draft: ReachDraft
}

const titles: Readonly<Record<FieldGroup, string>> = {
  feature: 'Feature',
  cutter: 'Cutter',
  holder: 'Holder',
  collet: 'Collet',
  extension: 'Extension',
  check: 'Given',
}

/** What was asked, in words for the paper: the fields themselves don't print. */
export function PrintedInputs({ draft, rows, reading }: PrintedInputsProps) {
  const groups: FieldGroup[] = ['feature', ...toolSlots.filter((slot) => isSlotUsed(draft, slot)), 'check']
  return (
    <dl className="hidden grid-cols-[auto_1fr] gap-x-3 text-xs print:grid">
      {groups.map((group) => {
        const words = groupWords(draft, group, rows, reading)
        return words === '' ? null : (
          <div key={group} className="col-span-2 grid grid-cols-subgrid">
            <dt className="font-semibold">{titles[group]}</dt>
            <dd>{words}</dd>
          </div>
        )
      })}
    </dl>
  )
}

function groupWords(
  draft: ReachDraft,
  group: FieldGroup,
  rows: PrintedInputsProps['rows'],
  reading: Reading,
): string {
  const row = group === 'feature' || group === 'check' ? null : rows[group]
  const figures = reachFields
    .filter((field) => field.group === group)
    .map((field) => figureWords(field, draft, rows, reading))
  const kind = group === 'feature' ? (draft.featureKind === 'wall' ? 'Wall' : 'Hole') : null
  const obstacles =
    group === 'feature'
      ? draft.obstacles.map(({ setback, rise }) => `obstacle set back ${setback}, rising ${rise}`)
      : []
  const outline =
    group === 'holder' || group === 'extension' ? outlineWords(group, draft, rows, reading) : null
  const place = row ? stockPlace(row.stock).text : null
  return [row?.code, kind, ...figures, ...obstacles, outline, place].filter(Boolean).join(' · ')
}

function figureWords(
  field: ReachField,
  draft: ReachDraft,
  rows: PrintedInputsProps['rows'],
  reading: Reading,
): string | null {
  const text = draft.texts[field.group][field.name]
  const read = text === undefined ? null : readField(field.kind, text, reading)
  const value = read ? (read.ok ? read.value : null) : catalogueValue(rows, field.group, field.name)
  if (value === null) return null
  const name = field.symbol ?? field.label.toLowerCase()
  if (field.name === 'form') return formNames[value as keyof typeof formNames] ?? String(value)
  if (typeof value === 'string') return `${name} ${value}`
  if (field.kind === 'angle') return `${name} ${value}°`
  return field.kind === 'number' ? `${name} ${value} N` : `${name} ${formatLength(value, reading.unit)}`
}

/** `outline 18 × Ø28, 50 × Ø32 to 36`, from the nose face up. */
function outlineWords(
  owner: 'holder' | 'extension',
  draft: ReachDraft,
  rows: PrintedInputsProps['rows'],
  reading: Reading,
): string | null {
  const said = (mm: number) => formatLength(mm, reading.unit, { withUnit: false })
  const typed = draft.segments[owner]?.map(({ length, nose, spindle }) => [length, nose, spindle || nose])
  const ofCatalogue = rows[owner]?.segments.map((segment) =>
    [segment.lengthMm, segment.noseDiameterMm, segment.spindleDiameterMm].map(said),
  )
  const segments = typed ?? ofCatalogue ?? []
  if (segments.length === 0) return null
  const words = segments.map(
    ([length, nose, spindle]) => `${length} × Ø${nose}${spindle === nose ? '' : ` to ${spindle}`}`,
  )
  return `outline ${words.join(', ')}`
}
