'use client'

import { ArrowDown, ArrowUp, Trash2 } from 'lucide-react'
import { type Control, type FieldValues, useFieldArray, useFormState } from 'react-hook-form'
import { Button } from '@/components/ui/button'
import { ItemFormField } from './item-form-field'
import { blankSegment } from './typed-values'

export interface SegmentsEditorProps {
  control: Control<FieldValues, unknown, FieldValues>
  hasPart: boolean
  hint: string
}

const partOptions = [
  { value: 'nut', label: 'Nut' },
  { value: 'holder', label: 'Body' },
]

/** The outline as straight segments, from the nose face towards the spindle. */
export function SegmentsEditor({ control, hasPart, hint }: SegmentsEditorProps) {
  const { fields, append, remove, move } = useFieldArray({ control, name: 'segments' })
  const { errors } = useFormState({ control, name: 'segments' })
  const whole = errors.segments?.root?.message
  return (
    <fieldset className="border-ink border-t-2 pt-3 max-sm:order-2">
      <legend className="float-left mb-1 w-full text-lg font-semibold">Outline, nose first</legend>
      <p className="text-ink-soft clear-both mb-2 text-sm">{hint}</p>
      {typeof whole === 'string' ? (
        <p className="text-collision mb-2 text-sm font-semibold">{whole}</p>
      ) : null}
      <ol>
        {fields.map((segment, index) => (
          <li
            key={segment.id}
            className="border-hairline grid grid-cols-2 items-start gap-x-3 gap-y-2 border-b py-3 sm:grid-cols-4"
          >
            {hasPart ? (
              <ItemFormField
                control={control}
                field={{
                  path: `segments.${index}.part`,
                  label: 'Part',
                  kind: 'choice',
                  options: partOptions,
                }}
              />
            ) : null}
            <ItemFormField
              control={control}
              field={{
                path: `segments.${index}.lengthMm`,
                label: 'Length',
                kind: 'length',
                isRequired: true,
              }}
            />
            <ItemFormField
              control={control}
              field={{
                path: `segments.${index}.noseDiameterMm`,
                label: '⌀ nose end',
                kind: 'length',
                isRequired: true,
              }}
            />
            <ItemFormField
              control={control}
              field={{
                path: `segments.${index}.spindleDiameterMm`,
                label: '⌀ spindle end',
                kind: 'length',
                isRequired: true,
              }}
            />
            <div className="col-span-full flex justify-end gap-1">
              <Button
                variant="quiet"
                size="compact"
                disabled={index === 0}
                onClick={() => move(index, index - 1)}
                aria-label={`Move segment ${index + 1} towards the nose`}
              >
                <ArrowUp aria-hidden="true" className="size-4" /> Nose
              </Button>
              <Button
                variant="quiet"
                size="compact"
                disabled={index === fields.length - 1}
                onClick={() => move(index, index + 1)}
                aria-label={`Move segment ${index + 1} towards the spindle`}
              >
                <ArrowDown aria-hidden="true" className="size-4" /> Spindle
              </Button>
              <Button
                variant="quiet"
                size="compact"
                disabled={fields.length === 1}
                onClick={() => remove(index)}
                aria-label={`Remove segment ${index + 1}`}
              >
                <Trash2 aria-hidden="true" className="size-4" /> Remove
              </Button>
            </div>
          </li>
        ))}
      </ol>
      <Button
        size="compact"
        className="mt-3"
        disabled={fields.length >= 100}
        onClick={() => append(blankSegment(), { focusName: `segments.${fields.length}.lengthMm` })}
      >
        Add a segment
      </Button>
    </fieldset>
  )
}
