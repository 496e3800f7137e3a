import type { ImportResponse } from '@/schemas/import'
import { ButtonLink } from '../ui/button'
import { Notice } from '../ui/notice'
import { countText, kindWords, outcomeWords, planWords } from './import-words'

/** The verdict first: what it would do, what it did, or why it did nothing. */
export function OutcomeSentence({ found }: { found: ImportResponse }) {
  const words = kindWords[found.kind]
  if (found.state === 'failed') {
    return (
      <Notice kind="collision">
        <p className="text-lg font-semibold">This file could not be imported.</p>
        <p>{found.message} Nothing was changed.</p>
        <ButtonLink href="/imports/new" size="compact" className="mt-2">
          Import another file
        </ButtonLink>
      </Notice>
    )
  }
  if (found.state === 'cancelled') {
    return (
      <Notice kind="plain">
        <p className="text-lg font-semibold">Cancelled. Nothing was changed.</p>
        <ButtonLink href="/imports/new" size="compact" className="mt-2">
          Import another file
        </ButtonLink>
      </Notice>
    )
  }
  if (found.state === 'committed') {
    return (
      <Notice kind="holds">
        <p className="text-lg font-semibold">Committed: {outcomeWords(found)}.</p>
        <p className="mt-2 flex flex-wrap gap-2">
          <ButtonLink href={words.page} size="compact">
            {words.see}
          </ButtonLink>
          {found.kind === 'stock' ? null : (
            <ButtonLink href="/imports/new" size="compact" variant="quiet">
              Import another file
            </ButtonLink>
          )}
        </p>
      </Notice>
    )
  }
  return (
    <div role="status">
      {found.message ? (
        <Notice kind="caution" className="mb-3">
          {found.message}
        </Notice>
      ) : null}
      <p className="text-xl font-semibold">{wouldSentence(found)}</p>
    </div>
  )
}

function wouldSentence(found: ImportResponse): string {
  if (found.rows === 0) return 'The file has headings and no rows.'
  const taken = found.added + found.changed
  if (taken === 0 && found.rejectedCount === 0)
    return `Nothing would change: all ${countText(found.unchanged)} are there as they are.`
  if (taken === 0) return `Nothing can be taken: ${outcomeWords(found)}.`
  return `This file would ${planWords(found)}.`
}
