'use client'

import { FitsList } from '@/components/catalogue/item-fits-section'
import type { FitsQuestion } from './fits-question'

/** What holds a shank, or what a chuck or bore holds, a list for each kind. */
export function HoldingResults({ question, query }: { question: FitsQuestion; query: string }) {
  return (
    <section aria-label="What fits" className="flex flex-col gap-4">
      <div className="grid gap-x-8 gap-y-5 md:grid-cols-2 xl:grid-cols-3">
        {question.kinds.map((kind) => (
          <FitsList key={`${kind} ${query}`} url={`/api/fits?${query}`} kind={kind} />
        ))}
      </div>
      <p className="text-ink-soft max-w-[75ch] text-sm">
        A fixed bore takes a shank within 0.03 mm of its size, a collet one within its range; near the small
        end of the range it grips worst. A chuck is listed where some collet in the catalogue takes the shank.
        The series is compared by its name alone.
      </p>
    </section>
  )
}
