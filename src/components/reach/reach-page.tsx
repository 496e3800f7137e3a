'use client'

import { Printer, Share2 } from 'lucide-react'
import { useCallback, useState } from 'react'
import { toast } from 'sonner'
import type { ToolPart } from '@/core/outline/types'
import { verdictSentence } from '@/lib/reach-sentences'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { classNames } from '../ui/class-names'
import type { CheckResult, CompiledCheck, FieldErrors } from './compile-check'
import { FirstTouchTable } from './first-touch-table'
import { PrintedInputs } from './printed-inputs'
import { ReachCautions } from './reach-cautions'
import { isDraftEmpty } from './reach-draft'
import { ReachFigures } from './reach-figures'
import { ReachInputsColumn } from './reach-inputs-column'
import { ReachMessages } from './reach-messages'
import { fieldText, readField } from './read-field'
import { SectionDrawing } from './section-drawing'
import type { SectionView } from './section-layout'
import { sectionScene } from './section-scene'
import { listWords, StartSheet } from './start-sheet'
import { StickOutStepper } from './stick-out-stepper'
import { TitleBlock } from './title-block'
import { useDraftInAddress } from './use-draft-in-address'
import { useReachCheck, useReading } from './use-reach-check'
import { VerdictLine, type VerdictTone } from './verdict-line'
import { workedExample } from './worked-example'

export interface ReachPageProps {
  /** The check as the address bar holds it. */
  query: string
  /** The day, ISO 8601. */
  date: string
}

const noErrors: FieldErrors = {}

/** Does it reach: the verdict, the section, the figures, and everything that can be given. */
export function ReachPage({ query, date }: ReachPageProps) {
  const { reachSettings, unit } = useShop()
  const reading = useReading()
  const [draft, change] = useDraftInAddress(query, reading)
  const { rows, loadErrors, compiled, result } = useReachCheck(draft)
  const [view, setView] = useState<SectionView>('tip')
  const [highlighted, setHighlighted] = useState<ToolPart | null>(null)
  const errors = result.state === 'refused' ? result.errors : noErrors
  const answered = result.state === 'answered' ? result : null
  const isFresh = isDraftEmpty(draft)
  const verdict = verdictOf(result, compiled, isFresh, unit)

  const setFigure = useCallback(
    (group: 'feature' | 'check', name: string, kind: 'length' | 'angle') => (value: number) =>
      change({ type: 'text', group, name, text: fieldText(kind, value, reading) }),
    [change, reading],
  )
  const setStickOut = setFigure('check', 'stickOutMm', 'length')

  const typedStickOut = readField('length', draft.texts.check.stickOutMm ?? '', reading)
  const scene = sectionScene({
    feature: compiled.feature,
    cutter: compiled.cutter,
    holder: compiled.holder,
    extension: compiled.extension,
    stickOutMm:
      answered?.answer.stickOut.usedMm ??
      (typedStickOut.ok && typeof typedStickOut.value === 'number' ? typedStickOut.value : null),
    clearances: {
      shankMm: answered?.request.clearances?.shankMm ?? reachSettings.shankClearanceMm,
      holderMm: answered?.request.clearances?.holderMm ?? reachSettings.holderClearanceMm,
    },
  })
  const inputs = { rows, reading, errors, onChange: change }

  return (
    <div className="grid flex-1 grid-cols-[minmax(0,1fr)] content-start gap-4 p-3 lg:grid-cols-[minmax(0,1fr)_26rem] lg:grid-rows-[auto_1fr] lg:p-4 print:block print:p-0">
      <div className="border-ink bg-sheet min-w-0 self-start border">
        <h1 className="sr-only">Reach check</h1>
        <VerdictLine {...verdict} />
        <div className="relative">
          <div className="border-hairline flex items-center justify-between gap-2 border-b px-3 py-1.5 sm:absolute sm:top-2 sm:right-2 sm:z-20 sm:border-0 sm:p-0 print:hidden">
            <ViewSwitch view={view} onView={setView} isDisabled={scene?.heights.noseMm == null} />
            <SheetActions />
          </div>
          {scene ? (
            <SectionDrawing
              scene={scene}
              answer={answered?.answer ?? null}
              verdict={verdict.sentence}
              unit={unit}
              stickOutStepMm={reachSettings.stickOutStepMm}
              view={view}
              highlighted={highlighted}
              onStickOut={setStickOut}
              onDepth={setFigure('feature', 'depthMm', 'length')}
              onDraft={setFigure('feature', 'draftDeg', 'angle')}
              onTilt={setFigure('feature', 'tiltDeg', 'angle')}
            />
          ) : (
            <StartSheet
              missing={compiled.missing}
              isFresh={isFresh}
              onExample={() => change({ type: 'replace', draft: workedExample(reading) })}
            />
          )}
        </div>
        <TitleBlock date={date} className="hidden sm:flex sm:flex-wrap print:hidden" />
        <StickOutStepper
          {...inputs}
          texts={draft.texts.check}
          stickOut={answered?.answer.stickOut ?? null}
          overallMm={compiled.cutter?.overallLengthMm ?? null}
          stepMm={reachSettings.stickOutStepMm}
          onStickOut={setStickOut}
        />
      </div>
      <aside
        aria-label="What is checked"
        className="border-ink bg-sheet min-w-0 self-start border lg:sticky lg:top-16 lg:col-start-2 lg:row-span-2 lg:row-start-1 lg:max-h-[calc(100dvh-5rem)] lg:overflow-y-auto print:hidden"
      >
        <ReachInputsColumn
          {...inputs}
          draft={draft}
          loadErrors={loadErrors}
          compiled={compiled}
          settings={reachSettings}
        />
      </aside>
      <div className="border-ink bg-sheet flex min-w-0 flex-col gap-5 self-start border p-4 print:**:min-h-0 print:**:py-px print:**:text-[8pt] print:**:leading-tight print:gap-1.5 print:border-t-0 print:p-2">
        {answered ? (
          <div className="grid gap-x-8 gap-y-5 xl:grid-cols-[minmax(0,1.4fr)_minmax(0,1fr)] print:gap-y-0 print:grid-cols-[1.4fr_1fr] print:gap-x-4">
            <ReachFigures answer={answered.answer} request={answered.request} unit={unit} />
            <FirstTouchTable
              answer={answered.answer}
              unit={unit}
              highlighted={highlighted}
              onHighlight={setHighlighted}
            />
          </div>
        ) : null}
        {answered ? <ReachMessages messages={answered.answer.messages} unit={unit} /> : null}
        <PrintedInputs draft={draft} rows={rows} reading={reading} />
        <ReachCautions />
      </div>
      <TitleBlock date={date} className="border-x border-b hidden print:flex" />
    </div>
  )
}

