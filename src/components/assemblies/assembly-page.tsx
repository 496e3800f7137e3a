'use client'

import { useState } from 'react'
import { useAssembly } from '@/hooks/use-assemblies'
import type { AssemblyResponse } from '@/schemas/assembly'
import { ReachCautions } from '../reach/reach-cautions'
import { Notice } from '../ui/notice'
import { ArchiveAssemblyDialog } from './archive-assembly-dialog'
import { AssemblyChecks } from './assembly-checks'
import { AssemblyDrawing } from './assembly-drawing'
import { AssemblyFigures } from './assembly-figures'
import { AssemblyFindings } from './assembly-findings'
import { AssemblyHeading, type AssemblyPageAct } from './assembly-heading'
import { AssemblyMeasurements } from './assembly-measurements'
import { AssemblyParts } from './assembly-parts'
import { BreakDownDialog } from './break-down-dialog'
import { BuildDialog } from './build-dialog'
import { EditDialog } from './edit-dialog'
import { MeasureDialog } from './measure-dialog'
import { PocketDialog } from './pocket-dialog'
import type { ScanCodeProps } from './scan-code'
import { SetupSheet } from './setup-sheet'

export interface AssemblyPageProps {
  /** As the server had it when it made the page. */
  first: AssemblyResponse
  code: ScanCodeProps
  date: string
}

const dialogs = {
  build: BuildDialog,
  measure: MeasureDialog,
  pocket: PocketDialog,
  breakDown: BreakDownDialog,
  edit: EditDialog,
  archive: ArchiveAssemblyDialog,
} as const

/** One assembly: what no longer holds, the drawing, what to set and to expect, its parts, what was measured. */
export function AssemblyPage({ first, code, date }: AssemblyPageProps) {
  const { assembly, put } = useAssembly(first)
  const [act, setAct] = useState<AssemblyPageAct | null>(null)
  const [check] = assembly.checks
  const ActDialog = act ? dialogs[act] : null
  return (
    <>
      <div className="flex w-full max-w-[100rem] flex-col gap-5 px-4 pt-4 pb-10 lg:px-6 print:hidden">
        <AssemblyHeading assembly={assembly} onAct={setAct} />
        {assembly.archivedAt ? (
          <Notice kind="plain">This assembly is archived: no list shows it unless asked to.</Notice>
        ) : null}
        <AssemblyFindings assembly={assembly} onChanged={put} />
        <div className="grid items-start gap-x-8 gap-y-5 lg:grid-cols-[minmax(0,1.2fr)_minmax(0,1fr)]">
          {check ? (
            <AssemblyDrawing
              name="assembly"
              tools={assembly.tools}
              feature={check.feature}
              clearances={check.clearances}
              stickOutMm={assembly.stickOutMm}
              reachMm={check.answer?.reachMm ?? null}
              className="border-ink bg-sheet border max-lg:order-2"
            />
          ) : null}
          <div className="flex min-w-0 flex-col gap-5">
            <AssemblyFigures assembly={assembly} />
            <AssemblyParts parts={assembly.parts} />
          </div>
        </div>
        <div className="grid items-start gap-x-8 gap-y-5 lg:grid-cols-2">
          <AssemblyChecks checks={assembly.checks} />
          <AssemblyMeasurements assembly={assembly} />
        </div>
        {assembly.note ? <p className="max-w-[75ch] whitespace-pre-line">{assembly.note}</p> : null}
        <ReachCautions />
        {ActDialog ? <ActDialog assembly={assembly} onClose={() => setAct(null)} onChanged={put} /> : null}
      </div>
      <SetupSheet assembly={assembly} code={code} date={date} />
    </>
  )
}
