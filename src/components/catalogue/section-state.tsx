import { Button } from '@/components/ui/button'

/** What a part of a page shows in place of its rows. */
export function SectionState({ sentence, onRetry }: { sentence: string; onRetry?: () => void }) {
  return (
    <div className="flex flex-wrap items-center gap-3 py-3" role="status">
      <p>{sentence}</p>
      {onRetry ? (
        <Button size="compact" onClick={onRetry}>
          Try again
        </Button>
      ) : null}
    </div>
  )
}
