import { usePathname, useSearchParams } from 'next/navigation'
import { useEffect, useMemo, useState } from 'react'
import {
  type BallSpeedDraft,
  type BallSpeedField,
  type BallSpeedPicks,
  type BallSpeedReading,
  ballSpeedAddress,
  draftFromAddress,
  picksFromAddress,
  readBallSpeedDraft,
  type TypingSettings,
  withCutter,
  withTyped,
  workedOutText,
} from '@/lib/ball-speed-draft'
import type { CutterResponse } from '@/schemas/cutter'
import type { HolderResponse } from '@/schemas/holder'
import { useReachItem } from './use-reach-items'

/** Browsers allow only so many changes of the address in a while; a drag would use them up. */
const addressDelayMs = 250

interface Picked<Row> {
  id: string | null
  /** Null until it was read, or where it could not be. */
  row: Row | null
  error: Error | undefined
}

export interface BallSpeed {
  reading: BallSpeedReading
  /** The latest reading that has an answer: it stays in sight while a field is being typed anew. */
  answered: BallSpeedReading
  /** What a field shows: what was typed, or what was worked out from its partner. */
  textOf: (field: BallSpeedField) => string
  isWorkedOut: (field: BallSpeedField) => boolean
  type: (field: BallSpeedField, text: string) => void
  cutter: Picked<CutterResponse>
  holder: Picked<HolderResponse>
  /** A cutter brings its diameter and corner radius; null takes back that one was picked. */
  pickCutter: (cutter: CutterResponse | null) => void
  pickHolder: (id: string | null) => void
}

/** The ball-end speed being worked out, kept in the address bar so that it can be shared. */
export function useBallSpeed(settings: TypingSettings): BallSpeed {
  const params = useSearchParams()
  const [draft, setDraft] = useState<BallSpeedDraft>(() => draftFromAddress(params, settings))
  const [picks, setPicks] = useState<BallSpeedPicks>(() => picksFromAddress(params))
  const [hasTyped, setHasTyped] = useState(false)
  const { unit, decimalComma } = settings
  const { row: cutter, error: cutterError } = useReachItem('cutter', picks.cutter)
  const { row: holder, error: holderError } = useReachItem('holder', picks.holder)
  const cutterRpm = cutter?.maximumRpm ?? null
  const holderRpm = holder?.maximumRpm ?? null
  const reading = useMemo(
    () => readBallSpeedDraft(draft, { unit, decimalComma }, { cutter: cutterRpm, holder: holderRpm }),
    [draft, unit, decimalComma, cutterRpm, holderRpm],
  )
  const [answered, setAnswered] = useState(reading)
  if (reading.answer !== null && reading !== answered) setAnswered(reading)
  useAddress(hasTyped ? ballSpeedAddress(reading.values, picks) : null)

  function pick(change: Partial<BallSpeedPicks>) {
    setHasTyped(true)
    setPicks((current) => ({ ...current, ...change }))
  }

  return {
    reading,
    answered,
    textOf: (field) => draft[field] || workedOutText(field, reading, settings),
    isWorkedOut: (field) => draft[field] === '' && workedOutText(field, reading, settings) !== '',
    type: (field, text) => {
      setHasTyped(true)
      setDraft((current) => withTyped(current, field, text))
      // Another diameter is another cutter.
      if (field === 'cuttingDiameterMm' || field === 'cornerRadiusMm') pick({ cutter: null })
    },
    cutter: { id: picks.cutter, row: cutter, error: cutterError },
    holder: { id: picks.holder, row: holder, error: holderError },
    pickCutter: (picked) => {
      if (picked) setDraft((current) => withCutter(current, picked, settings))
      pick({ cutter: picked?.id ?? null })
    },
    pickHolder: (id) => pick({ holder: id }),
  }
}

function useAddress(query: string | null): void {
  const pathname = usePathname()
  useEffect(() => {
    if (query === null) return
    const timer = setTimeout(
      () => window.history.replaceState(null, '', `${pathname}?${query}`),
      addressDelayMs,
    )
    return () => clearTimeout(timer)
  }, [query, pathname])
}
