'use client'

import { useSetUpAssembly } from '@/hooks/use-machines'
import { formatLength } from '@/lib/format-length'
import type { ExtensionResponse } from '@/schemas/extension'
import type { HolderResponse } from '@/schemas/holder'
import type { SetUpResponse } from '@/schemas/set-up'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'

export interface FittingHoldersProps {
  setUp: SetUpResponse
  holder: HolderResponse
  extension: ExtensionResponse | null
  stickOutMm: number
  onTake: (id: string) => void
}

/** A holder of another taper, and where the assembly is outside, the holders of the crib that would be inside. */
export function FittingHolders(props: FittingHoldersProps) {
  const { setUp, holder, extension, stickOutMm } = props
  const { answer, error, isLoading } = useSetUpAssembly(setUp, {
    holderId: holder.id,
    extensionId: extension?.id ?? null,
    stickOutMm,
  })
  if (error) return <Notice kind="caution">{error.message}</Notice>
  if (isLoading || answer === null) return <p role="status">Looking for holders that fit …</p>
  return (
    <>
      {answer.isTaperRight === null ? (
        <Notice kind="caution">
          The taper of {holder.code} is not entered: nothing checks that it fits.
        </Notice>
      ) : null}
      {answer.verdict === 'fits' ? null : <HolderTable {...props} rows={answer.fittingHolders} />}
    </>
  )
}

function HolderTable({
  rows,
  holder,
  onTake,
}: FittingHoldersProps & {
  rows: { id: string; code: string; description: string; gaugeLengthMm: number; onHand: number }[]
}) {
  const { unit } = useShop()
  const bore =
    holder.bore.kind === 'collet'
      ? holder.bore.series
      : `a ${formatLength(holder.bore.diameterMm, unit)} bore`
  if (rows.length === 0)
    return <p>No holder of the crib with {bore} and this taper fits at this stick-out.</p>
  return (
    <section aria-labelledby="fitting-holders">
      <h2 id="fitting-holders" className="border-ink border-b pb-1 text-lg">
        Holders with {bore} that fit
      </h2>
      <p className="text-ink-soft py-1.5 text-sm">
        At the same stick-out. Whether the tool reaches in them is another question: check the reach.
      </p>
      <table className="w-full text-left text-[0.9375rem]">
        <thead className="border-hairline border-b">
          <tr className="text-ink-soft text-sm [&>th]:py-1 [&>th]:pr-3 [&>th]:font-normal">
            <th scope="col">Holder</th>
            <th scope="col" className="text-right">
              Gauge length
            </th>
            <th scope="col" className="text-right">
              On hand
            </th>
            <th scope="col">
              <span className="sr-only">Try it</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id} className="border-hairline border-b [&>*]:py-1 [&>*]:pr-3">
              <th scope="row" className="font-normal">
                <span className="font-semibold">{row.code}</span>
                <span className="text-ink-soft block text-sm">{row.description}</span>
              </th>
              <td className="text-right whitespace-nowrap">{formatLength(row.gaugeLengthMm, unit)}</td>
              <td className={`text-right ${row.onHand === 0 ? 'text-collision font-semibold' : ''}`}>
                {row.onHand === 0 ? 'out' : row.onHand}
              </td>
              <td className="text-right">
                <Button
                  size="compact"
                  variant="quiet"
                  aria-label={`Try ${row.code}`}
                  onClick={() => onTake(row.id)}
                >
                  Try it
                </Button>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  )
}
