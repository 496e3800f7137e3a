'use client'

import { useSyncExternalStore } from 'react'

const never = () => () => {}

/** False on the server and while its markup is being taken over, true from then on. */
export function useIsMounted(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  )
}
