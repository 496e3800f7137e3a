import { Arrowhead } from './arrowhead'
import {
  dimensionFit,
  draftingTextWidth,
  extensionGap,
  extensionOvershoot,
  lineWidths,
  type Point,
} from './drafting-style'
import { DraftingText } from './drafting-text'

export interface DimensionLineProps {
  /** The two places measured between. */
  from: Point
  to: Point
  axis: 'horizontal' | 'vertical'
  /** Where the dimension line stands: its y where horizontal, its x where vertical. */
  at: number
  text: string
  symbol?: string
  /** Beyond which end the text goes where it does not fit between: left or low (`start`), right or high (`end`). */
  overflow?: 'start' | 'end'
}

interface LocalDimension {
  start: Point
  end: Point
  at: number
}

/**
 * A linear dimension: two extension lines, a thin line with arrowheads, and the figure above it, read from below or,
 * where the line is vertical, from the right. Too narrow for its arrows, they turn to point in from outside.
 */
export function DimensionLine({ from, to, axis, at, text, symbol, overflow = 'end' }: DimensionLineProps) {
  const dimension = local(from, to, axis, at)
  const { start, end } = dimension
  const span = end.x - start.x
  const textWidth = draftingTextWidth(symbol ? `${symbol} ${text}` : text)
  const { doesTextFit, tailPx: tail } = dimensionFit(span, textWidth)
  const isTight = tail > 0
  const outside = overflow === 'end' ? end.x + tail + 5 : start.x - tail - 5
  return (
    <g transform={axis === 'vertical' ? 'rotate(-90)' : undefined}>
      <g stroke="var(--ink-soft)" strokeWidth={lineWidths.thin} fill="none">
        <path d={extensionLine(start, at)} />
        <path d={extensionLine(end, at)} />
        <path
          stroke="var(--ink)"
          d={
            `M${start.x - tail} ${at}H${end.x + tail}` +
            (doesTextFit
              ? ''
              : `M${overflow === 'end' ? end.x : start.x} ${at}H${outside + (overflow === 'end' ? textWidth : -textWidth)}`)
          }
        />
      </g>
      <Arrowhead tip={{ x: start.x, y: at }} directionDeg={isTight ? 0 : 180} />
      <Arrowhead tip={{ x: end.x, y: at }} directionDeg={isTight ? 180 : 0} />
      <DraftingText
        x={doesTextFit ? (start.x + end.x) / 2 : outside}
        y={at - 4}
        anchor={doesTextFit ? 'middle' : overflow === 'end' ? 'start' : 'end'}
        text={text}
        symbol={symbol}
      />
    </g>
  )
}

/** Vertical dimensions are drawn as horizontal ones of a sheet turned a quarter, so that both follow one rule. */
function local(from: Point, to: Point, axis: DimensionLineProps['axis'], at: number): LocalDimension {
  const turn = (point: Point): Point => (axis === 'vertical' ? { x: -point.y, y: point.x } : point)
  const [one, other] = [turn(from), turn(to)]
  return one.x <= other.x ? { start: one, end: other, at } : { start: other, end: one, at }
}

function extensionLine(point: Point, at: number): string {
  const away = Math.sign(at - point.y)
  if (Math.abs(at - point.y) <= extensionGap) return ''
  return `M${point.x} ${point.y + away * extensionGap}V${at + away * extensionOvershoot}`
}
