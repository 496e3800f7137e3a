'use client'

import { useCutQuestion } from '@/hooks/use-cut-question'
import { type CutAssembly, cutEstimate } from '@/lib/cut-estimate'
import { useShop } from '../layout/shop-context'
import { Notice } from '../ui/notice'
import { CutFigures } from './cut-figures'
import { CutQuestion } from './cut-question'

/** What a cut asks of one assembly: load and deflection, speed and feed, power and torque. */
export function CutSection({ assembly }: { assembly: CutAssembly }) {
  const { unit, decimalComma, cuttingSettings } = useShop()
  const question = useCutQuestion({ unit, decimalComma })
  const estimate = question.input ? cutEstimate(assembly, question.input, cuttingSettings) : null
  return (
    <section aria-labelledby="cut-section" className="flex flex-col gap-4 print:hidden">
      <div>
        <h2 id="cut-section" className="text-lg">
          A cut with it, estimated
        </h2>
        <p className="text-ink-soft text-sm">
          Load and deflection, speed and feed, and whether the spindle drives it. Milling and drilling.
        </p>
      </div>
      <CutQuestion
        question={question}
        substrate={assembly.cutter.substrate ?? null}
        isDrill={assembly.cutter.form === 'drill'}
        asksFlutes={assembly.cutter.fluteCount == null}
      />
      {estimate === null ? (
        <p className="text-ink-soft">Choose the material, a speed and a feed, and the figures follow.</p>
      ) : estimate.answer === null ? (
        <Notice kind="caution">{estimate.sentence}</Notice>
      ) : (
        <CutFigures
          answer={estimate.answer}
          stickOutToDiameter={assembly.stickOutToDiameter}
          settings={cuttingSettings}
          unit={unit}
        />
      )}
      <Notice kind="caution">
        An estimate to choose by, no setting to run by: the tool maker’s speeds and feeds, the holder’s limit
        and the shop’s rules go first. Closed guard, eye protection.
      </Notice>
    </section>
  )
}
