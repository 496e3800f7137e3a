import { Arrowhead } from './arrowhead'
import { draftingTextWidth, extensionGap, extensionOvershoot, lineWidths, type Point } from './drafting-style'
import { DraftingText } from './drafting-text'

export interface OpenDimensionProps {
  /** The place measured from; the other is beyond the drawing. */
  from: Point
  /** Where the drawing ends, as a y. */
  toY: number
  /** The x of the dimension line. */
  at: number
  text: string
  symbol?: string
}

/** A vertical dimension whose other end is off the drawing: no arrow there, but the sign of a broken line. */
export function OpenDimension({ from, toY, at, text, symbol }: OpenDimensionProps) {
  const away = Math.sign(at - from.x)
  const middle = (from.y + toY) / 2
  const textWidth = draftingTextWidth(symbol ? `${symbol} ${text}` : text)
  const onward = Math.sign(toY - from.y)
  const nearest = toY - onward * (textWidth / 2 + 14)
  const textY = onward < 0 ? Math.max(middle, nearest) : Math.min(middle, nearest)
  return (
    <g>
      <g fill="none" strokeWidth={lineWidths.thin}>
        <path
          stroke="var(--ink-soft)"
          d={`M${from.x + away * extensionGap} ${from.y}H${at + away * extensionOvershoot}`}
        />
        <path
          stroke="var(--ink)"
          d={`M${at} ${from.y}V${toY - onward * 8}l-4 ${onward * 3}l8 ${onward * 4}l-4 ${onward * 3}V${toY + onward * 8}`}
        />
      </g>
      <Arrowhead tip={{ x: at, y: from.y }} directionDeg={-onward * 90} />
      <g transform={`rotate(-90 ${at} ${textY})`}>
        <DraftingText x={at} y={textY - 4} text={text} symbol={symbol} />
      </g>
    </g>
  )
}
