export interface RangeFieldProps {
  label: string
  value: number
  minimum: number
  maximum: number
  step: number
  /** The value in words, for who cannot see the drawing move. */
  valueText: string
  onChange: (value: number) => void
}

/** A value to drag or to step with the arrow keys, under the field it is also typed in. */
export function RangeField({ label, value, minimum, maximum, step, valueText, onChange }: RangeFieldProps) {
  return (
    <input
      type="range"
      aria-label={label}
      aria-valuetext={valueText}
      min={minimum}
      max={maximum}
      step={step}
      value={Math.min(Math.max(value, minimum), maximum)}
      onChange={(event) => onChange(event.target.valueAsNumber)}
      className="accent-accent h-8 w-full cursor-pointer pointer-coarse:h-11"
    />
  )
}
