export interface Refusal {
  /** The row's own code. */
  code: string
  /** `Corner radius: The corner radius is more than half the cutting diameter.` */
  reason: string
}

export interface RefusedRowsProps {
  refusals: readonly Refusal[]
  /** How many there are, where only the first stand here. */
  count?: number
}

const namedCodes = 12

/** The reasons why rows cannot be as asked, each with the rows it is about. */
export function RefusedRows({ refusals, count = refusals.length }: RefusedRowsProps) {
  if (refusals.length === 0) return null
  const byReason = new Map<string, string[]>()
  for (const { code, reason } of refusals) byReason.set(reason, [...(byReason.get(reason) ?? []), code])
  return (
    <>
      <ul aria-label="Why not" className="mt-1">
        {[...byReason].map(([reason, codes]) => (
          <li key={reason} className="py-1">
            {reason}
            <span className="block text-sm wrap-anywhere">
              {codes.slice(0, namedCodes).join(', ')}
              {codes.length > namedCodes
                ? ` and ${(codes.length - namedCodes).toLocaleString('en')} more`
                : ''}
            </span>
          </li>
        ))}
      </ul>
      {count > refusals.length ? (
        <p className="text-sm">
          These are the first {refusals.length.toLocaleString('en')} of {count.toLocaleString('en')}.
        </p>
      ) : null}
    </>
  )
}
