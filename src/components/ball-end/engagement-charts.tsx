'use client'

import type { ReactNode } from 'react'
import {
  CartesianGrid,
  Line,
  LineChart,
  ReferenceArea,
  ReferenceDot,
  ReferenceLine,
  ResponsiveContainer,
  Tooltip,
  XAxis,
  YAxis,
} from 'recharts'
import {
  type BallSpeedAnswer,
  type BallSpeedRequest,
  ballSpeedAnswer,
} from '@/core/ball-end/ball-speed-answer'
import { decimalText } from '@/core/units/decimal-text'
import { type LengthUnit, mmPerInch } from '@/core/units/length-unit'
import { metresPerFoot } from '@/core/units/parse-speed'
import { formatAngle } from '@/lib/format-angle'
import { formatLength } from '@/lib/format-length'
import { formatRpm, speedUnitNames } from '@/lib/format-speed'

export interface EngagementChartsProps {
  request: BallSpeedRequest
  answer: BallSpeedAnswer
  unit: LengthUnit
}

const steps = 90

/** How the diameters that cut, or their speeds, go with the depth of cut and with the tilt; this cut is marked. */
export function EngagementCharts({ request, answer, unit }: EngagementChartsProps) {
  const measure = measureOf(answer, unit)
  const radiusMm = request.cornerRadiusMm ?? request.cuttingDiameterMm / 2
  const isTilted = answer.tiltToClearTipDeg !== null
  const unitMm = unit === 'in' ? mmPerInch : 1
  return (
    <div className="grid gap-6 xl:grid-cols-2">
      <EngagementChart
        title={`${measure.name} along the depth of cut`}
        measure={measure}
        xName={`ap, ${unit}`}
        points={curve(radiusMm, (depthOfCutMm) => ({ ...request, depthOfCutMm }), measure, unitMm)}
        here={{ x: Math.min(request.depthOfCutMm, radiusMm) / unitMm, ...spanOf(answer, measure) }}
        hereName={formatLength(request.depthOfCutMm, unit)}
      />
      {isTilted ? (
        <EngagementChart
          title={`${measure.name} along the tilt`}
          measure={measure}
          xName="β, degrees"
          points={curve(90, (tiltDeg) => ({ ...request, tiltDeg, leadDeg: null }), measure, 1)}
          here={{ x: answer.tiltDeg, ...spanOf(answer, measure) }}
          hereName={formatAngle(answer.tiltDeg)}
          deadUpTo={answer.tiltToClearTipDeg}
        />
      ) : null}
    </div>
  )
}

interface Measure {
  name: string
  unitName: string
  /** From a diameter in mm to what the chart shows. */
  of: (diameterMm: number) => number
  text: (value: number) => string
}

interface CurvePoint {
  x: number
  largest: number
  smallest: number
}

/** Speed at the present spindle speed where there is one, else the diameter alone. */
function measureOf({ spindleRpm }: BallSpeedAnswer, unit: LengthUnit): Measure {
  if (spindleRpm === null) {
    const unitMm = unit === 'in' ? mmPerInch : 1
    return {
      name: 'Effective diameter',
      unitName: unit,
      of: (diameterMm) => diameterMm / unitMm,
      text: (value) => formatLength(value * unitMm, unit),
    }
  }
  const perMm = (Math.PI * spindleRpm) / 1000 / (unit === 'in' ? metresPerFoot : 1)
  return {
    name: `Cutting speed at ${formatRpm(spindleRpm)}`,
    unitName: speedUnitNames[unit],
    of: (diameterMm) => diameterMm * perMm,
    text: (value) => `${decimalText(value, 0, value < 1000 ? 1 : 0)} ${speedUnitNames[unit]}`,
  }
}

function spanOf({ effectiveDiameterMm }: BallSpeedAnswer, measure: Measure) {
  return {
    largest: measure.of(effectiveDiameterMm.largest),
    smallest: measure.of(effectiveDiameterMm.smallest),
  }
}

/** Points are set closer together at the start, where the curve is steep. */
function curve(
  end: number,
  requestAt: (x: number) => BallSpeedRequest,
  measure: Measure,
  unitOfX: number,
): CurvePoint[] {
  return Array.from({ length: steps + 1 }, (_, index) => {
    const x = Math.max(end * (index / steps) ** 2, end * 1e-6)
    return { x: x / unitOfX, ...spanOf(ballSpeedAnswer(requestAt(x)), measure) }
  })
}

interface EngagementChartProps {
  title: string
  measure: Measure
  xName: string
  points: CurvePoint[]
  here: CurvePoint
  hereName: string
  deadUpTo?: number | null
}

const rightAngleTicks = [0, 15, 30, 45, 60, 75, 90]

/** From 0 past the largest value in three to seven steps of 1, 2 or 5 and their tens. */
function roundTicks(largest: number): number[] {
  const ten = 10 ** Math.floor(Math.log10(largest / 3))
  const step = ([5, 2, 1].find((factor) => largest / (factor * ten) >= 3) ?? 1) * ten
  const count = Math.ceil(largest / step - 1e-9)
  return Array.from({ length: count + 1 }, (_, index) => index * step)
}

