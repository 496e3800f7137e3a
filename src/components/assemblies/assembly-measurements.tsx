'use client'

import { formatLength } from '@/lib/format-length'
import type { AssemblyResponse } from '@/schemas/assembly'
import { cellClass, headingCellClass, ItemSection } from '../catalogue/item-section'
import { useShop } from '../layout/shop-context'
import { difference } from './assembly-words'
import { Instant } from './instant'

/** Every measurement there was, each against what was calculated then. */
export function AssemblyMeasurements({ assembly }: { assembly: AssemblyResponse }) {
  const { unit, measuringToleranceMm } = useShop()
  const { measurements } = assembly
  const said = (mm: number) => formatLength(mm, unit)
  return (
    <ItemSection title="Measured">
      {measurements.length === 0 ? (
        <p className="py-3">It was never measured.</p>
      ) : (
        <table className="w-full">
          <thead>
            <tr className="border-hairline border-b">
              <th scope="col" className={headingCellClass}>
                When
              </th>
              <th scope="col" className={`${headingCellClass} text-right`}>
                Gauge length
              </th>
              <th scope="col" className={`${headingCellClass} text-right`}>
                To calculated
              </th>
              <th scope="col" className={`${headingCellClass} text-right max-sm:hidden`}>
                Diameter
              </th>
            </tr>
          </thead>
          <tbody>
            {measurements.map((measured) => {
              const { gaugeLengthMm, expectedGaugeLengthMm, diameterMm } = measured
              const off = difference(gaugeLengthMm, expectedGaugeLengthMm, measuringToleranceMm, unit)
              return (
                <tr key={measured.id} className="border-hairline border-b align-baseline">
                  <th scope="row" className={`${cellClass} text-left font-normal`}>
                    <Instant at={measured.measuredAt} />
                    <span className="text-ink-soft block text-sm">
                      {measured.actorName}, {measured.source === 'presetter' ? 'presetter' : 'by hand'}
                      {measured.isCurrent ? '' : ', before it was built or set as now'}
                    </span>
                  </th>
                  <td className={`${cellClass} text-right whitespace-nowrap`}>{said(gaugeLengthMm)}</td>
                  <td
                    className={`${cellClass} text-right whitespace-nowrap ${off.isOver ? 'text-collision font-semibold' : ''}`}
                  >
                    {off.text}
                    {off.isOver ? ' over' : ''}
                  </td>
                  <td className={`${cellClass} text-right max-sm:hidden`}>
                    {diameterMm === null ? '–' : said(diameterMm)}
                  </td>
                </tr>
              )
            })}
          </tbody>
        </table>
      )}
    </ItemSection>
  )
}
