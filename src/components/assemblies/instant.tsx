'use client'

import { formatInstant } from '@/lib/format-instant'
import { useIsMounted } from '../reach/use-is-mounted'

/** A moment in the reader's own time zone, which the server does not know: until the browser has it, its day alone. */
export function Instant({ at }: { at: string }) {
  const isMounted = useIsMounted()
  return <time dateTime={at}>{isMounted ? formatInstant(at) : at.slice(0, 10)}</time>
}
