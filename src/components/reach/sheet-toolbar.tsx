'use client'

import { Printer, Share2 } from 'lucide-react'
import { toast } from '@/components/ui/toast'
import { Button } from '../ui/button'
import { classNames } from '../ui/class-names'
import type { SectionView } from './section-layout'

export interface SheetToolbarProps {
  view: SectionView
  onView: (view: SectionView) => void
  /** There is nothing above the cutter to look at. */
  isCutterAlone: boolean
}

const views = [
  ['tip', 'At the tip'],
  ['whole', 'Whole assembly'],
] as const

/** How much of the assembly is drawn, and what can be done with the sheet. */
export function SheetToolbar(props: SheetToolbarProps) {
  return (
    <div className="border-hairline flex items-center justify-between gap-2 border-b px-3 py-1.5 bg-sheet sm:absolute sm:top-2 sm:right-2 sm:z-20 sm:border-0 sm:p-0 print:hidden">
      <ViewSwitch {...props} />
      <SheetActions />
    </div>
  )
}

/** A small cutter in a long chuck is readable at its tip; the whole shows what stands where. */
function ViewSwitch({ view, onView, isCutterAlone }: SheetToolbarProps) {
  return (
    <fieldset
      disabled={isCutterAlone}
      className="border-ink-soft/60 bg-sheet flex overflow-hidden rounded-[3px] border disabled:opacity-50"
    >
      <legend className="sr-only">What the drawing shows</legend>
      {views.map(([value, label]) => (
        <button
          key={value}
          type="button"
          aria-pressed={view === value}
          onClick={() => onView(value)}
          className={classNames(
            'min-h-9 px-3 text-[0.9375rem] font-semibold pointer-coarse:min-h-11',
            view === value ? 'bg-accent text-on-accent' : 'text-accent hover:bg-accent-wash',
          )}
        >
          {label}
        </button>
      ))}
    </fieldset>
  )
}

function SheetActions() {
  async function handleShare() {
    try {
      await navigator.clipboard.writeText(window.location.href)
      toast.success('The address of this check is copied.')
    } catch {
      toast.error('Copying was refused; the address bar holds this check.')
    }
  }
  return (
    <div className="flex gap-1">
      <Button variant="quiet" size="compact" onClick={handleShare}>
        <Share2 aria-hidden="true" className="size-4.5" />
        <span className="sr-only sm:not-sr-only">Copy link</span>
      </Button>
      <Button variant="quiet" size="compact" onClick={() => window.print()}>
        <Printer aria-hidden="true" className="size-4.5" />
        <span className="sr-only sm:not-sr-only">Print</span>
      </Button>
    </div>
  )
}
