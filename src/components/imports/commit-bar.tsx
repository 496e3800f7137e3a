'use client'

import { Download } from 'lucide-react'
import { useState } from 'react'
import type { ImportResponse, RejectChoice } from '@/schemas/import'
import { Button } from '../ui/button'
import { cancelLabel, countText } from './import-words'

export interface CommitBarProps {
  found: ImportResponse
  isBusy: boolean
  onCommit: (rejects: RejectChoice) => void
  onCancel: () => void
}

/** The decision: with rejects it is asked whether they stop the import or stay out; the rest goes in with one press. */
export function CommitBar({ found, isBusy, onCommit, onCancel }: CommitBarProps) {
  const [isSkipping, setIsSkipping] = useState(false)
  const taken = found.added + found.changed
  const hasRejects = found.rejectedCount > 0
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-3">
      {hasRejects && taken > 0 ? (
        <label className="flex min-h-11 items-center gap-2.5">
          <input
            type="checkbox"
            checked={isSkipping}
            onChange={(event) => setIsSkipping(event.target.checked)}
            className="accent-accent size-5"
          />
          Leave out the {countText(found.rejectedCount)} rejected
        </label>
      ) : null}
      {taken > 0 ? (
        <Button
          variant="primary"
          disabled={isBusy || (hasRejects && !isSkipping)}
          onClick={() => onCommit(isSkipping ? 'skip' : 'stop')}
        >
          {isBusy ? 'Starting …' : `Bring in ${countText(taken)}`}
        </Button>
      ) : null}
      {hasRejects ? <RejectsLink id={found.id} /> : null}
      <Button variant="danger" disabled={isBusy} onClick={onCancel}>
        {cancelLabel}
      </Button>
    </div>
  )
}

export function RejectsLink({ id }: { id: string }) {
  return (
    <a
      href={`/api/imports/${id}/rejects`}
      download
      className="text-accent hover:bg-accent-wash inline-flex min-h-11 items-center gap-2 rounded-[3px] px-2 font-semibold"
    >
      <Download aria-hidden="true" className="size-5" />
      Rejected rows as CSV
    </a>
  )
}
