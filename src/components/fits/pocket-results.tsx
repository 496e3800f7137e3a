'use client'

import Link from 'next/link'
import { StockWord } from '@/components/catalogue/stock-word'
import { decimalText } from '@/core/units/decimal-text'
import { useFittingCutters } from '@/hooks/use-fits'
import { useReachOffers } from '@/hooks/use-reach-items'
import { itemPagePath } from '@/lib/catalogue-paths'
import { cutterFormNames } from '@/lib/cutter-words'
import { formatLength } from '@/lib/format-length'
import type { FittingCutter } from '@/schemas/fits'
import { useCan, useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { StateSentence } from '../ui/state-sentence'
import { reachLink, searchLink } from './reach-link'

const shownAtMost = 200

/** The cutters a pocket's corner and depth leave, the stiffest first, each with its way to the reach check. */
export function PocketResults({ query }: { query: string }) {
  const { rows, total = 0, error, isLoading, retry } = useFittingCutters(`${query}&limit=${shownAtMost}`)
  if (error) {
    return (
      <StateSentence sentence={`The cutters could not be looked through. ${error.message}`}>
        <Button onClick={retry}>Try again</Button>
      </StateSentence>
    )
  }
  if (isLoading) return <StateSentence sentence="Looking through the cutters …" />
  const asked = new URLSearchParams(query)
  return (
    <section aria-label="Cutters that could" className="flex flex-col gap-3">
      <p className="text-lg font-semibold" role="status">
        {total === 0
          ? noneSentence(asked)
          : `${total} ${total === 1 ? 'cutter' : 'cutters'} could, the thickest and shortest first.`}
      </p>
      {total === 0 ? <EmptyCatalogue /> : null}
      {rows.length > 0 ? <CutterTable rows={rows} asked={asked} /> : null}
      {total > rows.length ? <p>The first {rows.length} are shown.</p> : null}
      <p className={total === 0 ? 'hidden' : undefined}>
        <Link
          href={`/cutters?${listQuery(asked)}`}
          className="text-accent inline-flex items-center font-semibold hover:underline pointer-coarse:min-h-11"
        >
          The same cutters in the cutters list
        </Link>
        <span className="text-ink-soft block max-w-[75ch] text-sm">
          It shows what is found here by the same measure, to be sorted, narrowed and edited: no thicker than
          the corner, deep enough before the cutter itself rubs
          {asked.has('floorRadiusMm') ? ', no rounder than the floor' : ''}.
        </span>
      </p>
      <p>
        <Link
          href={searchLink(asked)}
          prefetch={false}
          className="text-accent inline-flex items-center font-semibold hover:underline pointer-coarse:min-h-11"
        >
          Find a tool for this pocket, with what holds it and its stick-out
        </Link>
      </p>
      <Notice kind="caution">
        This looks at the cutter alone, on a straight upright wall: length of cut, or a neck that keeps the
        shop’s clearance. It does not know the holder, the stick-out, draft, clamps or the machine. Tapered
        cutters are not listed, and one with a thinner shank may go deeper than said. Check the reach, then
        check clearance on the machine.
      </Notice>
    </section>
  )
}

function noneSentence(asked: URLSearchParams): string {
  const where = asked.get('inStock') === 'yes' ? 'in stock' : 'in the catalogue'
  return `No cutter ${where} is slim and long enough for this.`
}

/** Where nothing could be found because nothing is there yet. */
function EmptyCatalogue() {
  const { rows, isLoading } = useReachOffers('cutter', '')
  const mayKeep = useCan('keepCrib')
  if (isLoading || rows.length > 0) return null
  if (!mayKeep) return <p>There are no cutters in the catalogue yet. The crib manager adds them.</p>
  return (
    <p>
      There are no cutters in the catalogue yet.{' '}
      <Link href="/imports/new" className="text-accent font-semibold underline">
        Bring them in from a file
      </Link>
      , or{' '}
      <Link href="/first-day" className="text-accent font-semibold underline">
        go through the first day
      </Link>
      .
    </p>
  )
}

function listQuery(asked: URLSearchParams): string {
  const query = new URLSearchParams({
    'cuttingDiameterMm.max': decimalText(2 * Number(asked.get('insideCornerRadiusMm')), 0, 9),
    'usableDepthMm.min': asked.get('depthMm') ?? '',
    sort: '-cuttingDiameterMm',
  })
  const floorRadiusMm = asked.get('floorRadiusMm')
  if (floorRadiusMm !== null) query.set('endRadiusMm.max', floorRadiusMm)
  if (asked.get('inStock') === 'yes') query.set('stockState', 'inStock')
  return query.toString()
}

function CutterTable({ rows, asked }: { rows: FittingCutter[]; asked: URLSearchParams }) {
  const { unit } = useShop()
  const figure = (mm: number) => formatLength(mm, unit, { withUnit: false })
  const cell = 'px-2 py-1.5 first:pl-0'
  return (
    <div className="relative overflow-x-auto">
      <table className="w-full">
        <caption className="text-ink-soft pb-1 text-left text-sm">Lengths in {unit}</caption>
        <thead>
          <tr className="border-ink text-ink-soft border-b text-left text-sm [&>th]:font-normal">
            <th scope="col" className={cell}>
              Code
            </th>
            <th scope="col" className={`${cell} max-md:hidden`}>
              Form
            </th>
            <th scope="col" className={`${cell} text-right`}>
              DC
            </th>
            <th scope="col" className={`${cell} text-right max-sm:hidden`}>
              RE
            </th>
            <th scope="col" className={`${cell} text-right`}>
              Depth
            </th>
            <th scope="col" className={`${cell} text-right max-md:hidden`}>
              Depth to DC
            </th>
            <th scope="col" className={`${cell} text-right`}>
              On hand
            </th>
            <th scope="col" className={cell}>
              <span className="sr-only">Reach check</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id} className="border-hairline border-b align-baseline">
              <th scope="row" className={`${cell} text-left font-normal`}>
                <Link
                  href={itemPagePath('cutter', row.id)}
                  prefetch={false}
                  className="text-accent inline-flex items-center font-semibold hover:underline pointer-coarse:min-h-11"
                >
                  {row.code}
                </Link>
                <span className="text-ink-soft block text-sm">{row.description}</span>
              </th>
              <td className={`${cell} max-md:hidden`}>{cutterFormNames[row.form]}</td>
              <td className={`${cell} text-right`}>{figure(row.cuttingDiameterMm)}</td>
              <td className={`${cell} text-right max-sm:hidden`}>{figure(cornerRadiusMm(row))}</td>
              <td className={`${cell} text-right`}>
                {figure(row.usableDepthMm)}
                <span className="text-ink-soft block text-sm">
                  {row.usableDepthEndsWith === 'neck' ? 'neck' : 'cut'}
                </span>
              </td>
              <td className={`${cell} text-right max-md:hidden`}>
                {decimalText(row.usableDepthMm / row.cuttingDiameterMm, 1, 1)}
              </td>
              <td className={`${cell} text-right whitespace-nowrap`}>
                <StockWord stock={row.stock} className="text-sm" /> {row.stock.onHand}
                <span className="text-ink-soft block text-sm">{row.stock.locations[0]?.code}</span>
              </td>
              <td className={`${cell} text-right`}>
                <Link
                  href={reachLink(row.id, asked)}
                  prefetch={false}
                  aria-label={`Check the reach of ${row.code}`}
                  className="text-accent inline-flex items-center font-semibold whitespace-nowrap hover:underline pointer-coarse:min-h-11"
                >
                  Reach
                </Link>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

function cornerRadiusMm({ form, cuttingDiameterMm, cornerRadiusMm: radiusMm }: FittingCutter): number {
  return form === 'ball' ? cuttingDiameterMm / 2 : (radiusMm ?? 0)
}
