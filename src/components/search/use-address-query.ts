'use client'

import { usePathname, useSearchParams } from 'next/navigation'
import { useCallback, useEffect, useMemo, useState } from 'react'

/**
 * The query of the address, and a way to change it at once: nothing of the page comes from the server. It is kept here
 * too, since the router hears of a change a moment later and a choice must not jump back until then.
 */
export function useAddressQuery(): [URLSearchParams, (next: URLSearchParams) => void] {
  const params = useSearchParams()
  const pathname = usePathname()
  const [held, setHeld] = useState(() => params.toString())
  useEffect(() => {
    // What the router tells late, of an address that is no more, is passed over.
    const told = params.toString()
    if (told === new URLSearchParams(window.location.search).toString()) setHeld(told)
  }, [params])
  const go = useCallback(
    (next: URLSearchParams) => {
      const text = next.toString()
      setHeld(text)
      window.history.replaceState(null, '', text === '' ? pathname : `${pathname}?${text}`)
    },
    [pathname],
  )
  return [useMemo(() => new URLSearchParams(held), [held]), go]
}
