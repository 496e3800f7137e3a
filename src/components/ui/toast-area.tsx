'use client'

import { type ComponentType, useEffect, useState } from 'react'
import { atFirstHand } from './at-first-hand'
import { onFirstToast } from './toast'

/**
 * Where messages show. Its code comes at the first hand, so that it is there when a connection fails later; should it
 * not have come, the next message asks for it again.
 */
export function ToastArea() {
  const [Toaster, setToaster] = useState<ComponentType | null>(null)
  useEffect(() => {
    const load = () => {
      import('./loaded-toaster').then(
        ({ LoadedToaster }) => setToaster(() => LoadedToaster),
        () => undefined,
      )
    }
    onFirstToast(load)
    atFirstHand(load)
  }, [])
  return Toaster ? <Toaster /> : null
}
