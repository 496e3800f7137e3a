'use client'

import type { ToolPart } from '@/core/outline/types'
import type { ReachAnswer } from '@/core/reach/types'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from '@/lib/format-length'
import { partNames } from '@/lib/reach-sentences'

export interface FirstTouchTableProps {
  answer: ReachAnswer
  unit: LengthUnit
  highlighted: ToolPart | null
  /** The part that stays highlighted. */
  pinned: ToolPart | null
  onPoint: (part: ToolPart | null) => void
  onPin: (part: ToolPart) => void
}

/** The depth at which every part of the tool first touches; a row shows its part on the drawing. */
export function FirstTouchTable(props: FirstTouchTableProps) {
  const { answer, unit, highlighted, pinned, onPoint, onPin } = props
  return (
    <section aria-labelledby="reach-touches" className="flex flex-col gap-2 print:gap-0">
      <h2 id="reach-touches" className="text-lg">
        First touch
      </h2>
      <table className="border-hairline w-full border-t text-[0.9375rem]">
        <caption className="sr-only">Depth at which each part first touches</caption>
        <thead>
          <tr className="border-hairline text-ink-soft border-b text-left text-sm">
            <th scope="col" className="py-1 font-normal">
              Part, from the tip up
            </th>
            <th scope="col" className="py-1 text-right font-normal">
              at a depth of
            </th>
          </tr>
        </thead>
        <tbody>
          {answer.firstTouch.map(({ part, depthMm }) => {
            const isLimit = part === answer.limitedBy
            return (
              <tr
                key={part}
                className={`border-hairline border-b ${part === highlighted ? 'bg-accent-wash' : ''}`}
                onPointerEnter={() => onPoint(part)}
                onPointerLeave={() => onPoint(null)}
              >
                <th scope="row" className="text-left font-normal">
                  <button
                    type="button"
                    aria-pressed={part === pinned}
                    className={`min-h-8 w-full text-left first-letter:uppercase pointer-coarse:min-h-11 ${isLimit ? 'font-semibold' : ''}`}
                    onFocus={() => onPoint(part)}
                    onBlur={() => onPoint(null)}
                    onClick={() => onPin(part)}
                  >
                    {partNames[part]}
                    {isLimit ? ' · first' : ''}
                  </button>
                </th>
                <td className={`text-right ${isLimit ? 'font-semibold' : ''}`}>
                  {depthMm === null ? 'never' : formatLength(depthMm, unit)}
                </td>
              </tr>
            )
          })}
        </tbody>
      </table>
    </section>
  )
}
