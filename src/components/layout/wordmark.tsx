/** The name under a leader line: an arrow at the datum, a shoulder, the word on it. */
export function Wordmark() {
  return (
    <span className="text-ink inline-flex items-end gap-1 text-xl leading-none font-bold tracking-tight">
      <svg viewBox="0 0 26 22" className="h-[22px] w-[26px]" aria-hidden="true">
        <path d="M2 20 L15 4 H26" fill="none" stroke="currentColor" strokeWidth="1.4" />
        <path d="M2 20 L4.1 13.9 L7.9 17 Z" fill="var(--accent)" />
      </svg>
      <span>Leadline</span>
    </span>
  )
}
