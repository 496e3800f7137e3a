import { symbolTitle } from '@/lib/symbol-names'
import { draftingFontSize } from './drafting-style'

export interface DraftingTextProps {
  x: number
  y: number
  text: string
  /** The ISO 13399 symbol in front, softer than the value. */
  symbol?: string
  anchor?: 'start' | 'middle' | 'end'
  isStrong?: boolean
}

/** Words on the sheet, with a rim of the sheet's own colour so that a line crossing them never hides a figure. */
export function DraftingText({ x, y, text, symbol, anchor = 'middle', isStrong }: DraftingTextProps) {
  const title = symbol ? symbolTitle(symbol) : undefined
  return (
    <text
      data-name={title}
      x={x}
      y={y}
      textAnchor={anchor}
      fontSize={draftingFontSize}
      fontWeight={isStrong ? 700 : 600}
      fill="var(--ink)"
      stroke="var(--sheet)"
      strokeWidth={4}
      strokeLinejoin="round"
      paintOrder="stroke"
    >
      {symbol ? (
        <tspan fill="var(--ink-soft)" fontWeight={400}>
          {`${symbol} `}
        </tspan>
      ) : null}
      {text}
    </text>
  )
}
