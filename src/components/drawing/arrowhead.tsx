import { arrowHalfWidth, arrowLength, type Point } from './drafting-style'

export interface ArrowheadProps {
  tip: Point
  /** Where it points, in degrees clockwise from the right. */
  directionDeg: number
}

/** The narrow filled arrowhead of a dimension line. */
export function Arrowhead({ tip, directionDeg }: ArrowheadProps) {
  return (
    <path
      d={`M0 0L${-arrowLength} ${arrowHalfWidth}V${-arrowHalfWidth}Z`}
      transform={`translate(${tip.x} ${tip.y}) rotate(${directionDeg})`}
      fill="var(--ink)"
    />
  )
}
