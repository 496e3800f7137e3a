import type { ImportResponse } from '@/schemas/import'
import { countText } from './import-words'

/** What was taken with a second look: the first warnings, and how many there are. */
export function WarningsTable({ found }: { found: ImportResponse }) {
  return (
    <>
      {found.warningCount > found.warnings.length ? (
        <p className="text-ink-soft px-4 py-2 text-[0.9375rem] lg:px-6">
          The first {countText(found.warnings.length)} of {countText(found.warningCount)}.
        </p>
      ) : null}
      <table className="w-full text-left text-[0.9375rem]">
        <thead className="border-ink border-b max-md:hidden [&_th]:px-4 [&_th]:py-2 lg:[&_th]:px-6">
          <tr>
            <th scope="col">Line</th>
            <th scope="col">Column</th>
            <th scope="col">Value</th>
            <th scope="col">What to know</th>
          </tr>
        </thead>
        <tbody>
          {found.warnings.map((warning) => (
            <tr
              key={`${warning.line}-${warning.column}`}
              className="border-hairline border-b align-top max-md:grid max-md:grid-cols-[auto_1fr] max-md:gap-x-3 max-md:px-4 max-md:py-2 md:[&>td]:px-4 md:[&>td]:py-1.5 lg:[&>td]:px-6"
            >
              <td className="w-20">
                <span className="md:hidden">Line </span>
                {warning.line}
              </td>
              <td className="font-semibold md:w-52">{warning.column}</td>
              <td className="max-w-60 break-words max-md:col-span-2">{warning.value}</td>
              <td className="max-md:col-span-2">{warning.message}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  )
}
