import { z } from 'zod'

/** Only what is read below, so that tracing itself costs the page little. */
export const traceCategories = ['-*', 'devtools.timeline', 'disabled-by-default-devtools.timeline']

/** What one pointer move brought about on the page's main thread. */
export interface StepTime {
  /** Processor time of the thread. */
  processorMs: number
  /** The same tasks by the clock, waiting for a processor included. */
  clockMs: number
}

/** Chromium's trace events, times in microseconds; `tdur` is left out where it is nothing. */
const traceSchema = z.object({
  traceEvents: z.array(
    z.object({
      name: z.string(),
      pid: z.number(),
      tid: z.number(),
      ts: z.number(),
      dur: z.number().default(0),
      tdur: z.number().default(0),
      args: z.object({ data: z.object({ type: z.string().optional() }).optional() }),
    }),
  ),
})
type TraceEvent = z.output<typeof traceSchema>['traceEvents'][number]

/**
 * The steps of a drag: each is all tasks of the main thread from the one that hands over a pointer move to the one that
 * hands over the next. The last move is left out, since nothing tells where its step ends.
 */
export function stepTimes(traceText: string): StepTime[] {
  const { traceEvents } = traceSchema.parse(JSON.parse(traceText))
  const moves = traceEvents.filter(
    ({ name, args }) => name === 'EventDispatch' && args.data?.type === 'pointermove',
  )
  const [first] = moves
  if (!first) return []
  const ofPage = ({ pid, tid }: TraceEvent) => pid === first.pid && tid === first.tid
  const tasks = traceEvents
    .filter((event) => event.name === 'RunTask' && ofPage(event))
    .sort((one, other) => one.ts - other.ts)
  const starts = moves
    .filter(ofPage)
    .map((move) => tasks.findIndex(({ ts, dur }) => ts <= move.ts && move.ts <= ts + dur))
    .filter((at) => at >= 0)
    .sort((one, other) => one - other)
  return starts.slice(0, -1).map((start, at) => {
    const step = tasks.slice(start, starts[at + 1])
    return {
      processorMs: step.reduce((sum, { tdur }) => sum + tdur, 0) / 1000,
      clockMs: step.reduce((sum, { dur }) => sum + dur, 0) / 1000,
    }
  })
}