const tick = { fill: 'var(--ink-soft)', fontSize: 13 }

function EngagementChart({ title, measure, xName, points, here, hereName, deadUpTo }: EngagementChartProps) {
  const lastX = points.at(-1)?.x ?? 1
  const xTicks = deadUpTo == null ? roundTicks(lastX).filter((value) => value <= lastX) : rightAngleTicks
  const yTicks = roundTicks(points.at(-1)?.largest ?? 1)
  return (
    <figure className="min-w-0">
      <figcaption className="flex flex-wrap items-baseline justify-between gap-x-4">
        <span className="font-semibold">{title}</span>
        <span className="text-ink-soft flex gap-x-4 text-sm">
          <Key dashes={false}>largest</Key>
          <Key dashes>smallest</Key>
        </span>
      </figcaption>
      <p className="sr-only">
        {`At ${hereName} from ${measure.text(here.smallest)} to ${measure.text(here.largest)}.`}
      </p>
      <ResponsiveContainer width="100%" height={240}>
        <LineChart data={points} margin={{ top: 16, right: 14, bottom: 22, left: 4 }}>
          <CartesianGrid stroke="var(--hairline)" strokeWidth={0.6} />
          {deadUpTo ? (
            <ReferenceArea
              x1={0}
              x2={deadUpTo}
              fill="var(--caution-wash)"
              fillOpacity={0.8}
              label={{
                value: 'dead tip in the cut',
                position: 'insideTopLeft',
                fill: 'var(--caution)',
                fontSize: 13,
              }}
            />
          ) : null}
          <XAxis
            dataKey="x"
            type="number"
            domain={[0, lastX]}
            ticks={xTicks}
            tickFormatter={(value: number) => decimalText(value, 0, 3)}
            stroke="var(--ink)"
            tick={tick}
            label={{ value: xName, position: 'insideBottom', offset: -14, ...tick }}
          />
          <YAxis
            width={60}
            domain={[0, yTicks.at(-1) ?? 1]}
            ticks={yTicks}
            stroke="var(--ink)"
            tick={tick}
            tickFormatter={(value: number) => decimalText(value, 0, 3)}
            label={{ value: measure.unitName, angle: -90, position: 'insideLeft', offset: 8, ...tick }}
          />
          <Tooltip
            isAnimationActive={false}
            formatter={(value) => measure.text(Number(value))}
            labelFormatter={(value) => `${xName.split(',')[0]} ${decimalText(Number(value), 0, 3)}`}
            contentStyle={{ background: 'var(--sheet)', border: '1px solid var(--ink)', borderRadius: 0 }}
          />
          <ReferenceLine x={here.x} stroke="var(--ink)" strokeDasharray="5 3" strokeWidth={0.9} />
          <Line
            dataKey="largest"
            type="linear"
            stroke="var(--ink)"
            strokeWidth={2}
            dot={false}
            isAnimationActive={false}
          />
          <Line
            dataKey="smallest"
            type="linear"
            stroke="var(--ink)"
            strokeWidth={1.4}
            strokeDasharray="6 4"
            dot={false}
            isAnimationActive={false}
          />
          <ReferenceDot
            x={here.x}
            y={here.largest}
            shape={<HereDot text={measure.text(here.largest)} isLate={here.x > lastX * 0.6} />}
          />
          <ReferenceDot
            x={here.x}
            y={here.smallest}
            r={4}
            fill="var(--sheet)"
            stroke="var(--accent)"
            strokeWidth={2}
          />
        </LineChart>
      </ResponsiveContainer>
    </figure>
  )
}

/** The present cut on the curve, its value beneath the line where the curve leaves room. */
function HereDot({
  cx = 0,
  cy = 0,
  text,
  isLate,
}: {
  cx?: number
  cy?: number
  text: string
  isLate: boolean
}) {
  return (
    <g>
      <circle cx={cx} cy={cy} r={5} fill="var(--accent)" />
      <text
        x={isLate ? cx - 9 : cx + 9}
        y={cy + 21}
        textAnchor={isLate ? 'end' : 'start'}
        fontSize={14}
        fontWeight={600}
        fill="var(--ink)"
        stroke="var(--ground)"
        strokeWidth={4}
        paintOrder="stroke"
      >
        {text}
      </text>
    </g>
  )
}

function Key({ dashes, children }: { dashes: boolean; children: ReactNode }) {
  return (
    <span className="inline-flex items-center gap-1.5">
      <svg width={24} height={8} aria-hidden="true">
        <path
          d="M0 4H24"
          stroke="var(--ink)"
          strokeWidth={dashes ? 1.4 : 2}
          strokeDasharray={dashes ? '6 4' : undefined}
        />
      </svg>
      {children}
    </span>
  )
}
