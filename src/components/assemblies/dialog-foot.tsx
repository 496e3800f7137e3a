import { Button } from '../ui/button'
import { Notice } from '../ui/notice'

/** A form filled in at the machine: under a finger every field is as high as its buttons. */
export const gloveFormClass =
  'flex flex-col gap-4 pointer-coarse:[&_:is(input,select)]:min-h-16 pointer-coarse:[&_:is(input,select)]:text-lg'

export interface DialogFootProps {
  label: string
  busyLabel: string
  isBusy: boolean
  isDisabled?: boolean
  failure: string | null
  onCancel: () => void
}

/** What was refused, and two buttons wide enough for gloves. */
export function DialogFoot({ label, busyLabel, isBusy, isDisabled, failure, onCancel }: DialogFootProps) {
  return (
    <>
      {failure ? (
        <Notice kind="collision" isAnnounced>
          {failure}
        </Notice>
      ) : null}
      <div className="flex flex-wrap gap-3">
        <Button
          type="submit"
          variant="primary"
          size="counter"
          className="flex-1"
          disabled={isBusy || isDisabled}
        >
          {isBusy ? busyLabel : label}
        </Button>
        <Button variant="quiet" size="counter" onClick={onCancel}>
          Cancel
        </Button>
      </div>
    </>
  )
}
