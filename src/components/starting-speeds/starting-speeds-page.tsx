'use client'

import { Fragment, useState } from 'react'
import { isoGroupNames, isoGroups } from '@/core/speeds/iso-groups'
import { useStartingSpeeds } from '@/hooks/use-starting-speeds'
import { substrateNames } from '@/lib/cutter-words'
import { formatSpeedRange } from '@/lib/format-speed'
import type { StartingSpeed } from '@/schemas/starting-speed'
import { PageHeading } from '../layout/page-heading'
import { useCan, useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { StateSentence } from '../ui/state-sentence'
import { SpeedEditRow } from './speed-edit-row'

/** The shop's table of starting speeds, changed where it stands. */
export function StartingSpeedsPage({ firstRows }: { firstRows: StartingSpeed[] }) {
  const { rows, refresh } = useStartingSpeeds(firstRows)
  const { unit } = useShop()
  const mayKeep = useCan('keepCrib')
  const [editedId, setEditedId] = useState<string | null>(null)

  function handleDone() {
    setEditedId(null)
    void refresh()
  }

  return (
    <>
      <PageHeading
        title="Starting speeds"
        note="Where a milling cut may start, by material and by what the cutter is made of. They are ranges to begin with, not advice: change them to what runs in this shop."
      >
        {mayKeep ? <Button onClick={() => setEditedId('new')}>Add a material</Button> : null}
      </PageHeading>
      <div className="flex flex-col gap-4 px-4 pb-10 lg:px-6">
        <Notice kind="caution">
          Go by the tool maker’s own speeds where there are any, by the limits of spindle and holder and by
          the shop’s rules. Old tables for high-speed steel print upper limits. Closed guard, eye protection.
        </Notice>
        {rows.length === 0 && editedId !== 'new' ? (
          <StateSentence sentence="The table is empty: no speed is offered anywhere until it has a material." />
        ) : (
          <table className="w-full">
            <caption className="sr-only">Starting speeds by group, material and substrate</caption>
            <thead className="max-md:sr-only">
              <tr className="border-ink text-ink-soft border-b text-left text-sm">
                <th scope="col" className="w-[22rem] py-1.5 pr-3 font-normal">
                  Material
                </th>
                <th scope="col" className="w-24 py-1.5 pr-3 font-normal">
                  Cutter of
                </th>
                <th scope="col" className="w-48 py-1.5 pr-3 font-normal">
                  Cutting speed
                </th>
                <th scope="col" className="py-1.5 pr-3 font-normal">
                  Source and doubts
                </th>
                <th scope="col" className="w-24">
                  <span className="sr-only">Change</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {editedId === 'new' ? (
                <SpeedEditRow row={null} onDone={handleDone} onCancel={() => setEditedId(null)} />
              ) : null}
              {isoGroups.map((group) => {
                const members = rows.filter((row) => row.isoGroup === group)
                if (members.length === 0) return null
                return (
                  <Fragment key={group}>
                    <tr className="border-hairline border-b">
                      <th scope="rowgroup" colSpan={5} className="pt-4 pb-1 text-left text-lg font-semibold">
                        {group} · {isoGroupNames[group]}
                      </th>
                    </tr>
                    {members.map((row) =>
                      row.id === editedId ? (
                        <SpeedEditRow
                          key={row.id}
                          row={row}
                          onDone={handleDone}
                          onCancel={() => setEditedId(null)}
                        />
                      ) : (
                        <SpeedRow
                          key={row.id}
                          row={row}
                          range={formatSpeedRange(row, unit)}
                          onEdit={mayKeep ? () => setEditedId(row.id) : null}
                        />
                      ),
                    )}
                  </Fragment>
                )
              })}
            </tbody>
          </table>
        )}
      </div>
    </>
  )
}

function SpeedRow({
  row,
  range,
  onEdit,
}: {
  row: StartingSpeed
  range: string
  onEdit: (() => void) | null
}) {
  return (
    <tr className="border-hairline border-b align-baseline max-md:grid max-md:grid-cols-[1fr_auto] max-md:py-2">
      <th scope="row" className="py-1.5 pr-3 text-left font-semibold max-md:py-0">
        {row.material}
      </th>
      <td className="py-1.5 pr-3 max-md:py-0 max-md:pr-0 max-md:text-right">
        {substrateNames[row.substrate]}
      </td>
      <td className="py-1.5 pr-3 whitespace-nowrap max-md:col-span-2 max-md:py-0">{range}</td>
      <td className="text-ink-soft py-1.5 pr-3 text-sm max-md:py-0">{row.sourceNote}</td>
      <td className="text-right">
        {onEdit ? (
          <Button
            variant="quiet"
            size="compact"
            aria-label={`Change ${row.material}, ${substrateNames[row.substrate]}`}
            onClick={onEdit}
          >
            Change
          </Button>
        ) : null}
      </td>
    </tr>
  )
}
