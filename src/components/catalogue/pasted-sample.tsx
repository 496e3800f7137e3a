import { classNames } from '@/components/ui/class-names'
import type { PastedBlock } from './pasted-block'

export interface PastedSampleProps {
  block: PastedBlock
  hasHeadings: boolean
}

/** On a desk; a phone has room for the first three. */
const shownColumns = 7

/** The first rows of a block as they are read, and how much there is of it. */
export function PastedSample({ block, hasHeadings }: PastedSampleProps) {
  const { sample, rows, columns, overlong } = block
  const [first = [], ...rest] = sample
  const body = (hasHeadings ? rest : sample).map((cells, index) => ({ place: index + 1, cells }))
  const places = Array.from({ length: Math.min(columns, shownColumns) }, (_, index) => index)
  const heading = (place: number) => (hasHeadings ? first[place] : '') || `Column ${place + 1}`
  return (
    <div>
      <table className="w-full table-fixed text-[0.9375rem]">
        <caption className="text-ink-soft pb-1 text-left text-sm">As it will be read, the first rows</caption>
        <thead>
          <tr className="border-ink border-b-2">
            {places.map((place) => (
              <th key={place} scope="col" className={cellClass(place, 'font-semibold')}>
                {heading(place)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {body.map(({ place, cells }) => (
            <tr key={place} className="border-hairline border-b">
              {places.map((column) => (
                <td key={column} className={cellClass(column)}>
                  {cells[column] ?? ''}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <p className="text-ink-soft pt-2" role="status">
        {counted(rows, 'row')}, {counted(columns, 'column')}.{' '}
        {overlong > 0
          ? `${counted(overlong, 'row')} ${overlong === 1 ? 'has' : 'have'} more cells than there are headings and will be refused.`
          : ''}
      </p>
    </div>
  )
}

function counted(count: number, one: string): string {
  return `${count.toLocaleString('en')} ${one}${count === 1 ? '' : 's'}`
}

function cellClass(place: number, extra = ''): string {
  return classNames('truncate px-2 py-1 text-left first:pl-0', extra, place > 2 && 'max-sm:hidden')
}
