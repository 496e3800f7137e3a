import { chainDashes, lineWidths, type Point } from './drafting-style'

/** The long-dashed dotted thin line of an axis. */
export function ChainLine({ from, to }: { from: Point; to: Point }) {
  return (
    <line
      x1={from.x}
      y1={from.y}
      x2={to.x}
      y2={to.y}
      stroke="var(--ink)"
      strokeWidth={lineWidths.thin}
      strokeDasharray={chainDashes}
    />
  )
}
