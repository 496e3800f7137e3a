'use client'

import Link from 'next/link'
import { useState } from 'react'
import { HolderChoice } from '@/components/ball-end/picked-limits'
import { cellClass, headingCellClass, ItemSection } from '@/components/catalogue/item-section'
import { SectionState } from '@/components/catalogue/section-state'
import { useShop } from '@/components/layout/shop-context'
import { Notice } from '@/components/ui/notice'
import { TextField } from '@/components/ui/text-field'
import { leastSpeedLimit, type SpeedLimit, type SpeedLimits } from '@/core/speeds/speed-limit'
import { type SpindleRange, spindleRange } from '@/core/speeds/spindle-range'
import { holeToolForms } from '@/core/tooling'
import { parseCount } from '@/core/units/parse-count'
import { useReachItem } from '@/hooks/use-reach-items'
import { useStartingSpeeds } from '@/hooks/use-starting-speeds'
import { substrateNames } from '@/lib/cutter-words'
import { formatRpm, formatSpeedRange } from '@/lib/format-speed'
import { limitName, speedLimitSentence } from '@/lib/speed-limit-words'
import type { CutterResponse } from '@/schemas/cutter'
import type { StartingSpeed } from '@/schemas/starting-speed'

/** What the shop's table of starting speeds means for this cutter, within what it and its holder may turn. */
export function CutterSpeedsSection({ cutter }: { cutter: CutterResponse }) {
  const { rows, error, isLoading, refresh } = useStartingSpeeds()
  const { unit, decimalComma } = useShop()
  const [typed, setTyped] = useState('')
  const [holderId, setHolderId] = useState<string | null>(null)
  const { row: holder, error: holderError } = useReachItem('holder', holderId)
  const spindle = typed.trim() === '' ? null : parseCount(typed, { decimalComma })
  const limits: SpeedLimits = {
    spindle: spindle?.ok && spindle.count > 0 ? spindle.count : null,
    holder: holder?.maximumRpm ?? null,
    cutter: cutter.maximumRpm,
  }
  const isHoleTool = holeToolForms.some((form) => form === cutter.form)
  const shown = rows.filter((row) => cutter.substrate === null || row.substrate === cutter.substrate)
  return (
    <ItemSection
      title="Starting speeds"
      aside={
        <Link
          href="/starting-speeds"
          className="text-accent inline-flex items-center font-semibold hover:underline pointer-coarse:min-h-11"
        >
          The shop’s table
        </Link>
      }
    >
      {isHoleTool ? (
        <p className="py-3">The table is for milling: take this tool’s speed from its maker.</p>
      ) : error ? (
        <SectionState sentence={`The speeds could not be loaded. ${error.message}`} onRetry={refresh} />
      ) : isLoading ? (
        <SectionState sentence="Loading the starting speeds …" />
      ) : (
        <div className="flex flex-col gap-3 pt-3">
          <div className="grid items-start gap-x-8 gap-y-2 sm:grid-cols-[12rem_minmax(0,26rem)]">
            <TextField
              label="Spindle limit"
              symbol="rpm"
              inputMode="numeric"
              autoComplete="off"
              value={typed}
              onChange={(event) => setTyped(event.target.value)}
              error={spindleFault(spindle)}
            />
            <HolderChoice
              holder={{ id: holderId, row: holder, error: holderError }}
              unit={unit}
              onPick={setHolderId}
            />
          </div>
          <p className="max-w-[75ch]" role="status">
            {speedLimitSentence(limits)}
            {cutterRemarks(cutter)}
          </p>
          <SpeedTable cutter={cutter} rows={shown} limit={leastSpeedLimit(limits)} />
          <Notice kind="caution">
            These are where a cut may start, at the full diameter; not advice and not a limit. The tool
            maker’s speeds, the holder’s limit and the shop’s rules go first. Closed guard, eye protection.
          </Notice>
        </div>
      )}
    </ItemSection>
  )
}

function spindleFault(spindle: ReturnType<typeof parseCount> | null): string | null {
  if (spindle === null) return null
  if (!spindle.ok) return spindle.message
  return spindle.count > 0 ? null : 'A spindle that stands still limits nothing: enter more than 0.'
}

function cutterRemarks({ substrate, form }: CutterResponse): string {
  const made = substrate === null ? ' What it is made of is not known, so both are listed.' : ''
  const ball =
    form === 'ball' ? ' A ball in a shallow cut runs on less than its diameter and may turn faster.' : ''
  return `${made}${ball}`
}

function SpeedTable({
  cutter,
  rows,
  limit,
}: {
  cutter: CutterResponse
  rows: StartingSpeed[]
  limit: SpeedLimit | null
}) {
  const { unit } = useShop()
  if (rows.length === 0) return <p>The shop’s table has no speed for what this cutter is made of.</p>
  return (
    <div className="relative overflow-x-auto">
      <table className="w-full">
        <caption className="sr-only">Spindle speed at the cutting diameter, by material</caption>
        <thead>
          <tr className="border-ink border-b">
            <th scope="col" className={headingCellClass}>
              Material
            </th>
            <th scope="col" className={`${headingCellClass} text-right`}>
              Cutting speed
            </th>
            <th scope="col" className={`${headingCellClass} text-right`}>
              Spindle speed
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id} className="border-hairline border-b align-baseline">
              <th scope="row" className={`${cellClass} text-left font-normal`}>
                <span className="font-semibold">{row.isoGroup}</span> {row.material}
                {cutter.substrate === null ? ` · ${substrateNames[row.substrate]}` : ''}
              </th>
              <td className={`${cellClass} text-right whitespace-nowrap`}>{formatSpeedRange(row, unit)}</td>
              <td className={`${cellClass} text-right`}>
                <SpindleWords range={spindleRange(cutter.cuttingDiameterMm, row, limit?.rpm)} limit={limit} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

function SpindleWords({ range, limit }: { range: SpindleRange; limit: SpeedLimit | null }) {
  if (range.limited === 'all' && limit) {
    return (
      <>
        <span className="font-semibold">{formatRpm(range.highRpm)}</span>
        <span className="text-ink-soft block text-sm">{limitName(limit)}; slower than the range</span>
      </>
    )
  }
  return (
    <>
      <span className="font-semibold">
        {formatRpm(range.lowRpm).replace(' rpm', '')} to {formatRpm(range.highRpm)}
      </span>
      {range.limited === 'high' && limit ? (
        <span className="text-ink-soft block text-sm">held to {limitName(limit)}</span>
      ) : null}
    </>
  )
}
