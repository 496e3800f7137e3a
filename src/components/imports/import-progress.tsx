'use client'

import { useEffect, useState } from 'react'
import type { ImportResponse } from '@/schemas/import'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { cancelLabel, countText } from './import-words'

export interface ImportProgressProps {
  found: ImportResponse
  isCancelling: boolean
  onCancel: () => void
}

/** What the worker is at, how far it is, and the way out. */
export function ImportProgress({ found, isCancelling, onCancel }: ImportProgressProps) {
  const isReading = found.state === 'reading'
  const isWaitingLong = useHasPassed(patienceMs) && isReading && found.rows === null
  const done = isReading && found.rows ? found.rowsRead / found.rows : null
  return (
    <section aria-label="Progress" className="max-w-3xl px-4 py-6 lg:px-6">
      <p className="text-xl font-semibold" role="status">
        {isReading ? readingSentence(found) : 'Putting it into the catalogue …'}
      </p>
      <ProgressBar label={isReading ? 'Rows checked' : 'Committing'} done={done} />
      <p className="text-ink-soft mt-2 text-[0.9375rem]">
        {isReading
          ? 'You may leave this page; the check goes on and waits for you.'
          : 'All of it goes in at once, or nothing. Cancelling now leaves the catalogue as it was.'}
      </p>
      {isWaitingLong ? (
        <Notice kind="caution" className="mt-3">
          No worker has taken this file up yet. If this stays so, the worker does not run: whoever looks after
          Leadline can start it, and the file waits till then.
        </Notice>
      ) : null}
      <Button variant="danger" className="mt-4" disabled={isCancelling} onClick={onCancel}>
        {isCancelling ? 'Cancelling …' : cancelLabel}
      </Button>
    </section>
  )
}

/** A worker that runs takes a file up within a second or two. */
const patienceMs = 15_000

function useHasPassed(ms: number): boolean {
  const [hasPassed, setHasPassed] = useState(false)
  useEffect(() => {
    const timer = setTimeout(() => setHasPassed(true), ms)
    return () => clearTimeout(timer)
  }, [ms])
  return hasPassed
}

function readingSentence({ rows, rowsRead }: ImportResponse): string {
  if (rows === null) return 'Looking at the file …'
  return `Checked ${countText(rowsRead)} of ${countText(rows)} rows`
}

/** Without a measure of how far it is a short piece of the bar breathes: it says nothing of how far. */
function ProgressBar({ label, done }: { label: string; done: number | null }) {
  const percent = done === null ? null : Math.round(done * 100)
  return (
    <div
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      {...(percent === null ? {} : { 'aria-valuenow': percent })}
      className="bg-well border-hairline mt-3 h-3 w-full overflow-hidden rounded-[3px] border"
    >
      <div
        className={
          percent === null ? 'bg-accent h-full w-1/5 animate-pulse' : 'bg-accent h-full transition-[width]'
        }
        style={percent === null ? undefined : { width: `${percent}%` }}
      />
    </div>
  )
}
