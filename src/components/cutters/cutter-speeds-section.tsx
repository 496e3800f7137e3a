'use client'

import Link from 'next/link'
import { useState } from 'react'
import { cellClass, headingCellClass, ItemSection } from '@/components/catalogue/item-section'
import { SectionState } from '@/components/catalogue/section-state'
import { useShop } from '@/components/layout/shop-context'
import { Notice } from '@/components/ui/notice'
import { TextField } from '@/components/ui/text-field'
import { type SpindleRange, spindleRange } from '@/core/speeds/spindle-range'
import { holeToolForms } from '@/core/tooling'
import { parseCount } from '@/core/units/parse-count'
import { useStartingSpeeds } from '@/hooks/use-starting-speeds'
import { substrateNames } from '@/lib/cutter-words'
import { formatRpm, formatSpeedRange } from '@/lib/format-speed'
import type { CutterResponse } from '@/schemas/cutter'
import type { StartingSpeed } from '@/schemas/starting-speed'

/** What the shop's table of starting speeds means for this cutter, within what it and its holder may turn. */
export function CutterSpeedsSection({ cutter }: { cutter: CutterResponse }) {
  const { rows, error, isLoading, refresh } = useStartingSpeeds()
  const [typed, setTyped] = useState('')
  const limit = typed.trim() === '' ? null : parseCount(typed)
  const limitRpm = limit?.ok && limit.count > 0 ? limit.count : null
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
          <div className="flex flex-wrap items-end gap-x-8 gap-y-2">
            <TextField
              label="Limit of spindle and holder"
              symbol="rpm"
              inputMode="numeric"
              autoComplete="off"
              className="w-64"
              value={typed}
              onChange={(event) => setTyped(event.target.value)}
              error={limit && !limit.ok ? limit.message : null}
            />
            <p className="max-w-[60ch] pb-2">{limitSentence(cutter)}</p>
          </div>
          <SpeedTable cutter={cutter} rows={shown} limitRpm={limitRpm} />
          <Notice kind="caution">
            These are where a cut may start, at the full diameter; not advice and not a limit. The tool
            maker’s speeds, the holder’s limit and the shop’s rules go first. Closed guard, eye protection.
          </Notice>
        </div>
      )}
    </ItemSection>
  )
}

function limitSentence({ maximumRpm, substrate, form }: CutterResponse): string {
  const limit =
    maximumRpm === null
      ? 'The catalogue has no highest speed (RPMX) for this cutter.'
      : `Held to this cutter’s highest speed, ${formatRpm(maximumRpm)}.`
  const made = substrate === null ? ' What it is made of is not known, so both are listed.' : ''
  const ball =
    form === 'ball' ? ' A ball in a shallow cut runs on less than its diameter and may turn faster.' : ''
  return `${limit}${made}${ball}`
}

function SpeedTable({
  cutter,
  rows,
  limitRpm,
}: {
  cutter: CutterResponse
  rows: StartingSpeed[]
  limitRpm: number | null
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
                <SpindleWords
                  range={spindleRange(cutter.cuttingDiameterMm, row, [cutter.maximumRpm, limitRpm])}
                />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

function SpindleWords({ range }: { range: SpindleRange }) {
  if (range.limited === 'all') {
    return (
      <>
        <span className="font-semibold">{formatRpm(range.highRpm)}</span>
        <span className="text-ink-soft block text-sm">the limit; slower than the range</span>
      </>
    )
  }
  return (
    <>
      <span className="font-semibold">
        {formatRpm(range.lowRpm).replace(' rpm', '')} to {formatRpm(range.highRpm)}
      </span>
      {range.limited === 'high' ? (
        <span className="text-ink-soft block text-sm">held to the limit</span>
      ) : null}
    </>
  )
}
