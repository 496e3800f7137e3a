import { lineWidths } from './drafting-style'

export interface HatchPatternProps {
  /** Fill with `url(#id)`; take it from useId so that two drawings never share one. */
  id: string
  spacing?: number
  /** Two solids that touch are hatched the two ways. */
  isMirrored?: boolean
}

/** Thin lines at 45° for what is cut through. Stands inside `defs`. */
export function HatchPattern({ id, spacing = 8, isMirrored }: HatchPatternProps) {
  return (
    <pattern
      id={id}
      width={spacing}
      height={spacing}
      patternUnits="userSpaceOnUse"
      patternTransform={`rotate(${isMirrored ? -45 : 45})`}
    >
      <line x1={0} y1={0} x2={0} y2={spacing} stroke="var(--ink-soft)" strokeWidth={lineWidths.thin * 1.4} />
    </pattern>
  )
}
