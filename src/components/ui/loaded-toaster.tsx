'use client'

import { useEffect } from 'react'
import { Toaster, toast } from 'sonner'
import { connectToasts } from './toast'

/** Where messages show. What was said meanwhile is passed on once it listens: an inner effect runs before an outer. */
export function LoadedToaster() {
  useEffect(() => connectToasts(toast), [])
  return <Toaster position="bottom-right" closeButton />
}
