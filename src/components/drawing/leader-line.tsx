import { Arrowhead } from './arrowhead'
import { draftingTextWidth, lineWidths, type Point } from './drafting-style'
import { DraftingText } from './drafting-text'

export interface LeaderLineProps {
  /** What is spoken of. */
  target: Point
  /** Where the slanted line turns into the shoulder that carries the words. */
  shoulder: Point
  text: string
  symbol?: string
  /** A line ends with an arrow on an edge, with a dot inside an area. */
  ending?: 'arrow' | 'dot'
}

/** A leader: a slanted thin line from what is meant to a level shoulder with words on it. */
export function LeaderLine({ target, shoulder, text, symbol, ending = 'arrow' }: LeaderLineProps) {
  const goesRight = shoulder.x >= target.x
  const width = draftingTextWidth(symbol ? `${symbol} ${text}` : text) + 6
  const end = shoulder.x + (goesRight ? width : -width)
  const direction =
    Math.round((Math.atan2(target.y - shoulder.y, target.x - shoulder.x) * 18_000) / Math.PI) / 100
  return (
    <g>
      <path
        d={`M${target.x} ${target.y}L${shoulder.x} ${shoulder.y}H${end}`}
        fill="none"
        stroke="var(--ink)"
        strokeWidth={lineWidths.thin}
      />
      {ending === 'arrow' ? (
        <Arrowhead tip={target} directionDeg={direction} />
      ) : (
        <circle cx={target.x} cy={target.y} r={2} fill="var(--ink)" />
      )}
      <DraftingText x={(shoulder.x + end) / 2} y={shoulder.y - 4} text={text} symbol={symbol} />
    </g>
  )
}
