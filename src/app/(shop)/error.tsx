'use client'

import { Button } from '@/components/ui/button'
import { StateSentence } from '@/components/ui/state-sentence'

export default function ShopError({
  error,
  reset,
}: {
  error: Error & { digest?: string }
  reset: () => void
}) {
  return (
    <StateSentence
      isHeading
      sentence={`This page failed to load${error.digest ? ` (mark ${error.digest} in the log)` : ''}. Nothing was changed.`}
    >
      <Button onClick={reset}>Try again</Button>
    </StateSentence>
  )
}
