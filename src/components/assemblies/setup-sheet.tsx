'use client'

import { TriangleAlert } from 'lucide-react'
import type { ReactNode } from 'react'
import { assemblyPartNames, featureWords, findingSentence } from '@/lib/assembly-sentences'
import { formatLength } from '@/lib/format-length'
import type { AssemblyResponse } from '@/schemas/assembly'
import { useShop } from '../layout/shop-context'
import { AssemblyDrawing } from './assembly-drawing'
import { difference, partPlaceWords } from './assembly-words'
import { ScanCode, type ScanCodeProps } from './scan-code'

export interface SetupSheetProps {
  assembly: AssemblyResponse
  code: ScanCodeProps
  /** The day, ISO 8601. */
  date: string
}

/** One page of paper, A4 or Letter, for whoever puts the assembly together: on the screen it is not seen. */
export function SetupSheet({ assembly, code, date }: SetupSheetProps) {
  const { unit, shopName, actor, measuringToleranceMm } = useShop()
  const { number, name, tools, stickOutMm, gaugeLengthMm, parts, checks, findings } = assembly
  const [check] = checks
  const said = (mm: number) => formatLength(mm, unit)
  const faults = findings.filter(({ isFault }) => isFault)
  const { nutTorqueNm, measurement } = assembly
  // Left empty for the pen where nothing was measured yet.
  const measured = measurement ? said(measurement.gaugeLengthMm) : ' '
  const off = measurement
    ? difference(measurement.gaugeLengthMm, gaugeLengthMm, measuringToleranceMm, unit)
    : null
  return (
    <article
      aria-label="Set-up sheet"
      className="border-ink hidden border text-[9.5pt] leading-snug print:block"
    >
      <header className="border-ink flex items-stretch justify-between border-b-2">
        <div className="px-3 py-2">
          <p className="text-[9pt]">Set-up sheet</p>
          <p className="text-[20pt] leading-tight font-semibold">Assembly {number}</p>
          {name ? <p className="text-[12pt] font-semibold">{name}</p> : null}
          <p className="break-all">{code.text}</p>
        </div>
        <div className="w-[30mm] p-[3mm]">
          <ScanCode {...code} />
        </div>
      </header>
      {faults.length > 0 ? (
        <p className="border-ink border-b-2 px-3 py-1 font-semibold">
          NO LONGER HOLDS. {faults.map(({ detail }) => findingSentence(detail, unit)).join(' ')}
        </p>
      ) : null}
      {off?.isOver ? (
        <p className="border-ink border-b-2 px-3 py-1 font-semibold">
          MEASURED {off.text} to the calculated gauge length, more than the {said(measuringToleranceMm)}{' '}
          allowed.
        </p>
      ) : null}
      <dl className="border-ink flex border-b [&>div]:flex-1">
        <Big name="Stick-out to set">{said(stickOutMm)}</Big>
        <Big name="Gauge length to expect">{said(gaugeLengthMm)}</Big>
        <Big name="Cutting diameter">{said(tools.cutter.cuttingDiameterMm)}</Big>
        {nutTorqueNm === null ? null : <Big name="Nut torque">{nutTorqueNm} N·m</Big>}
        <Big name="Measured">{measured}</Big>
      </dl>
      {check ? (
        <AssemblyDrawing
          name="setup"
          tools={tools}
          feature={check.feature}
          clearances={check.clearances}
          stickOutMm={stickOutMm}
          reachMm={check.answer?.reachMm ?? null}
          className="border-hairline border-b"
        />
      ) : null}
      <table className="w-full">
        <thead>
          <tr className="border-ink border-b text-left">
            <th className="px-3 py-0.5">Part</th>
            <th className="px-3 py-0.5">Item</th>
            <th className="px-3 py-0.5">Where</th>
          </tr>
        </thead>
        <tbody>
          {parts.map((part) => (
            <tr key={part.kind} className="border-hairline border-b align-baseline">
              <td className="px-3 py-0.5">{assemblyPartNames[part.kind]}</td>
              <td className="px-3 py-0.5">
                <span className="font-semibold">{part.code}</span> {part.description}
              </td>
              <td className="px-3 py-0.5">{partPlaceWords(part)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <dl className="border-ink grid grid-cols-4 border-y">
        <Small name="Tool number">{assembly.toolNumber ?? ''}</Small>
        <Small name="Length offset">{assembly.lengthOffsetNumber ?? ''}</Small>
        <Small name="Diameter offset">{assembly.diameterOffsetNumber ?? ''}</Small>
        <Small name="Machine, pocket">
          {assembly.machine ? `${assembly.machine.code}${assembly.pocket ? `, ${assembly.pocket}` : ''}` : ''}
        </Small>
      </dl>
      <div className="px-3 py-1">
        {checks.map(({ id, feature }) => (
          <p key={id}>For: {featureWords(feature, unit)}</p>
        ))}
        {assembly.note ? <p className="whitespace-pre-line">{assembly.note}</p> : null}
        <p className="mt-1 flex gap-2">
          <TriangleAlert aria-hidden="true" className="mt-0.5 size-4 shrink-0" />
          <span>
            Computed, not proven: check clearance on the machine before cutting. Follow the tool maker’s
            limits for speed and stick-out and the shop’s rules. Eye protection, guarded spindle.
          </span>
        </p>
      </div>
      <footer className="border-ink flex justify-between border-t px-3 py-0.5 text-[8pt]">
        <span>{shopName || 'Leadline'}</span>
        <span>
          {actor.name}, {date}
        </span>
      </footer>
    </article>
  )
}

function Big({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="border-hairline border-l px-3 py-1 first:border-l-0">
      <dt className="text-[8.5pt]">{name}</dt>
      <dd className="text-[15pt] leading-tight font-semibold whitespace-nowrap">{children}</dd>
    </div>
  )
}

function Small({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className="border-hairline min-h-[10mm] border-l px-3 py-0.5 first:border-l-0">
      <dt className="text-[8.5pt]">{name}</dt>
      <dd className="font-semibold">{children}</dd>
    </div>
  )
}