/** The sentence at the head: the verdict while there is one, else what is wrong or still needed. */
function verdictOf(
  result: CheckResult,
  compiled: CompiledCheck,
  isFresh: boolean,
  unit: 'mm' | 'in',
): { tone: VerdictTone; sentence: string } {
  if (result.state === 'answered') {
    const { answer, request } = result
    const tone = answer.verdict === 'reaches' ? 'holds' : 'collision'
    return { tone, sentence: verdictSentence(answer, request.feature, unit) }
  }
  if (result.state === 'refused') {
    const places = Object.keys(result.errors).length
    const marked = places === 1 ? 'One field needs another look.' : `${places} fields need another look.`
    return { tone: 'caution', sentence: `No verdict yet. ${result.reason ?? marked}` }
  }
  if (isFresh) return { tone: 'plain', sentence: 'Does it reach?' }
  return { tone: 'plain', sentence: `No verdict yet. Still needed: ${listWords(compiled.missing)}.` }
}

interface ViewSwitchProps {
  view: SectionView
  onView: (view: SectionView) => void
  isDisabled: boolean
}

const views = [
  ['tip', 'At the tip'],
  ['whole', 'Whole assembly'],
] as const

/** A small cutter in a long chuck is readable at its tip; the whole shows what stands where. */
function ViewSwitch({ view, onView, isDisabled }: ViewSwitchProps) {
  return (
    <fieldset
      disabled={isDisabled}
      className="border-ink-soft/60 flex overflow-hidden rounded-[3px] border disabled:opacity-50"
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
