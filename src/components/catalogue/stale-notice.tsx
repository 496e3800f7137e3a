'use client'

import { Button } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import { formatInstant } from '@/lib/format-instant'
import type { StaleField } from './stale-comparison'

export interface StaleNoticeProps {
  fields: readonly StaleField[]
  changedBy: string | null
  changedAt: string
  onTakeTheirs: () => void
  onKeepMine: () => void
}

/** Someone saved this item in between: what they changed, side by side with what stands here, and the two ways on. */
export function StaleNotice({ fields, changedBy, changedAt, onTakeTheirs, onKeepMine }: StaleNoticeProps) {
  return (
    <Notice kind="caution" isAnnounced className="mb-4">
      <p className="font-semibold">
        {changedBy ?? 'Someone else'} saved this item at {formatInstant(changedAt)}, after you opened it.
        Nothing of yours was saved.
      </p>
      {fields.length === 0 ? (
        <p>What they changed is not among the fields here.</p>
      ) : (
        <table className="mt-2 w-full text-left text-[0.9375rem]">
          <thead>
            <tr className="border-ink border-b">
              {['', 'Before', 'Theirs', 'Yours'].map((heading) => (
                <th key={heading} scope="col" className="py-1 pr-3 font-semibold">
                  {heading || <span className="sr-only">Field</span>}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {fields.map((field) => (
              <tr key={field.path} className="border-hairline border-b align-top">
                <th scope="row" className="py-1 pr-3 font-normal">
                  {field.label}
                </th>
                <td className="text-ink-soft py-1 pr-3">{field.before || '–'}</td>
                <td className="py-1 pr-3 font-semibold">{field.theirs || '–'}</td>
                <td className="py-1">{field.mine === field.before ? 'not changed' : field.mine || '–'}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <div className="mt-3 flex flex-wrap gap-2">
        <Button size="compact" onClick={onTakeTheirs}>
          Take theirs
        </Button>
        <Button size="compact" variant="primary" onClick={onKeepMine}>
          Keep mine and save again
        </Button>
      </div>
      <p className="text-ink-soft mt-1 text-sm">
        Keeping yours leaves what they changed elsewhere as they set it.
      </p>
    </Notice>
  )
}
