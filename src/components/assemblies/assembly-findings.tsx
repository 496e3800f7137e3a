'use client'

import { CircleX } from 'lucide-react'
import { useState } from 'react'
import { toast } from '@/components/ui/toast'
import { useActOnAssembly } from '@/hooks/use-assemblies'
import { findingSentence } from '@/lib/assembly-sentences'
import { faultSentence } from '@/lib/field-faults'
import { newIdempotencyKey } from '@/lib/new-idempotency-key'
import type { AssemblyFinding, AssemblyResponse } from '@/schemas/assembly'
import { useCan, useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { Instant } from './instant'

export interface AssemblyFindingsProps {
  assembly: AssemblyResponse
  onChanged: (assembly: AssemblyResponse) => void
}

/** What no longer holds, first and loud; then what changed; then the way on. */
export function AssemblyFindings({ assembly, onChanged }: AssemblyFindingsProps) {
  const { findings, isMarked, isBeingRechecked } = assembly
  const faults = findings.filter(({ isFault }) => isFault)
  const changes = findings.filter(({ isFault }) => !isFault)
  if (isMarked)
    return (
      <section aria-label="What no longer holds" className="border-collision bg-collision-wash border-2">
        <h2 className="bg-collision text-sheet flex items-center gap-2 px-4 py-2 text-xl">
          <CircleX aria-hidden="true" className="size-7 shrink-0" />
          No longer holds: don’t run it as it was noted
        </h2>
        <div className="flex flex-col gap-3 px-4 py-3">
          <FindingList findings={faults} className="text-lg font-semibold" />
          {changes.length > 0 ? (
            <div>
              <h3 className="text-base">What changed</h3>
              <FindingList findings={changes} />
            </div>
          ) : null}
          <WayOn assembly={assembly} onChanged={onChanged} />
        </div>
      </section>
    )
  return (
    <>
      {isBeingRechecked ? (
        <Notice kind="caution" isAnnounced>
          A part or a setting changed and it is being looked at again. Until then take nothing of it for
          granted.
        </Notice>
      ) : null}
      {changes.length > 0 ? (
        <Notice kind="plain">
          <p className="font-semibold">Changed since it was kept; everything still holds.</p>
          <FindingList findings={changes} />
        </Notice>
      ) : null}
    </>
  )
}

function FindingList({ findings, className }: { findings: readonly AssemblyFinding[]; className?: string }) {
  const { unit } = useShop()
  return (
    <ul className="flex flex-col gap-1">
      {findings.map((finding) => (
        <li key={finding.id}>
          <span className={className}>{findingSentence(finding.detail, unit)}</span>{' '}
          <span className="text-ink-soft text-sm">
            <Cause finding={finding} />
          </span>
        </li>
      ))}
    </ul>
  )
}

function Cause({ finding: { movement, foundAt } }: { finding: AssemblyFinding }) {
  if (!movement)
    return (
      <>
        Found <Instant at={foundAt} />.
      </>
    )
  const to = movement.kind === 'scrap' ? 'to scrap' : `to ${movement.toName}`
  return (
    <>
      {movement.actorName} moved {movement.quantity} {to}, <Instant at={movement.occurredAt} />.
    </>
  )
}

/** Sizes can be taken over; a part that is gone asks for hands. */
function WayOn({ assembly, onChanged }: AssemblyFindingsProps) {
  const act = useActOnAssembly()
  const mayPlan = useCan('plan')
  const mayMove = useCan('move')
  const [isBusy, setIsBusy] = useState(false)
  const codes = new Set(assembly.findings.map(({ detail }) => detail.code))
  const canTakeOver = codes.has('sizesChanged') && mayPlan && (assembly.state !== 'built' || mayMove)

  async function handleTakeOver() {
    setIsBusy(true)
    try {
      const changed = await act(assembly, 'take-over', {}, newIdempotencyKey())
      onChanged(changed)
      toast.success(changed.isMarked ? 'Taken over; not everything holds with it.' : 'Taken over: it holds.')
    } catch (error) {
      toast.error(faultSentence(error))
    }
    setIsBusy(false)
  }

  return (
    <div className="flex flex-col gap-3 print:hidden">
      <ul className="list-disc pl-5">
        {codes.has('checkFailsAsMeasured') ? <li>Set the stick-out again and measure it again.</li> : null}
        {codes.has('checkFails') || codes.has('checkImpossible') ? (
          <li>Set another stick-out, or find another assembly for this feature.</li>
        ) : null}
        {codes.has('offsetChanged') ? (
          <li>Correct what stands in the control and on every set-up sheet of it.</li>
        ) : null}
        {codes.has('partGone') ? <li>Break it down and build it again, whole.</li> : null}
        {codes.has('partArchived') ? <li>Plan another with a part that is still in use.</li> : null}
      </ul>
      {canTakeOver ? (
        <Button size="counter" className="self-start" disabled={isBusy} onClick={handleTakeOver}>
          {isBusy ? 'Taking over …' : 'Take the new sizes over'}
        </Button>
      ) : null}
    </div>
  )
}
