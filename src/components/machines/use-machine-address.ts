'use client'

import { usePathname, useSearchParams } from 'next/navigation'

export type AddressName = 'setUp' | 'cutter' | 'holder' | 'extension' | 'stickOutMm'

/** Which set-up is looked at and which tool is tried, kept in the address so that it can be shared. */
export function useMachineAddress() {
  const params = useSearchParams()
  const pathname = usePathname()

  function change(values: Partial<Record<AddressName, string | null>>) {
    const next = new URLSearchParams(params)
    for (const [name, value] of Object.entries(values)) {
      if (value) next.set(name, value)
      else next.delete(name)
    }
    const query = next.toString()
    window.history.replaceState(null, '', query ? `${pathname}?${query}` : pathname)
  }

  return { valueOf: (name: AddressName) => params.get(name), change }
}
