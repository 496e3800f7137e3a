'use client'

import { ChevronDown } from 'lucide-react'
import { useState } from 'react'
import { useCutQuestion } from '@/hooks/use-cut-question'
import { type CutAssembly, cutEstimate } from '@/lib/cut-estimate'
import { useShop } from '../layout/shop-context'
import { Notice } from '../ui/notice'
import { CutFigures } from './cut-figures'
import { CutQuestion } from './cut-question'

/** What a cut asks of one assembly: load and deflection, speed and feed, power and torque. Closed until it is wanted. */
export function CutSection({ assembly }: { assembly: CutAssembly }) {
  const [isOpen, setIsOpen] = useState(false)
  return (
    <section aria-labelledby="cut-section" className="flex flex-col gap-4 print:hidden">
      <h2 id="cut-section" className="text-lg">
        <button
          type="button"
          aria-expanded={isOpen}
          aria-controls="cut-estimate"
          className="hover:bg-accent-wash text-accent flex min-h-11 w-full items-center justify-between gap-3 rounded-[3px] text-left"
          onClick={() => setIsOpen(!isOpen)}
        >
          <span>
            A cut with it, estimated
            <span className="text-ink-soft block text-sm font-normal">
              Load and deflection, speed and feed, and whether the spindle drives it
            </span>
          </span>
          <ChevronDown
            aria-hidden="true"
            className={`size-5 shrink-0 transition-transform ${isOpen ? 'rotate-180' : ''}`}
          />
        </button>
      </h2>
      <div id="cut-estimate">{isOpen ? <CutEstimate assembly={assembly} /> : null}</div>
    </section>
  )
}

function CutEstimate({ assembly }: { assembly: CutAssembly }) {
  const { unit, decimalComma, cuttingSettings } = useShop()
  const question = useCutQuestion({ unit, decimalComma })
  const estimate = question.input ? cutEstimate(assembly, question.input, cuttingSettings) : null
  return (
    <div className="flex flex-col gap-4">
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
    </div>
  )
}
