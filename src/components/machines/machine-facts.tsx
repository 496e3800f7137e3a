'use client'

import { decimalText } from '@/core/units/decimal-text'
import { formatLength } from '@/lib/format-length'
import { formatRpm } from '@/lib/format-speed'
import type { MachineResponse } from '@/schemas/machine'
import { useShop } from '../layout/shop-context'

/** What the machine is: its envelope, its changer, and the curve of its spindle. */
export function MachineFacts({ machine }: { machine: MachineResponse }) {
  const { unit } = useShop()
  const said = (mm: number | null) => (mm === null ? 'not entered' : formatLength(mm, unit))
  const facts: [string, string][] = [
    ['Spindle taper', machine.taper],
    ['Spindle nose diameter', said(machine.spindleNoseDiameterMm)],
    ['Gauge line to table, Z up', said(machine.gaugeLineToTableMm)],
    ['X, Y and Z travel', [machine.xTravelMm, machine.yTravelMm, machine.zTravelMm].map(said).join(' · ')],
    ['Longest tool of the changer', said(machine.longestToolMm)],
    ['Widest tool', said(machine.widestToolMm)],
    ['Heaviest tool', machine.heaviestToolKg === null ? 'not entered' : `${machine.heaviestToolKg} kg`],
    ['Pockets', machine.pocketCount === null ? 'not entered' : String(machine.pocketCount)],
    ['Speeds', speeds(machine)],
    ['Motor’s power at the cutter', `${decimalText(machine.efficiency * 100, 0, 0)} %`],
  ]
  return (
    <div className="grid items-start gap-x-10 gap-y-6 lg:grid-cols-2">
      <section aria-labelledby="machine-facts">
        <h2 id="machine-facts" className="border-ink border-b pb-1 text-lg">
          The machine
        </h2>
        <dl className="text-[0.9375rem]">
          {facts.map(([name, value]) => (
            <div key={name} className="border-hairline flex justify-between gap-4 border-b py-1">
              <dt className="text-ink-soft">{name}</dt>
              <dd className="text-right font-semibold">{value}</dd>
            </div>
          ))}
        </dl>
      </section>
      <SpindleTable machine={machine} />
    </div>
  )
}

function speeds({ minimumRpm, maximumRpm }: MachineResponse): string {
  return minimumRpm === null
    ? `up to ${formatRpm(maximumRpm)}`
    : `${formatRpm(minimumRpm).replace(' rpm', '')} to ${formatRpm(maximumRpm)}`
}

function SpindleTable({ machine }: { machine: MachineResponse }) {
  return (
    <section aria-labelledby="spindle-curve">
      <h2 id="spindle-curve" className="border-ink border-b pb-1 text-lg">
        Power and torque of the spindle
      </h2>
      {machine.spindlePoints.length === 0 ? (
        <p className="py-2">Not entered: nothing says whether the spindle drives a cut.</p>
      ) : (
        <table className="w-full text-[0.9375rem]">
          <thead className="border-hairline border-b">
            <tr className="text-ink-soft text-right text-sm [&>th]:py-1 [&>th]:font-normal">
              <th scope="col" className="text-left">
                Speed
              </th>
              <th scope="col">Power</th>
              <th scope="col">Torque</th>
            </tr>
          </thead>
          <tbody>
            {machine.spindlePoints.map((point) => (
              <tr key={point.rpm} className="border-hairline border-b text-right [&>*]:py-1">
                <th scope="row" className="text-left font-normal">
                  {formatRpm(point.rpm)}
                </th>
                <td>{point.powerKw === null ? '–' : `${point.powerKw} kW`}</td>
                <td>{point.torqueNm === null ? '–' : `${point.torqueNm} Nm`}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </section>
  )
}
