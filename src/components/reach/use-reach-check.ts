'use client'

import { useMemo } from 'react'
import { useReachItem } from '@/hooks/use-reach-items'
import { useShop } from '../layout/shop-context'
import type { CatalogueRows } from './catalogue-values'
import { type CheckResult, type CompiledCheck, checkResult, compileCheck } from './compile-check'
import type { ReachDraft, ToolDraft } from './reach-draft'
import type { ToolSlot } from './reach-fields'
import type { Reading } from './read-field'

export interface ReachCheck {
  rows: CatalogueRows
  loadErrors: Readonly<Record<ToolSlot, Error | undefined>>
  compiled: CompiledCheck
  result: CheckResult
}

/** Person's unit and decimal sign, the same object while they stay the same. */
export function useReading(): Reading {
  const { unit, decimalComma } = useShop()
  return useMemo(() => ({ unit, decimalComma }), [unit, decimalComma])
}

/** The check worked out anew at every change, here in the browser: nothing is asked of the server but what is picked. */
export function useReachCheck(draft: ReachDraft): ReachCheck {
  const { reachSettings } = useShop()
  const reading = useReading()
  const { picks } = draft
  const cutter = useReachItem('cutter', picks.cutter)
  const holder = useReachItem('holder', picks.holder)
  const collet = useReachItem('collet', picks.collet)
  const extension = useReachItem('extension', picks.extension)
  const rows = useMemo(
    () => ({ cutter: cutter.row, holder: holder.row, collet: collet.row, extension: extension.row }),
    [cutter.row, holder.row, collet.row, extension.row],
  )
  const compiled = useMemo(
    () => compileCheck(draft, { rows, reading, settings: reachSettings }),
    [draft, rows, reading, reachSettings],
  )
  const result = useMemo(() => checkResult(compiled), [compiled])
  return {
    rows,
    loadErrors: {
      cutter: cutter.error,
      holder: holder.error,
      collet: collet.error,
      extension: extension.error,
    },
    compiled,
    result,
  }
}

/** What concerns the tools alone, so that their columns are not drawn anew while the feature is dragged. */
export function useToolDraft({ picks, texts, segments }: ReachDraft): ToolDraft {
  const { cutter, holder, collet, extension } = texts
  return useMemo(
    () => ({ picks, segments, texts: { cutter, holder, collet, extension } }),
    [picks, segments, cutter, holder, collet, extension],
  )
}
