'use client'

import { useState } from 'react'

/** What a form does with the server: one try at a time, and what stood against the last one. */
export function useAttempt() {
  const [fault, setFault] = useState<unknown>(null)
  const [isBusy, setIsBusy] = useState(false)

  async function attempt(act: () => Promise<void>): Promise<void> {
    setIsBusy(true)
    setFault(null)
    try {
      await act()
    } catch (error) {
      setFault(error)
    } finally {
      setIsBusy(false)
    }
  }

  return { fault, isBusy, attempt }
}
