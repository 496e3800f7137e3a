'use client'

import Link from 'next/link'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useMachines, useSetUps } from '@/hooks/use-machines'
import { faultSentence } from '@/lib/field-faults'
import { formatLength } from '@/lib/format-length'
import { formatRpm } from '@/lib/format-speed'
import type { MachineResponse } from '@/schemas/machine'
import { PageHeading } from '../layout/page-heading'
import { useCan, useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { StateSentence } from '../ui/state-sentence'
import { MachineDialog } from './machine-dialog'

/** The machines of the shop: what each lets into its spindle, and how it is set up. */
export function MachinesPage({ firstRows }: { firstRows: MachineResponse[] }) {
  const { rows, error, refresh } = useMachines(firstRows)
  const mayKeep = useCan('keepCrib')
  const router = useRouter()
  const [isAdding, setIsAdding] = useState(false)
  return (
    <>
      <PageHeading
        title="Machines"
        note="Their daylight decides which tools get over the part and down to its floor."
      >
        {mayKeep && rows.length > 0 ? <Button onClick={() => setIsAdding(true)}>Add a machine</Button> : null}
      </PageHeading>
      {error ? (
        <StateSentence sentence={faultSentence(error)}>
          <Button onClick={() => void refresh()}>Try again</Button>
        </StateSentence>
      ) : null}
      {rows.length === 0 && !error ? (
        <StateSentence
          sentence={
            mayKeep
              ? 'No machine is entered yet. With one, every tool found is held against its daylight, its changer and its spindle.'
              : 'No machine is entered yet. The crib manager adds them.'
          }
        >
          {mayKeep ? (
            <Button variant="primary" onClick={() => setIsAdding(true)}>
              Add the first machine
            </Button>
          ) : null}
        </StateSentence>
      ) : null}
      {rows.length > 0 ? <MachinesTable rows={rows} /> : null}
      {isAdding ? (
        <MachineDialog
          machine={null}
          onClose={() => setIsAdding(false)}
          onSaved={(machine) => router.push(`/machines/${machine.id}`)}
        />
      ) : null}
    </>
  )
}

function MachinesTable({ rows }: { rows: MachineResponse[] }) {
  const { unit } = useShop()
  const { rows: setUps } = useSetUps('all')
  const figure = (mm: number | null) => (mm === null ? '–' : formatLength(mm, unit))
  return (
    <div className="border-ink bg-sheet border-t">
      <table className="w-full text-left text-[0.9375rem]">
        <caption className="sr-only">Machines with their envelope, changer and speeds</caption>
        <thead className="border-ink border-b max-md:hidden">
          <tr className="[&>th]:px-3 [&>th]:py-2 [&>th]:font-semibold lg:[&>th]:first:pl-6">
            <th scope="col">Machine</th>
            <th scope="col">Taper</th>
            <th scope="col" className="text-right">
              Gauge line to table
            </th>
            <th scope="col" className="text-right">
              Z travel
            </th>
            <th scope="col" className="text-right">
              Longest tool
            </th>
            <th scope="col" className="text-right">
              Pockets
            </th>
            <th scope="col" className="text-right">
              Fastest
            </th>
            <th scope="col" className="pr-6! text-right">
              Set-ups
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((machine) => (
            <MachineRow
              key={machine.id}
              machine={machine}
              figure={figure}
              setUpCount={setUps.filter(({ machineId }) => machineId === machine.id).length}
            />
          ))}
        </tbody>
      </table>
    </div>
  )
}

interface MachineRowProps {
  machine: MachineResponse
  figure: (mm: number | null) => string
  setUpCount: number
}

const cellClass =
  'md:px-3 md:py-1.5 md:text-right max-md:flex max-md:justify-between max-md:gap-4 max-md:before:text-ink-soft max-md:before:content-[attr(data-name)]'

function MachineRow({ machine, figure, setUpCount }: MachineRowProps) {
  return (
    <tr className="border-hairline hover:bg-accent-wash border-b max-md:block max-md:px-4 max-md:py-3">
      <th scope="row" className="text-left font-normal max-md:block md:px-3 md:py-1.5 lg:pl-6">
        <Link
          href={`/machines/${machine.id}`}
          className="text-accent inline-flex min-h-9 items-center gap-2 font-semibold hover:underline pointer-coarse:min-h-11"
        >
          {machine.code}
          <span className="text-ink font-normal">{machine.name}</span>
        </Link>
      </th>
      <td className={`${cellClass} md:text-left`} data-name="Taper">
        {machine.taper}
      </td>
      <td className={cellClass} data-name="Gauge line to table">
        {figure(machine.gaugeLineToTableMm)}
      </td>
      <td className={cellClass} data-name="Z travel">
        {figure(machine.zTravelMm)}
      </td>
      <td className={cellClass} data-name="Longest tool">
        {figure(machine.longestToolMm)}
      </td>
      <td className={cellClass} data-name="Pockets">
        {machine.pocketCount ?? '–'}
      </td>
      <td className={cellClass} data-name="Fastest">
        {formatRpm(machine.maximumRpm)}
      </td>
      <td className={`${cellClass} md:pr-6`} data-name="Set-ups">
        {setUpCount}
      </td>
    </tr>
  )
}
