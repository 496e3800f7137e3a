import type { Point } from '../drawing/drafting-style'

const waveLength = 22
const waveHeight = 3

/** The edge of a body that goes on beyond the drawing: a thin line drawn freehand, level or upright. */
export function breakPath(from: Point, to: Point): string {
  const isLevel = from.y === to.y
  const length = isLevel ? to.x - from.x : to.y - from.y
  const steps = Math.max(2, Math.round(Math.abs(length) / waveLength))
  const step = length / steps
  const waves = Array.from({ length: steps }, (_, index) => {
    const side = index % 2 === 0 ? -waveHeight : waveHeight
    return isLevel
      ? `q${round(step / 2)} ${side} ${round(step)} 0`
      : `q${side} ${round(step / 2)} 0 ${round(step)}`
  })
  return `M${round(from.x)} ${round(from.y)}${waves.join('')}`
}

function round(px: number): number {
  return Math.round(px * 100) / 100
}
