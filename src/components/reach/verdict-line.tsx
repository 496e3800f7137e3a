'use client'

import { CircleCheck, CircleX, Info, TriangleAlert } from 'lucide-react'
import { useDebounced } from './use-debounced'

export type VerdictTone = 'holds' | 'collision' | 'caution' | 'plain'

export interface VerdictLineProps {
  tone: VerdictTone
  sentence: string
}

const tones = {
  holds: { look: 'border-holds bg-holds-wash', mark: 'text-holds', Mark: CircleCheck },
  collision: { look: 'border-collision bg-collision-wash', mark: 'text-collision', Mark: CircleX },
  caution: { look: 'border-caution bg-caution-wash', mark: 'text-caution', Mark: TriangleAlert },
  plain: { look: 'border-ink-soft bg-well', mark: 'text-ink-soft', Mark: Info },
} as const

/** A drag changes the sentence many times a second; what is said aloud waits for it to rest. */
const restMs = 700

/** The answer, first and in one sentence. */
export function VerdictLine({ tone, sentence }: VerdictLineProps) {
  const { look, mark, Mark } = tones[tone]
  const rested = useDebounced(sentence, restMs)
  return (
    <div
      className={`flex min-h-16 items-center gap-3 border-l-[6px] px-4 py-2.5 print:min-h-0 print:py-1 ${look}`}
    >
      <Mark aria-hidden="true" className={`size-7 shrink-0 print:size-5 ${mark}`} />
      <p className="text-lg leading-snug font-semibold sm:text-xl print:text-[11pt]" data-testid="verdict">
        {sentence}
      </p>
      <p role="status" className="sr-only">
        {rested}
      </p>
    </div>
  )
}
