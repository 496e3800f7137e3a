'use client'

import { useEffect, useState } from 'react'

const slowMs = 1000

/** Whether something has been under way for longer than a second. */
export function useIsSlow(isUnderWay: boolean): boolean {
  const [isSlow, setIsSlow] = useState(false)
  useEffect(() => {
    if (!isUnderWay) return
    const timer = setTimeout(() => setIsSlow(true), slowMs)
    return () => {
      clearTimeout(timer)
      setIsSlow(false)
    }
  }, [isUnderWay])
  return isSlow
}
