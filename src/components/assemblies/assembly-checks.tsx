'use client'

import { CircleCheck, CircleX } from 'lucide-react'
import { featureWords } from '@/lib/assembly-sentences'
import { verdictSentence } from '@/lib/reach-sentences'
import type { AssemblyCheck } from '@/schemas/assembly'
import { ItemSection } from '../catalogue/item-section'
import { useShop } from '../layout/shop-context'
import { Instant } from './instant'

/** What it was kept for, and whether it still does it. */
export function AssemblyChecks({ checks }: { checks: readonly AssemblyCheck[] }) {
  const { unit } = useShop()
  return (
    <ItemSection title="Kept for">
      <ul>
        {checks.map((check) => {
          const Sign = check.holds ? CircleCheck : CircleX
          return (
            <li key={check.id} className="border-hairline flex gap-2 border-b py-2">
              <Sign
                aria-hidden="true"
                className={`mt-0.5 size-5 shrink-0 ${check.holds ? 'text-holds' : 'text-collision'}`}
              />
              <div>
                <p className="font-semibold">
                  {featureWords(check.feature, unit)}
                  {checkMark(check)}
                </p>
                <p>{check.answer ? verdictSentence(check.answer, check.feature, unit) : null}</p>
                <p className="text-ink-soft text-sm">
                  Worked out <Instant at={check.checkedAt} />
                </p>
              </div>
            </li>
          )
        })}
      </ul>
    </ItemSection>
  )
}

function checkMark({ holds, answer }: AssemblyCheck): string {
  if (holds) return ''
  return answer?.verdict === 'reaches' ? ': holds as set, not as measured' : ': no longer holds'
}
