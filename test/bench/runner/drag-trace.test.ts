import { expect, it } from 'vitest'
import { stepTimes } from './drag-trace'

const page = { pid: 7, tid: 7 }
const task = (ts: number, dur: number, tdur?: number, thread = page) => ({
  name: 'RunTask',
  ...thread,
  ts,
  dur,
  ...(tdur === undefined ? {} : { tdur }),
  args: {},
})
const dispatch = (ts: number, type: string, thread = page) => ({
  name: 'EventDispatch',
  ...thread,
  ts,
  dur: 5,
  args: { data: { type } },
})
const trace = (...traceEvents: object[]) => JSON.stringify({ traceEvents })

it('a step is all tasks of the main thread from one pointer move to the next', () => {
  const steps = stepTimes(
    trace(
      task(500, 400, 300),
      task(1000, 2000, 1500),
      dispatch(1100, 'pointermove'),
      dispatch(1200, 'mousemove'),
      task(4000, 3000, 2500),
      task(8000, 1000),
      task(20_000, 5000, 4000),
      dispatch(20_001, 'pointermove'),
      task(40_000, 9000, 9000),
      dispatch(40_001, 'pointermove'),
      task(60_000, 1000, 1000),
    ),
  )
  expect(steps).toEqual([
    { processorMs: 4, clockMs: 6 },
    { processorMs: 4, clockMs: 5 },
  ])
})

it('leaves out what other threads do meanwhile, in whatever order the trace tells it', () => {
  const raster = { pid: 7, tid: 9 }
  const steps = stepTimes(
    trace(
      task(9000, 100, 100),
      dispatch(9001, 'pointermove'),
      task(2000, 5000, 5000, raster),
      task(1000, 2000, 2000),
      dispatch(1001, 'pointermove'),
    ),
  )
  expect(steps).toEqual([{ processorMs: 2, clockMs: 2 }])
})

it('finds no step where nothing was dragged', () => expect(stepTimes(trace(task(1, 2, 2)))).toEqual([]))
