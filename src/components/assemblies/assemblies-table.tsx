'use client'

import Link from 'next/link'
import { Fragment, type ReactNode } from 'react'
import { formatLength } from '@/lib/format-length'
import type { AssemblyRow } from '@/schemas/assembly'
import { useShop } from '../layout/shop-context'
import { difference, spotWords } from './assembly-words'
import { Mark } from './mark'

const phoneCell =
  'max-sm:flex max-sm:justify-between max-sm:gap-4 sm:px-3 sm:py-1.5 sm:first:pl-4 lg:first:pl-6'

/** One line an assembly; by machine where that is asked, each machine under its own heading. */
export function AssembliesTable({
  rows,
  isByMachine,
}: {
  rows: readonly AssemblyRow[]
  isByMachine: boolean
}) {
  return (
    <div className="border-ink bg-sheet border-t">
      <table className="w-full text-left text-[0.9375rem]">
        <caption className="sr-only">Assemblies</caption>
        <thead className="border-ink border-b max-sm:sr-only">
          <tr className="[&>th]:px-3 [&>th]:py-2 [&>th]:align-bottom [&>th:first-child]:pl-4 lg:[&>th:first-child]:pl-6">
            <th scope="col">Number</th>
            <th scope="col">Parts</th>
            <th scope="col" className="text-right">
              Stick-out
            </th>
            <th scope="col" className="text-right">
              Gauge length
            </th>
            <th scope="col" className="text-right">
              Measured
            </th>
            <th scope="col" className="text-right">
              Tool
            </th>
            <th scope="col">Where</th>
            <th scope="col">Mark</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row, index) => (
            <Fragment key={row.id}>
              {isByMachine && row.machine && row.machine.id !== rows[index - 1]?.machine?.id ? (
                <tr className="border-ink border-b">
                  <th scope="rowgroup" colSpan={8} className="px-4 pt-4 pb-1 text-lg lg:px-6">
                    {row.machine.code} · {row.machine.name}
                  </th>
                </tr>
              ) : null}
              <AssemblyLine row={row} />
            </Fragment>
          ))}
        </tbody>
      </table>
    </div>
  )
}

function AssemblyLine({ row }: { row: AssemblyRow }) {
  const { unit, measuringToleranceMm } = useShop()
  const said = (mm: number) => formatLength(mm, unit)
  const { measurement, gaugeLengthMm } = row
  const off = measurement
    ? difference(measurement.gaugeLengthMm, gaugeLengthMm, measuringToleranceMm, unit)
    : null
  return (
    <tr className="border-hairline hover:bg-accent-wash border-b align-top max-sm:block max-sm:px-4 max-sm:py-3">
      <th scope="row" className="font-normal max-sm:block sm:px-3 sm:py-1.5 sm:pl-4 lg:pl-6">
        <Link
          href={`/assemblies/${row.id}`}
          prefetch={false}
          className="text-accent inline-flex min-h-6 items-center font-semibold hover:underline pointer-coarse:min-h-11"
        >
          {row.number}
          {row.name ? <span className="font-normal">&nbsp;· {row.name}</span> : null}
        </Link>
      </th>
      <Cell label="Parts">{row.parts.map(({ code }) => code).join(' · ')}</Cell>
      <Cell label="Stick-out" isFigure>
        {said(row.stickOutMm)}
      </Cell>
      <Cell label="Gauge length" isFigure>
        {said(gaugeLengthMm)}
      </Cell>
      <Cell label="Measured" isFigure>
        {measurement && off ? (
          <span className={off.isOver ? 'text-collision font-semibold' : ''}>
            {said(measurement.gaugeLengthMm)}
            <span className="block text-sm max-sm:inline">
              {' '}
              {off.text}
              {off.isOver ? ' over' : ''}
            </span>
          </span>
        ) : (
          '–'
        )}
      </Cell>
      <Cell label="Tool" isFigure>
        {row.toolNumber === null ? '–' : `T${row.toolNumber}`}
      </Cell>
      <Cell label="Where">{spotWords(row)}</Cell>
      <Cell label="Mark">
        <Mark {...row} />
      </Cell>
    </tr>
  )
}

function Cell({
  label,
  isFigure = false,
  children,
}: {
  label: string
  isFigure?: boolean
  children: ReactNode
}) {
  return (
    <td className={`${phoneCell} ${isFigure ? 'sm:text-right sm:whitespace-nowrap' : ''}`}>
      <span className="text-ink-soft sm:hidden">{label}</span>
      <span className="max-sm:text-right">{children}</span>
    </td>
  )
}
