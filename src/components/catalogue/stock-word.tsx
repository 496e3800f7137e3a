import { classNames } from '@/components/ui/class-names'
import type { StockSummary } from '@/schemas/item'

/** Out and Low in words; the colour only says it again. Nothing where there is enough. */
export function StockWord({
  stock,
  className,
}: {
  stock: Pick<StockSummary, 'onHand' | 'isLow'>
  className?: string
}) {
  if (stock.onHand === 0)
    return <span className={classNames('text-collision font-semibold', className)}>Out</span>
  if (stock.isLow) return <span className={classNames('text-caution font-semibold', className)}>Low</span>
  return null
}
