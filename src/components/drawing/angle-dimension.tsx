import { Arrowhead } from './arrowhead'
import { lineWidths, type Point } from './drafting-style'
import { DraftingText } from './drafting-text'

export interface AngleDimensionProps {
  /** Where the two legs meet. */
  vertex: Point
  radius: number
  /** Degrees clockwise from the right; the arc runs from the first to the second. */
  fromDeg: number
  toDeg: number
  text: string
  symbol?: string
  /** Where round the vertex the figure stands; the arc's middle unless something is in its way there. */
  labelDeg?: number
}

function onCircle(vertex: Point, radius: number, deg: number): Point {
  const angle = (deg * Math.PI) / 180
  // To a hundredth of a px: sines differ in their last digit between server and browser.
  const onSheet = (px: number) => Math.round(px * 100) / 100
  return { x: onSheet(vertex.x + radius * Math.cos(angle)), y: onSheet(vertex.y + radius * Math.sin(angle)) }
}

/** An angle: its legs drawn out thin, an arc with arrowheads between them, the figure beyond the arc's middle. */
export function AngleDimension({
  vertex,
  radius,
  fromDeg,
  toDeg,
  text,
  symbol,
  labelDeg = (fromDeg + toDeg) / 2,
}: AngleDimensionProps) {
  const [start, end] = [onCircle(vertex, radius, fromDeg), onCircle(vertex, radius, toDeg)]
  const label = onCircle(vertex, radius + 8, labelDeg)
  const isToTheLeft = label.x < vertex.x - 2
  return (
    <g>
      <g stroke="var(--ink)" strokeWidth={lineWidths.thin} fill="none">
        <path
          stroke="var(--ink-soft)"
          d={[fromDeg, toDeg].map((deg) => leg(vertex, onCircle(vertex, radius + 4, deg))).join('')}
        />
        <path
          d={`M${start.x} ${start.y}A${radius} ${radius} 0 ${toDeg - fromDeg > 180 ? 1 : 0} 1 ${end.x} ${end.y}`}
        />
      </g>
      <Arrowhead tip={start} directionDeg={fromDeg - 90} />
      <Arrowhead tip={end} directionDeg={toDeg + 90} />
      <DraftingText
        x={label.x}
        y={label.y + 4}
        anchor={isToTheLeft ? 'end' : 'start'}
        text={text}
        symbol={symbol}
      />
    </g>
  )
}

function leg(from: Point, to: Point): string {
  return `M${from.x} ${from.y}L${to.x} ${to.y}`
}
