'use client'

import { CircleCheck, TriangleAlert } from 'lucide-react'
import type { BallSpeedAnswer, BallSpeedRequest } from '@/core/ball-end/ball-speed-answer'
import type { SpeedLimit } from '@/core/speeds/speed-limit'
import { useBallSpeed } from '@/hooks/use-ball-speed'
import { formatLength } from '@/lib/format-length'
import { PageHeading } from '../layout/page-heading'
import { useShop } from '../layout/shop-context'
import { Notice } from '../ui/notice'
import { BallSpeedCautions, BallSpeedForm } from './ball-speed-form'
import { type BallSpeedVerdict, ballSpeedVerdict } from './ball-speed-verdict'
import { EngagementCharts } from './engagement-charts'
import { ScallopDrawing } from './scallop-drawing'
import { SpeedFigures } from './speed-figures'
import { TipDrawing } from './tip-drawing'

/** The effective speed of a ball end, worked out as it is typed. Another unit opens the same cut afresh. */
export function BallSpeedPage() {
  const { unit } = useShop()
  return <BallSpeedSheet key={unit} />
}

function BallSpeedSheet() {
  const { unit, decimalComma } = useShop()
  const ballSpeed = useBallSpeed({ unit, decimalComma })
  const { request, answer } = ballSpeed.answered
  const fault = Object.values(ballSpeed.reading.faults)[0]
  return (
    <>
      <PageHeading title="Ball-end speed" />
      <div className="grid gap-x-8 gap-y-5 px-4 pb-10 lg:grid-cols-[22rem_minmax(0,1fr)] lg:grid-rows-[auto_1fr] lg:px-6">
        <div className="flex min-w-0 flex-col gap-4 lg:col-start-2">
          {fault ? <Fault sentence={fault} hasEarlier={answer !== null} /> : null}
          {request && answer ? (
            <Answer
              request={request}
              answer={answer}
              limit={ballSpeed.answered.limit}
              isEarlier={fault !== undefined}
            />
          ) : null}
        </div>
        <div className="lg:col-start-1 lg:row-span-2 lg:row-start-1">
          <BallSpeedForm ballSpeed={ballSpeed} />
        </div>
        {request && answer ? (
          <>
            <SpeedFigures request={request} answer={answer} unit={unit} />
            <div className="flex min-w-0 flex-col gap-6 lg:col-span-2">
              <EngagementCharts request={request} answer={answer} unit={unit} />
              <Scallop request={request} answer={answer} />
            </div>
          </>
        ) : null}
        <div className="lg:col-span-2">
          <BallSpeedCautions />
        </div>
      </div>
    </>
  )
}

function Fault({ sentence, hasEarlier }: { sentence: string; hasEarlier: boolean }) {
  return (
    <Notice kind="caution" isAnnounced>
      <p className="font-semibold">{sentence}</p>
      {hasEarlier ? <p>Until then, the drawing and the figures are of the cut before.</p> : null}
    </Notice>
  )
}

function Answer({
  request,
  answer,
  limit,
  isEarlier,
}: {
  request: BallSpeedRequest
  answer: BallSpeedAnswer
  limit: SpeedLimit | null
  isEarlier: boolean
}) {
  const { unit } = useShop()
  const verdict = ballSpeedVerdict(request, answer, unit, limit)
  return (
    <>
      {isEarlier ? null : <Verdict verdict={verdict} />}
      <TipDrawing
        request={request}
        answer={answer}
        sentence={[verdict.sentence, ...verdict.remarks].join(' ')}
      />
    </>
  )
}

function Verdict({ verdict }: { verdict: BallSpeedVerdict }) {
  const Mark = verdict.kind === 'holds' ? CircleCheck : TriangleAlert
  const colour = verdict.kind === 'holds' ? 'text-holds' : 'text-caution'
  return (
    <div>
      <p className="text-xl font-semibold" aria-live="polite">
        {verdict.sentence}
      </p>
      {verdict.remarks.length > 0 ? (
        <p className="mt-1 flex gap-2">
          <Mark aria-hidden="true" className={`mt-0.5 size-5 shrink-0 ${colour}`} />
          <span className="max-w-[80ch]">{verdict.remarks.join(' ')}</span>
        </p>
      ) : null}
    </div>
  )
}

function Scallop({ request, answer }: { request: BallSpeedRequest; answer: BallSpeedAnswer }) {
  const { unit } = useShop()
  const { stepoverMm } = request
  const { scallopHeightMm } = answer
  if (stepoverMm == null || scallopHeightMm === null) return null
  const height = formatLength(scallopHeightMm, unit, { extraDecimals: 1 })
  const sentence =
    scallopHeightMm === 0
      ? `Passes ${formatLength(stepoverMm, unit)} apart leave no scallop: the flat end cleans the step.`
      : `Passes ${formatLength(stepoverMm, unit)} apart leave scallops ${height} high on a flat surface.`
  return (
    <section className="flex flex-col gap-2">
      <h2 className="text-lg">{sentence}</h2>
      <ScallopDrawing {...{ request, stepoverMm, scallopHeightMm, sentence }} />
    </section>
  )
}
