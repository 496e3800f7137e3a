'use client'

import { X } from 'lucide-react'
import { Button } from '../ui/button'
import { TextField } from '../ui/text-field'
import type { DraftField, DraftManner } from './draft'
import { type DraftTexts, draftTexts, readDraft } from './draft'

export interface PointDraft {
  key: number
  texts: DraftTexts
}

export const pointFields: readonly DraftField[] = [
  { name: 'rpm', label: 'Speed', symbol: 'rpm', kind: 'count', isRequired: true },
  { name: 'powerKw', label: 'Power', symbol: 'kW', kind: 'number' },
  { name: 'torqueNm', label: 'Torque', symbol: 'Nm', kind: 'number' },
]

export function pointDrafts(
  points: readonly { rpm: number; powerKw: number | null; torqueNm: number | null }[],
  manner: DraftManner,
): PointDraft[] {
  return points.map((point, key) => ({ key, texts: draftTexts(pointFields, { ...point }, manner) }))
}

/** The points as they are sent, and what of them could not be read, by the path the server would name. */
export function readPoints(points: readonly PointDraft[], manner: DraftManner) {
  const readings = points.map(({ texts }) => readDraft(pointFields, texts, manner))
  return {
    body: readings.map(({ body }) => body),
    faults: Object.fromEntries(
      readings.flatMap(({ faults }, index) =>
        Object.entries(faults).map(([name, message]) => [`spindlePoints.${index}.${name}`, message]),
      ),
    ),
  }
}

export interface SpindlePointsProps {
  points: readonly PointDraft[]
  errors: Readonly<Record<string, string>>
  onChange: (points: PointDraft[]) => void
}

/** The spindle's curve, point by point as its maker prints it: at each speed power, torque or both. */
export function SpindlePoints({ points, errors, onChange }: SpindlePointsProps) {
  const add = () =>
    onChange([...points, { key: Math.max(-1, ...points.map(({ key }) => key)) + 1, texts: {} }])
  const type = (key: number, name: string, text: string) =>
    onChange(
      points.map((point) =>
        point.key === key ? { ...point, texts: { ...point.texts, [name]: text } } : point,
      ),
    )
  return (
    <fieldset className="flex flex-col gap-3">
      <legend className="border-ink mb-3 w-full border-b pb-1 text-lg font-semibold">Power and torque</legend>
      <p className="text-ink-soft text-sm">
        Points of the maker’s curve, the continuous rating. At each speed the power, the torque or both;
        between points the lesser of the two holds.
      </p>
      {points.map(({ key, texts }, index) => (
        <div key={key} className="flex items-end gap-2">
          {pointFields.map(({ name, label, symbol }) => (
            <TextField
              key={name}
              className="min-w-0 flex-1"
              label={label}
              {...(symbol ? { symbol } : {})}
              inputMode="decimal"
              autoComplete="off"
              value={texts[name] ?? ''}
              error={errors[`spindlePoints.${index}.${name}`] ?? null}
              onChange={(event) => type(key, name, event.target.value)}
            />
          ))}
          <button
            type="button"
            className="hover:bg-accent-wash grid size-10 shrink-0 place-items-center self-end rounded-[3px] pointer-coarse:size-11"
            aria-label={`Remove point ${index + 1}`}
            onClick={() => onChange(points.filter((point) => point.key !== key))}
          >
            <X aria-hidden="true" className="size-4.5" />
          </button>
        </div>
      ))}
      <div>
        <Button size="compact" onClick={add}>
          Add a point
        </Button>
      </div>
    </fieldset>
  )
}
