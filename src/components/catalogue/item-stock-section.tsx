'use client'

import Link from 'next/link'
import { useShop } from '@/components/layout/shop-context'
import { useItemStock } from '@/hooks/use-item'
import { formatMoney } from '@/lib/format-money'
import type { BalanceResponse, ItemStockResponse } from '@/schemas/stock'
import type { CatalogueRow } from './catalogue-row'
import { ItemReorderPoints } from './item-reorder-points'
import { cellClass, headingCellClass, ItemSection } from './item-section'
import { SectionState } from './section-state'
import { StockWord } from './stock-word'
import { conditionNames } from './stock-words'

/** Where its pieces are and in what condition. */
export function ItemStockSection({ row }: { row: CatalogueRow }) {
  const { stock, error, isLoading, retry } = useItemStock(row.id)
  return (
    <ItemSection title="Stock" aside={<StockWord stock={row.stock} className="text-lg" />}>
      {stock ? (
        <StockTable stock={stock} unitCost={row.unitCost ?? null} />
      ) : error ? (
        <SectionState sentence={`The stock could not be loaded. ${error.message}`} onRetry={retry} />
      ) : isLoading ? (
        <SectionState sentence="Loading the stock …" />
      ) : null}
      <ItemReorderPoints item={row} />
    </ItemSection>
  )
}

function StockTable({ stock, unitCost }: { stock: ItemStockResponse; unitCost: number | null }) {
  const { currency, isFirstDay } = useShop()
  return (
    <>
      <dl className="border-hairline flex border-b">
        {(
          [
            ['On hand', stock.onHand],
            ['Reserved', stock.reserved],
            ['Available', stock.available],
            ['Coming', stock.coming],
            ...(unitCost === null ? [] : [['Unit cost', formatMoney(unitCost, currency)] as const]),
          ] as const
        ).map(([name, value]) => (
          <div
            key={name}
            className="border-hairline min-w-0 flex-1 border-l px-2 py-1.5 first:border-l-0 first:pl-0"
          >
            <dt className="text-ink-soft text-sm">{name}</dt>
            <dd className="font-semibold">{value}</dd>
          </div>
        ))}
      </dl>
      {stock.balances.length === 0 ? (
        <p className="py-3">
          No piece of it is in the shop.
          {isFirstDay ? (
            <>
              {' '}
              <Link href="/imports/new?kind=stock" className="text-accent font-semibold underline">
                Opening stock
              </Link>{' '}
              comes in from a file.
            </>
          ) : null}
        </p>
      ) : (
        <table className="w-full">
          <thead>
            <tr className="border-ink border-b">
              <th scope="col" className={headingCellClass}>
                Location
              </th>
              <th scope="col" className={headingCellClass}>
                Condition
              </th>
              <th scope="col" className={`${headingCellClass} text-right`}>
                Pieces
              </th>
            </tr>
          </thead>
          <tbody>
            {stock.balances.map((balance) => (
              <tr key={`${balance.locationId} ${balance.condition}`} className="border-hairline border-b">
                <th scope="row" className={`${cellClass} text-left font-normal`}>
                  <PlaceName balance={balance} />
                </th>
                <td className={cellClass}>{conditionNames[balance.condition]}</td>
                <td className={`${cellClass} text-right font-semibold`}>{balance.quantity}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </>
  )
}

function PlaceName({ balance }: { balance: BalanceResponse }) {
  if (balance.cribCode === null) return <>{balance.locationName}</>
  return (
    <>
      <span className="font-semibold">{balance.locationCode}</span>{' '}
      <span className="text-ink-soft text-sm">{balance.cribCode}</span>
    </>
  )
}
