import { Button } from '../ui/button'

export interface StartSheetProps {
  /** What is still needed; empty before anything was given. */
  missing: readonly string[]
  isFresh: boolean
  onExample: () => void
}

/** The sheet before there is a section to draw: what to give, and an example to try. */
export function StartSheet({ missing, isFresh, onExample }: StartSheetProps) {
  return (
    <div className="flex min-h-72 flex-col items-start justify-center gap-4 px-6 py-10 sm:min-h-[26rem] sm:px-12">
      <p className="max-w-[46ch] text-lg">
        {isFresh
          ? 'Give the depth of a wall or hole, the cutter and what holds it. The section is drawn here, to scale, with the stick-out it needs and what touches first.'
          : missing.length > 0
            ? `The section is drawn once there is a feature and a cutter. Still needed: ${listWords(missing)}.`
            : 'The section is drawn again once the marked field is mended.'}
      </p>
      {isFresh ? (
        <Button variant="primary" onClick={onExample}>
          Try a worked example
        </Button>
      ) : null}
    </div>
  )
}

/** `a, b and c` */
export function listWords(words: readonly string[]): string {
  if (words.length < 2) return words.join('')
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`
}
