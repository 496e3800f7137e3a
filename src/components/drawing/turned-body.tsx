import type { OutlinePart } from '@/core/outline/types'
import { lineWidths } from './drafting-style'
import { bodyPath, outlineEdges, type ToSheet } from './outline-path'

export interface TurnedBodyProps {
  parts: readonly OutlinePart[]
  toSheet: ToSheet
  /** The sheet's colour unless the body is cut through: then `url(#…)` of a hatch. */
  fill?: string
  stroke?: string
}

/** A solid of revolution from the side: thick outline, and a thick line across wherever an edge runs round it. */
export function TurnedBody({
  parts,
  toSheet,
  fill = 'var(--sheet)',
  stroke = 'var(--ink)',
}: TurnedBodyProps) {
  const edges = outlineEdges(parts)
    .filter((edge) => edge.radiusMm > 0)
    .map(({ zMm, radiusMm }) => {
      const [one, other] = [toSheet(zMm, radiusMm), toSheet(zMm, -radiusMm)]
      return `M${one.x} ${one.y}L${other.x} ${other.y}`
    })
  return (
    <g fill="none" stroke={stroke} strokeWidth={lineWidths.outline} strokeLinejoin="round">
      <path d={bodyPath(parts, toSheet)} fill={fill} />
      <path d={edges.join('')} strokeWidth={lineWidths.outline * 0.7} />
    </g>
  )
}
