'use client'

import { CircleX } from 'lucide-react'
import type { ReactNode } from 'react'
import { formatLength } from '@/lib/format-length'
import type { AssemblyResponse } from '@/schemas/assembly'
import { useShop } from '../layout/shop-context'
import { difference, type MeasuredDifference } from './assembly-words'
import { Instant } from './instant'

/** What is set and what is to be expected, large enough to read at the machine; measured against calculated. */
export function AssemblyFigures({ assembly }: { assembly: AssemblyResponse }) {
  const { unit, measuringToleranceMm } = useShop()
  const { measurement, stickOutMm, gaugeLengthMm, tools } = assembly
  const said = (mm: number) => formatLength(mm, unit)
  const diameterMm = tools.cutter.cuttingDiameterMm
  return (
    <section aria-label="Figures">
      <dl className="border-ink grid grid-cols-2 border-y-2">
        <Large name="Stick-out to set" value={said(stickOutMm)} />
        <Large name="Gauge length to expect" value={said(gaugeLengthMm)} />
      </dl>
      <dl className="grid grid-cols-[auto_1fr]">
        {measurement ? (
          <>
            <Figure name="Measured length" value={said(measurement.gaugeLengthMm)}>
              <Difference
                {...difference(measurement.gaugeLengthMm, gaugeLengthMm, measuringToleranceMm, unit)}
                tolerance={said(measuringToleranceMm)}
              />
            </Figure>
            {measurement.diameterMm === null ? null : (
              <Figure name="Measured diameter" value={said(measurement.diameterMm)}>
                <Difference
                  {...difference(measurement.diameterMm, diameterMm, measuringToleranceMm, unit)}
                  tolerance={said(measuringToleranceMm)}
                />
              </Figure>
            )}
            <Figure
              name="Measured by"
              value={measurement.source === 'presetter' ? 'Presetter' : measurement.actorName}
            >
              <Instant at={measurement.measuredAt} />
            </Figure>
          </>
        ) : (
          <Figure name="Measured" value={assembly.state === 'built' ? 'Not yet' : 'When it is built'} />
        )}
        <Figure name="Cutting diameter" value={said(diameterMm)} />
        <Figure name="Tool number" value={assembly.toolNumber?.toString() ?? '–'} />
        <Figure
          name="Offset numbers"
          value={`H ${assembly.lengthOffsetNumber ?? '–'} · D ${assembly.diameterOffsetNumber ?? '–'}`}
        >
          length, diameter
        </Figure>
      </dl>
    </section>
  )
}

function Large({ name, value }: { name: string; value: string }) {
  return (
    <div className="border-hairline border-l px-3 py-2 first:border-l-0 first:pl-0">
      <dt className="text-ink-soft">{name}</dt>
      <dd className="text-3xl font-semibold whitespace-nowrap max-sm:text-2xl">{value}</dd>
    </div>
  )
}

function Figure({ name, value, children }: { name: string; value: string; children?: ReactNode }) {
  return (
    <div className="border-hairline col-span-2 grid grid-cols-subgrid items-baseline gap-x-4 border-b py-1">
      <dt className="text-ink-soft">{name}</dt>
      <dd className="flex flex-wrap items-baseline justify-between gap-x-3">
        <span className="font-semibold">{value}</span>
        <span className="text-ink-soft text-sm">{children}</span>
      </dd>
    </div>
  )
}

function Difference({ text, isOver, tolerance }: MeasuredDifference & { tolerance: string }) {
  if (!isOver) return <>{text} to the calculated</>
  return (
    <span className="text-collision inline-flex items-center gap-1 font-semibold">
      <CircleX aria-hidden="true" className="size-4.5" />
      {text}, more than the {tolerance} allowed
    </span>
  )
}
