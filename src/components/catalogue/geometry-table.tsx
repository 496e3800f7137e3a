'use client'

import { useShop } from '@/components/layout/shop-context'
import { SymbolName } from '@/components/ui/symbol-name'
import type { HolderSegmentPart, OutlineSegment } from '@/core/tooling'
import { formatLength } from '@/lib/format-length'
import type { CatalogueDefinition } from './catalogue-definition'
import type { CatalogueRow } from './catalogue-row'
import { itemFacts } from './item-facts'
import { cellClass, headingCellClass, ItemSection } from './item-section'

/** Every dimension the catalogue keeps, by name and ISO 13399 symbol. */
export function GeometryTable<Row extends CatalogueRow>({
  definition,
  row,
}: {
  definition: CatalogueDefinition<Row>
  row: Row
}) {
  const shop = useShop()
  const facts = itemFacts(definition.form, row, shop)
  return (
    <ItemSection title="Geometry">
      <table className="w-full">
        <thead className="sr-only">
          <tr>
            <th scope="col">Symbol</th>
            <th scope="col">Dimension</th>
            <th scope="col">Value</th>
          </tr>
        </thead>
        <tbody>
          {facts.map((fact) => (
            <tr key={fact.path} className="border-hairline border-b">
              <td className={`${cellClass} text-ink-soft w-14 text-sm`}>
                {fact.symbol ? <SymbolName text={fact.symbol} /> : null}
              </td>
              <th scope="row" className={`${cellClass} text-left font-normal`}>
                {fact.label}
              </th>
              <td className={`${cellClass} text-right font-semibold`}>{fact.text}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {'segments' in row ? <SegmentTable segments={row.segments} /> : null}
    </ItemSection>
  )
}

type Segment = OutlineSegment & { part?: HolderSegmentPart }

function SegmentTable({ segments }: { segments: readonly Segment[] }) {
  const { unit } = useShop()
  const figure = (mm: number) => formatLength(mm, unit, { withUnit: false })
  const rows = segments.map((segment, index) => ({ ...segment, place: index + 1 }))
  return (
    <table className="mt-4 w-full">
      <caption className="text-ink-soft text-left text-sm">Outline from the nose face, {unit}</caption>
      <thead>
        <tr className="border-ink border-b">
          <th scope="col" className={headingCellClass}>
            Part
          </th>
          {['Length', '⌀ nose end', '⌀ spindle end'].map((heading) => (
            <th key={heading} scope="col" className={`${headingCellClass} text-right`}>
              {heading}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((segment) => (
          <tr key={segment.place} className="border-hairline border-b">
            <th scope="row" className={`${cellClass} text-left font-normal`}>
              {segment.place}. {segment.part === 'nut' ? 'Nut' : 'Body'}
            </th>
            <td className={`${cellClass} text-right`}>{figure(segment.lengthMm)}</td>
            <td className={`${cellClass} text-right`}>{figure(segment.noseDiameterMm)}</td>
            <td className={`${cellClass} text-right`}>{figure(segment.spindleDiameterMm)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
