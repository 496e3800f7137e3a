/** The empty sheet, and what it waits for. */
export function NoDrawing({ reason }: { reason: string }) {
  return (
    <p className="border-hairline text-ink-soft grid min-h-40 place-items-center border border-dashed px-6 text-center">
      {reason}
    </p>
  )
}
