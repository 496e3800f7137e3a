import type { RowProblem } from '@/schemas/import'
import { groupedFaults } from './grouped-faults'
import { countText } from './import-words'

export interface FaultGroupsProps {
  rows: readonly { problems: readonly RowProblem[] }[]
  /** Whether these are all the rejected rows. */
  isWhole: boolean
}

/** What several rejected rows have in common, over the list of them: one change may mend them all. */
export function FaultGroups({ rows, isWhole }: FaultGroupsProps) {
  const groups = groupedFaults(rows)
  if (groups.length === 0) return null
  return (
    <div className="border-hairline border-b px-4 py-3 lg:px-6">
      <p className="font-semibold">
        {isWhole
          ? 'What several rows share'
          : `What several of the first ${countText(rows.length)} rows share`}
      </p>
      <ul className="mt-1 text-[0.9375rem]">
        {groups.map(({ column, message, rows: count }) => (
          <li key={`${column}-${message}`}>
            <span className="font-semibold tabular-nums">{countText(count)} rows</span>, {column}: {message}
          </li>
        ))}
      </ul>
    </div>
  )
}
