'use client'

import { useEffect, useRef } from 'react'
import { decimalText } from '@/core/units/decimal-text'
import { cutRows } from '@/lib/cut-sentences'
import { formatLength } from '@/lib/format-length'
import { formatMoney } from '@/lib/format-money'
import { Button } from '../ui/button'
import { CompareDrawing } from './compare-drawing'
import { type AssemblyListing, type SearchedAssembly, sceneOfAssembly } from './listed-assembly'

/** What was chosen so far, and the way to see it side by side: at the foot of the window, where a thumb is. */
export function CompareBar({
  count,
  onCompare,
  onClear,
}: {
  count: number
  onCompare: () => void
  onClear: () => void
}) {
  return (
    <div className="border-ink bg-sheet sticky bottom-0 z-10 flex flex-wrap items-center gap-2 border px-3 py-2">
      <p role="status" className="mr-auto font-semibold">
        {count === 1 ? '1 chosen: choose another to compare' : `${count} chosen`}
      </p>
      <Button variant="quiet" className="max-lg:min-h-16" onClick={onClear}>
        Clear
      </Button>
      <Button variant="primary" className="max-lg:min-h-16" disabled={count < 2} onClick={onCompare}>
        Side by side
      </Button>
    </div>
  )
}

export interface CompareSectionProps {
  assemblies: readonly SearchedAssembly[]
  listing: AssemblyListing
  onClose: () => void
}

/** Two to four assemblies in one drawing, to one scale and on one floor, with their figures under them. */
export function CompareSection({ assemblies, listing, onClose }: CompareSectionProps) {
  const heading = useRef<HTMLHeadingElement>(null)
  useEffect(() => {
    heading.current?.focus()
    heading.current?.scrollIntoView({ block: 'start' })
  }, [])
  const drawn = assemblies.flatMap((assembly) => {
    const scene = sceneOfAssembly(assembly, listing)
    return scene ? { name: nameOf(assembly), scene } : []
  })
  return (
    <section aria-labelledby="side-by-side" className="border-ink bg-sheet border">
      <div className="border-hairline flex items-center justify-between gap-3 border-b px-4 py-1">
        <h2 id="side-by-side" ref={heading} tabIndex={-1} className="scroll-mt-20 text-xl outline-none">
          Side by side
        </h2>
        <Button variant="quiet" className="max-lg:min-h-16" onClick={onClose}>
          Close
        </Button>
      </div>
      <CompareDrawing drawn={drawn} unit={listing.unit} />
      <CompareTable assemblies={assemblies} listing={listing} />
    </section>
  )
}

function nameOf({ cutter, holder }: SearchedAssembly): string {
  return `${cutter.code} in ${holder.code}`
}

function CompareTable({ assemblies, listing }: Omit<CompareSectionProps, 'onClose'>) {
  const size = (mm: number) => formatLength(mm, listing.unit)
  const stiffest = Math.min(...assemblies.map(({ stiffness }) => stiffness.complianceUmPerN))
  const rows: CompareRow[] = [
    ['Stick-out to set', ({ stickOut }) => size(stickOut.usedMm)],
    ['Gauge length', ({ reach }) => size(reach.gaugeLengthMm)],
    ['Reaches', ({ reach }) => (reach.reachMm === null ? 'without limit' : size(reach.reachMm))],
    [
      'Bends',
      ({ stiffness }) =>
        `${decimalText(stiffness.complianceUmPerN, 3, 3)} µm/N, ${decimalText(stiffness.complianceUmPerN / stiffest, 2, 2)} ×`,
    ],
    ['Stick-out to diameter', ({ stiffness }) => decimalText(stiffness.stickOutToDiameter, 1, 1)],
    ['In stock', ({ stock }) => (stock.available > 0 ? `${stock.available}` : 'not all of it')],
    ...cutRowsOf(assemblies, listing),
    ...(assemblies.some(({ cost }) => cost) ? [['Cost of its parts', costText] as CompareRow] : []),
  ]
  return (
    <div className="overflow-x-auto">
      <table className="w-full">
        <caption className="sr-only">The figures of what is compared</caption>
        <thead>
          <tr className="border-ink border-y text-left align-baseline">
            <td className="px-3 py-1.5" />
            {assemblies.map((assembly) => (
              <th key={assembly.key} scope="col" className="px-3 py-1.5">
                {nameOf(assembly)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(([label, text]) => (
            <tr key={label} className="border-hairline border-b align-baseline last:border-b-0">
              <th scope="row" className="text-ink-soft px-3 py-1.5 text-left font-normal">
                {label}
              </th>
              {assemblies.map((assembly) => (
                <td key={assembly.key} className="px-3 py-1.5">
                  {text(assembly)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

type CompareRow = [label: string, text: (assembly: SearchedAssembly) => string]

/** The cut asked for, as estimated for each; in a hole a mill and a drill have not all figures in common. */
function cutRowsOf(
  assemblies: readonly SearchedAssembly[],
  { unit }: Pick<AssemblyListing, 'unit'>,
): CompareRow[] {
  if (assemblies.every(({ estimate }) => estimate === null)) return []
  const rowsOf = ({ estimate }: SearchedAssembly) =>
    new Map(estimate?.answer ? cutRows(estimate.answer, unit) : [])
  const labels = new Set(assemblies.flatMap((assembly) => [...rowsOf(assembly).keys()]))
  if (labels.size === 0) return [['The cut, estimated', ({ estimate }) => estimate?.sentence ?? '']]
  return [...labels].map((label) => [
    `${label}, estimated`,
    (assembly) => rowsOf(assembly).get(label) ?? assembly.estimate?.sentence ?? '',
  ])
}

function costText({ cost }: SearchedAssembly): string {
  return cost?.amount == null ? 'not known' : formatMoney(cost.amount, cost.currency)
}
