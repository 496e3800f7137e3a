import { CoreInputError } from '@/core/core-input-error'
import type { SpindleOfMachine } from '@/core/cutting/cut-answer'
import { type MachineWindow, machineWindow } from '@/core/machine/machine-window'
import { setUpWindow } from '@/core/machine/set-up-window'
import { AppError } from '@/lib/app-error'
import { spindleOf } from '@/lib/cut-draft'
import { sentenceLength } from '@/lib/reach-sentences'
import type { MachineResponse } from '@/schemas/machine'
import type { ReachSearchRequest } from '@/schemas/reach-search'
import { getMachine } from '../machines/get-machine'
import { getSetUp } from '../set-ups/get-set-up'

/** What machine and set-up leave of the crib; null where they were not named, or where it is not known. */
export interface MachineLimits {
  taper: string | null
  spindleNoseDiameterMm: number | null
  widestToolMm: number | null
  maximumRpm: number | null
  spindle: SpindleOfMachine | null
  gaugeLengthMm: { shortestMm: number; longestMm: number } | null
}

/** The machine a search is for, with the window of its set-up. What leaves no room for any tool is refused. */
export async function machineLimits(body: ReachSearchRequest): Promise<MachineLimits> {
  const { machineId, setUpId, setup } = body.where ?? {}
  const setUp = setUpId ? await namedAt('where.setUpId', getSetUp(setUpId)) : null
  if (setUp && machineId && setUp.machineId !== machineId)
    throw impossible('where.setUpId', 'This set-up is on another machine than the one named.')
  const wantedId = machineId ?? setUp?.machineId ?? null
  const machine = wantedId ? await namedAt('where.machineId', getMachine(wantedId)) : null
  const window = setUp
    ? windowAt('where.setUpId', body, () => setUpWindow(setUp.machine, setUp))
    : setup
      ? windowAt('where.setup', body, () => machineWindow(setup))
      : null
  return {
    taper: machine?.taper ?? null,
    spindleNoseDiameterMm: machine?.spindleNoseDiameterMm ?? null,
    widestToolMm: machine?.widestToolMm ?? null,
    maximumRpm: machine?.maximumRpm ?? null,
    spindle: machine && spindleOf(machine),
    gaugeLengthMm: gaugeLengths(machine, window),
  }
}

/** The set-up's window; without one only the changer says how long a tool may be. */
function gaugeLengths(
  machine: MachineResponse | null,
  window: MachineWindow | null,
): MachineLimits['gaugeLengthMm'] {
  const changerMm = machine?.longestToolMm ?? Number.POSITIVE_INFINITY
  if (window) {
    const { shortest, longest } = window.gaugeLengthMm
    return { shortestMm: shortest, longestMm: Math.min(longest, changerMm) }
  }
  return Number.isFinite(changerMm) ? { shortestMm: 0, longestMm: changerMm } : null
}

function windowAt(path: string, body: ReachSearchRequest, workOut: () => MachineWindow): MachineWindow {
  const window = coreRefusalAt(path, workOut)
  const said = (mm: number) => sentenceLength(mm, body.sentenceUnit)
  if (window.tableStrikeMm > 0)
    throw impossible(
      path,
      `What turns in this set-up comes ${said(window.tableStrikeMm)} too near to the table.`,
    )
  if (!window.possible) {
    const by = window.shortfallMm > 0 ? `: ${said(window.shortfallMm)} are missing` : ''
    throw impossible(path, `This set-up leaves no room for any tool${by}.`)
  }
  return window
}

/** What the core refuses of a set-up is said at the place it was given. */
function coreRefusalAt<Answer>(path: string, work: () => Answer): Answer {
  try {
    return work()
  } catch (error) {
    if (!(error instanceof CoreInputError)) throw error
    throw impossible(path === 'where.setup' ? `${path}.${error.path}` : path, error.message)
  }
}

async function namedAt<Row>(path: string, reading: Promise<Row>): Promise<Row> {
  try {
    return await reading
  } catch (error) {
    if (!(error instanceof AppError) || error.code !== 'not-found') throw error
    throw impossible(path, error.detail)
  }
}

function impossible(path: string, message: string): AppError {
  return new AppError('impossible', message, { errors: [{ path, message }] })
}
