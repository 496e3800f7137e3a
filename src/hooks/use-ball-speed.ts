import { usePathname, useSearchParams } from 'next/navigation'
import { useEffect, useMemo, useState } from 'react'
import {
  type BallSpeedDraft,
  type BallSpeedField,
  type BallSpeedReading,
  ballSpeedAddress,
  draftFromAddress,
  readBallSpeedDraft,
  type TypingSettings,
  withTyped,
  workedOutText,
} from '@/lib/ball-speed-draft'

/** Browsers allow only so many changes of the address in a while; a drag would use them up. */
const addressDelayMs = 250

export interface BallSpeed {
  reading: BallSpeedReading
  /** The latest reading that has an answer: it stays in sight while a field is being typed anew. */
  answered: BallSpeedReading
  /** What a field shows: what was typed, or what was worked out from its partner. */
  textOf: (field: BallSpeedField) => string
  isWorkedOut: (field: BallSpeedField) => boolean
  type: (field: BallSpeedField, text: string) => void
}

/** The ball-end speed being worked out, kept in the address bar so that it can be shared. */
export function useBallSpeed(settings: TypingSettings): BallSpeed {
  const params = useSearchParams()
  const pathname = usePathname()
  const [draft, setDraft] = useState<BallSpeedDraft>(() => draftFromAddress(params, settings))
  const [hasTyped, setHasTyped] = useState(false)
  const { unit, decimalComma } = settings
  const reading = useMemo(
    () => readBallSpeedDraft(draft, { unit, decimalComma }),
    [draft, unit, decimalComma],
  )
  const [answered, setAnswered] = useState(reading)
  if (reading.answer !== null && reading !== answered) setAnswered(reading)
  const address = ballSpeedAddress(reading.values)

  useEffect(() => {
    if (!hasTyped) return
    const timer = setTimeout(
      () => window.history.replaceState(null, '', `${pathname}?${address}`),
      addressDelayMs,
    )
    return () => clearTimeout(timer)
  }, [address, hasTyped, pathname])

  return {
    reading,
    answered,
    textOf: (field) => draft[field] || workedOutText(field, reading, settings),
    isWorkedOut: (field) => draft[field] === '' && workedOutText(field, reading, settings) !== '',
    type: (field, text) => {
      setHasTyped(true)
      setDraft((current) => withTyped(current, field, text))
    },
  }
}
