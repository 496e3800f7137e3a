import type { ReactNode } from 'react'

export interface StateSentenceProps {
  /** One plain sentence: what is so. */
  sentence: string
  /** The sentence heads a page that has nothing else. */
  isHeading?: boolean
  /** The next step: a link, a button, or what to change. */
  children?: ReactNode
}

/** What a place shows when it has nothing to show: empty, loading, failed or nothing found, and the next step. */
export function StateSentence({ sentence, isHeading, children }: StateSentenceProps) {
  const Sentence = isHeading ? 'h1' : 'p'
  return (
    <div className="flex flex-col items-start gap-3 px-4 py-10 sm:px-8" role="status">
      <Sentence className="max-w-[60ch] text-lg font-normal">{sentence}</Sentence>
      {children ? <div className="flex flex-wrap items-center gap-3">{children}</div> : null}
    </div>
  )
}
