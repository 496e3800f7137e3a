import { CircleX } from 'lucide-react'
import type { LengthUnit } from '@/core/units/length-unit'
import { cutRows } from '@/lib/cut-sentences'
import type { SearchedAssembly } from './listed-assembly'

/** What the cut asked for would do with one option: every figure an estimate, and called one. */
export function OptionCut({ estimate, unit }: { estimate: SearchedAssembly['estimate']; unit: LengthUnit }) {
  if (estimate === null) return null
  if (estimate.answer === null)
    return <p className="text-caution">The cut is not estimated. {estimate.sentence}</p>
  return (
    <section aria-label="The cut, estimated" className="border-hairline border-l-2 pl-3">
      {estimate.answer.drive?.drives === false ? (
        <p className="text-collision flex items-start gap-2 font-semibold">
          <CircleX aria-hidden="true" className="mt-0.5 size-5 shrink-0" />
          The spindle does not drive this cut, by estimate
        </p>
      ) : (
        <p className="text-ink-soft text-sm">The cut, estimated</p>
      )}
      <dl className="flex flex-wrap gap-x-6 gap-y-1">
        {cutRows(estimate.answer, unit).map(([label, text]) => (
          <div key={label}>
            <dt className="text-ink-soft text-sm">{label}</dt>
            <dd>{text}</dd>
          </div>
        ))}
      </dl>
    </section>
  )
}
