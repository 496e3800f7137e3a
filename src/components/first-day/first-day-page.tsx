'use client'

import { Circle, CircleCheck } from 'lucide-react'
import { useState } from 'react'
import { can } from '@/core/policies/permissions'
import { useFirstDay } from '@/hooks/use-first-day'
import { formatLength } from '@/lib/format-length'
import type { FirstDay } from '@/schemas/first-day'
import { PageHeading } from '../layout/page-heading'
import { useShop } from '../layout/shop-context'
import { PatternDialog } from '../locations/pattern-dialog'
import { Button, ButtonLink } from '../ui/button'
import { type StepText, stepTexts } from './first-day-steps'

/** What a new shop does, in order; each step can be left and taken up again, since the data says how far it is. */
export function FirstDayPage({ first }: { first: FirstDay }) {
  const { unit, reachSettings } = useShop()
  const { firstDay = first, refresh } = useFirstDay(true, first)
  const [isAddingBins, setIsAddingBins] = useState(false)
  const settings = `${unit === 'mm' ? 'Millimetres' : 'Inches'}; shank clearance ${formatLength(reachSettings.shankClearanceMm, unit)}, holder clearance ${formatLength(reachSettings.holderClearanceMm, unit)}.`
  const steps = stepTexts(firstDay, settings)
  const nextId = steps.find(({ id }) => !firstDay.isDone[id])?.id
  const doneCount = steps.filter(({ id }) => firstDay.isDone[id]).length
  return (
    <>
      <PageHeading
        title="First day"
        note={
          nextId
            ? `${doneCount} of ${steps.length} done. Leave it whenever you like: it goes on from what is there.`
            : 'All of it is there. The shop can work.'
        }
      />
      <ol className="border-ink mx-4 mb-10 max-w-4xl border-t-2 lg:mx-6">
        {steps.map((step, index) => (
          <Step
            key={step.id}
            step={step}
            number={index + 1}
            isDone={firstDay.isDone[step.id]}
            isNext={step.id === nextId}
            onAddBins={step.id === 'bins' ? () => setIsAddingBins(true) : null}
          />
        ))}
      </ol>
      {isAddingBins ? (
        <PatternDialog
          onClose={() => setIsAddingBins(false)}
          onAdded={() => {
            setIsAddingBins(false)
            void refresh()
          }}
        />
      ) : null}
    </>
  )
}

interface StepProps {
  step: StepText
  number: number
  isDone: boolean
  isNext: boolean
  onAddBins: (() => void) | null
}

function Step({ step, number, isDone, isNext, onAddBins }: StepProps) {
  const { role } = useShop().actor
  const { title, why, state, link } = step
  const Mark = isDone ? CircleCheck : Circle
  return (
    <li
      className="border-hairline grid grid-cols-[2rem_minmax(0,1fr)] gap-x-3 border-b py-4"
      aria-current={isNext ? 'step' : undefined}
    >
      <span className="text-ink-soft text-2xl">{number}</span>
      <div className="flex flex-col gap-1.5">
        <h2 className="flex flex-wrap items-center gap-x-3 text-lg">
          {title}
          <span
            className={`inline-flex items-center gap-1 text-sm ${isDone ? 'text-holds font-semibold' : 'text-ink-soft font-normal'}`}
          >
            <Mark aria-hidden="true" className="size-4" />
            {isDone ? 'Done' : isNext ? 'Next' : 'To do'}
          </span>
        </h2>
        <p className="max-w-[70ch]">{why}</p>
        <p className="text-ink-soft">{state}</p>
        {can(role, link.permission) ? (
          <div className="flex flex-wrap gap-2 pt-1">
            {onAddBins ? (
              <Button size="compact" variant={isNext ? 'primary' : 'secondary'} onClick={onAddBins}>
                Bins by a pattern
              </Button>
            ) : null}
            <ButtonLink
              href={link.href}
              size="compact"
              variant={isNext && !onAddBins ? 'primary' : 'secondary'}
            >
              {link.label}
            </ButtonLink>
          </div>
        ) : (
          <p className="text-ink-soft text-sm">An admin does this.</p>
        )}
      </div>
    </li>
  )
}
