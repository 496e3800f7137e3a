'use client'

import { Search } from 'lucide-react'
import Link from 'next/link'
import { type Dispatch, type RefObject, useMemo, useState } from 'react'
import type { ToolPart } from '@/core/outline/types'
import { useShop } from '../layout/shop-context'
import type { FieldErrors } from './compile-check'
import { searchPath } from './feature-only'
import { KeepCheck } from './keep-check'
import { type DraftChange, isDraftEmpty, type ReachDraft } from './reach-draft'
import { fieldText, type Reading } from './read-field'
import { SectionDrawing } from './section-drawing'
import type { SectionChanges } from './section-handles'
import type { SectionView } from './section-layout'
import { sceneOfCheck } from './section-scene'
import { SheetToolbar } from './sheet-toolbar'
import { StartSheet } from './start-sheet'
import { StickOutStepper } from './stick-out-stepper'
import { TitleBlock } from './title-block'
import type { ReachCheck } from './use-reach-check'
import { VerdictLine } from './verdict-line'
import { verdictOf } from './verdict-of'
import { workedExample } from './worked-example'

export interface ReachSheetProps {
  draft: ReachDraft
  check: ReachCheck
  errors: FieldErrors
  reading: Reading
  date: string
  highlighted: ToolPart | null
  sheetRef: RefObject<HTMLDivElement | null>
  onChange: Dispatch<DraftChange>
}

/** The sheet: the verdict first, the section under it, the title block and the stick-out. */
export function ReachSheet(props: ReachSheetProps) {
  const { draft, check, errors, reading, date, highlighted, sheetRef, onChange } = props
  const { compiled, result, rows } = check
  const { reachSettings } = useShop()
  const [view, setView] = useState<SectionView>('tip')
  const changes = useSectionChanges(onChange, reading)
  const isFresh = isDraftEmpty(draft)
  const answer = result.state === 'answered' ? result.answer : null
  const verdict = verdictOf(result, compiled.missing, isFresh, reading.unit)
  const scene = sceneOfCheck(compiled, answer, reachSettings)
  return (
    <div ref={sheetRef} className="border-ink bg-sheet min-w-0 scroll-mt-16 self-start border">
      <h1 className="sr-only">Reach check</h1>
      <VerdictLine {...verdict} />
      {compiled.feature && answer?.verdict !== 'reaches' ? (
        <p className="border-hairline border-b px-3 py-1 print:hidden">
          <Link
            href={searchPath(draft, reading)}
            prefetch={false}
            className="text-accent inline-flex min-h-9 items-center gap-2 font-semibold hover:underline pointer-coarse:min-h-11"
          >
            <Search aria-hidden="true" className="size-4.5" />
            Find what in the crib reaches this
          </Link>
        </p>
      ) : null}
      {answer?.verdict === 'reaches' ? (
        <KeepCheck draft={draft} compiled={compiled} stickOutMm={answer.stickOut.usedMm} />
      ) : null}
      <div className="relative">
        <SheetToolbar view={view} onView={setView} isCutterAlone={scene?.heights.noseMm == null} />
        {scene ? (
          <SectionDrawing
            {...changes}
            scene={scene}
            answer={answer}
            verdict={verdict.sentence}
            unit={reading.unit}
            stickOutStepMm={reachSettings.stickOutStepMm}
            view={view}
            highlighted={highlighted}
          />
        ) : (
          <StartSheet
            missing={compiled.missing}
            isFresh={isFresh}
            onExample={() => onChange({ type: 'replace', draft: workedExample(reading) })}
          />
        )}
      </div>
      <TitleBlock date={date} className="hidden sm:flex sm:flex-wrap print:hidden" />
      <StickOutStepper
        rows={rows}
        reading={reading}
        errors={errors}
        onChange={onChange}
        texts={draft.texts.check}
        stickOut={answer?.stickOut ?? null}
        overallMm={compiled.cutter?.overallLengthMm ?? null}
        stepMm={reachSettings.stickOutStepMm}
        onStickOut={changes.onStickOut}
      />
    </div>
  )
}

/** What is dragged is written into its field, as if it had been typed there. */
function useSectionChanges(onChange: Dispatch<DraftChange>, reading: Reading): SectionChanges {
  return useMemo(() => {
    const write = (group: 'feature' | 'check', name: string, kind: 'length' | 'angle') => (value: number) =>
      onChange({ type: 'text', group, name, text: fieldText(kind, value, reading) })
    return {
      onStickOut: write('check', 'stickOutMm', 'length'),
      onDepth: write('feature', 'depthMm', 'length'),
      onDraft: write('feature', 'draftDeg', 'angle'),
      onTilt: write('feature', 'tiltDeg', 'angle'),
    }
  }, [onChange, reading])
}
