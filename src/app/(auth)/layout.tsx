import type { ReactNode } from 'react'
import { Wordmark } from '@/components/layout/wordmark'

/** The doors of the product: one narrow column on the sheet. */
export default function DoorLayout({ children }: { children: ReactNode }) {
  return (
    <main className="grid min-h-dvh place-items-center px-4 py-8">
      <div className="bg-sheet border-ink w-full max-w-md border">
        <div className="border-hairline border-b px-6 py-4">
          <Wordmark />
        </div>
        <div className="px-6 py-6">{children}</div>
        <p className="border-hairline text-ink-soft border-t px-6 py-3 text-sm">
          What is in the drawers, and whether it reaches.
        </p>
      </div>
    </main>
  )
}
