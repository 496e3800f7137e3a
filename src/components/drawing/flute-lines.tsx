import { strokeRadius } from '@/core/outline/stroke-chain'
import type { OutlinePart, OutlineStroke } from '@/core/outline/types'
import { lineWidths } from './drafting-style'
import type { ToSheet } from './outline-path'

export interface FluteLinesProps {
  parts: readonly OutlinePart[]
  toSheet: ToSheet
  fluteCount: number
  diameterMm: number
  /** 0 for straight flutes. */
  helixDeg: number
}

const samples = 72

/** Cutting edges as they wind over the visible half, thin: they tell the fluted length from the plain, and no more. */
export function FluteLines({ parts, toSheet, fluteCount, diameterMm, helixDeg }: FluteLinesProps) {
  const strokes = parts
    .filter((part) => part.part === 'flute' || part.part === 'runOut')
    .flatMap((part) => part.segments)
  const endMm = strokes.at(-1)?.toZMm ?? 0
  const turnPerMm = (2 * Math.tan((helixDeg * Math.PI) / 180)) / diameterMm
  const paths = Array.from({ length: fluteCount }, (_, flute) => {
    // Straight edges start off the axis, whose own line would hide one.
    const phase = (2 * Math.PI * (flute + (helixDeg === 0 ? 0.35 : 0.25))) / fluteCount
    let isDrawing = false
    let path = ''
    for (let index = 0; index <= samples; index++) {
      const zMm = (endMm * index) / samples
      const angle = phase + zMm * turnPerMm
      const isVisible = Math.sin(angle) >= -1e-6
      if (isVisible) {
        const point = toSheet(zMm, radiusAt(strokes, zMm) * Math.cos(angle))
        path += `${isDrawing ? 'L' : 'M'}${point.x.toFixed(1)} ${point.y.toFixed(1)}`
      }
      isDrawing = isVisible
    }
    return path
  })
  return (
    <path
      d={paths.join('')}
      fill="none"
      stroke="var(--ink-soft)"
      strokeWidth={lineWidths.thin}
      opacity={0.8}
    />
  )
}

function radiusAt(strokes: readonly OutlineStroke[], zMm: number): number {
  const stroke = strokes.find((candidate) => candidate.toZMm > candidate.fromZMm && zMm <= candidate.toZMm)
  return stroke ? strokeRadius(stroke, Math.max(zMm, stroke.fromZMm)) : 0
}
