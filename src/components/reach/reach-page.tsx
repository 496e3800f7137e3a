'use client'

import { useRef, useState } from 'react'
import type { ToolPart } from '@/core/outline/types'
import { useShop } from '../layout/shop-context'
import type { FieldErrors } from './compile-check'
import { ReachInputsColumn } from './reach-inputs-column'
import { ReachResults } from './reach-results'
import { ReachSheet } from './reach-sheet'
import { TitleBlock } from './title-block'
import { useDraftInAddress } from './use-draft-in-address'
import { useReachCheck, useReading } from './use-reach-check'

export interface ReachPageProps {
  /** The check as the address bar holds it. */
  query: string
  /** The day, ISO 8601. */
  date: string
}

const noErrors: FieldErrors = {}

/** Does it reach: the sheet with verdict and section, everything that can be given, and every figure. */
export function ReachPage({ query, date }: ReachPageProps) {
  const { reachSettings, unit } = useShop()
  const reading = useReading()
  const [draft, change] = useDraftInAddress(query, reading)
  const check = useReachCheck(draft)
  const [highlighted, setHighlighted] = useState<ToolPart | null>(null)
  const sheet = useRef<HTMLDivElement>(null)
  const { rows, loadErrors, compiled, result } = check
  const errors = result.state === 'refused' ? result.errors : noErrors
  return (
    <div className="grid flex-1 grid-cols-[minmax(0,1fr)] content-start gap-4 p-3 lg:grid-cols-[minmax(0,1fr)_26rem] lg:grid-rows-[auto_1fr] lg:p-4 print:block print:p-0">
      <ReachSheet
        draft={draft}
        check={check}
        errors={errors}
        reading={reading}
        date={date}
        highlighted={highlighted}
        sheetRef={sheet}
        onChange={change}
      />
      <aside
        aria-label="What is checked"
        className="border-ink bg-sheet min-w-0 self-start border lg:sticky lg:top-16 lg:col-start-2 lg:row-span-2 lg:row-start-1 lg:max-h-[calc(100dvh-5rem)] lg:overflow-y-auto print:hidden"
      >
        <ReachInputsColumn
          rows={rows}
          reading={reading}
          errors={errors}
          onChange={change}
          draft={draft}
          loadErrors={loadErrors}
          compiled={compiled}
          settings={reachSettings}
        />
      </aside>
      <ReachResults
        draft={draft}
        rows={rows}
        reading={reading}
        result={result}
        unit={unit}
        highlighted={highlighted}
        onHighlight={setHighlighted}
        onShow={() => sheet.current?.scrollIntoView({ block: 'start' })}
      />
      <TitleBlock date={date} className="hidden border-x border-b print:flex" />
    </div>
  )
}
