import { describe, expect, it } from 'vitest'
import { cutterOutline } from '@/core/outline/cutter-outline'
import { bodyPath, outlineEdges, sheetFrame, type ToSheet } from './outline-path'

const ball = cutterOutline({
  form: 'ball',
  cuttingDiameterMm: 6,
  lengthOfCutMm: 12,
  fluteLengthMm: 12,
  shankDiameterMm: 6,
  overallLengthMm: 60,
})

interface PathArc {
  from: [number, number]
  radius: number
  sweep: number
  to: [number, number]
}

function arcsOf(path: string): PathArc[] {
  const pattern = /(-?[\d.]+) (-?[\d.]+) A([\d.]+) [\d.]+ 0 0 ([01]) (-?[\d.]+) (-?[\d.]+)/g
  return [...path.matchAll(pattern)].map((match) => {
    const [x1, y1, radius, sweep, x2, y2] = match.slice(1).map(Number) as [
      number,
      number,
      number,
      number,
      number,
      number,
    ]
    return { from: [x1, y1], radius, sweep, to: [x2, y2] }
  })
}

/** Where SVG puts the middle of a small arc of a quarter: on the left of the chord, or on its right (y down). */
function arcMiddle({ from, radius, sweep, to }: PathArc): [number, number] {
  const [middleX, middleY] = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]
  const [dx, dy] = [to[0] - from[0], to[1] - from[1]]
  const chord = Math.hypot(dx, dy)
  const rise = radius - Math.sqrt(radius ** 2 - (chord / 2) ** 2)
  const side = sweep === 1 ? 1 : -1
  return [middleX + (side * rise * dy) / chord, middleY - (side * rise * dx) / chord]
}

const turned: ToSheet = (zMm, radiusMm) => {
  const angle = 0.4
  return {
    x: 300 + 10 * (zMm * Math.sin(angle) + radiusMm * Math.cos(angle)),
    y: 300 - 10 * (zMm * Math.cos(angle) - radiusMm * Math.sin(angle)),
  }
}

describe('bodyPath', () => {
  it.each([
    ['lying', sheetFrame({ datumX: 700, axisY: 100, pxPerMm: 10 })],
    ['leaning', turned],
  ])('bulges the end of a ball outward on both sides, %s', (_, toSheet) => {
    const centre = toSheet(3, 0)
    const arcs = arcsOf(bodyPath(ball, toSheet))
    expect(arcs).toHaveLength(2)
    for (const arc of arcs) {
      const [x, y] = arcMiddle(arc)
      expect(Math.hypot(x - centre.x, y - centre.y)).toBeCloseTo(30, 1)
    }
  })
})

describe('outlineEdges', () => {
  it('sees no edge where an arc runs into a cylinder, and one at a step', () => {
    const stepped = cutterOutline({
      form: 'ball',
      cuttingDiameterMm: 3,
      lengthOfCutMm: 6,
      fluteLengthMm: 6,
      shankDiameterMm: 6,
      overallLengthMm: 50,
    })
    expect(outlineEdges(ball).filter((edge) => edge.radiusMm > 0)).toEqual([])
    expect(outlineEdges(stepped).map((edge) => edge.radiusMm)).toEqual([1.5, 3])
  })
})
