import { gaugeLengthFit, type MachineWindow } from '@/core/machine/machine-window'
import { setUpWindow } from '@/core/machine/set-up-window'
import { isSameTaper } from '@/core/machine/taper'
import { overlapToleranceMm } from '@/core/outline/types'
import type { Bore } from '@/core/tooling'
import { AppError } from '@/lib/app-error'
import type { SetUpAssemblyRequest, SetUpAssemblyResponse } from '@/schemas/set-up'
import { type Database, db } from '../../db/connection'
import { readHoldersOfBore } from '../../db/read-models/holders-of-bore'
import { readItem } from '../catalogue/get-item'
import { getSetUp } from './get-set-up'

const mostHolders = 20

/** Whether an assembly fits a set-up's window, by how much it does not, and which holders of its bore would. */
export async function checkSetUpAssembly(
  setUpId: string,
  { holderId, extensionId, stickOutMm }: SetUpAssemblyRequest,
): Promise<SetUpAssemblyResponse> {
  const database = db()
  const setUp = await getSetUp(setUpId, database)
  const holder = await answeringAt('holderId', readItem(database, 'holder', holderId))
  const extension = extensionId
    ? await answeringAt('extensionId', readItem(database, 'extension', extensionId))
    : null
  const beforeHolderMm = stickOutMm + (extension?.projectionMm ?? 0)
  const gaugeLengthMm = holder.gaugeLengthMm + beforeHolderMm
  const window = setUpWindow(setUp.machine, setUp)
  const fit = gaugeLengthFit(window.gaugeLengthMm, gaugeLengthMm)
  return {
    gaugeLengthMm,
    window,
    ...fit,
    isTaperRight: holder.taper === null ? null : isSameTaper(holder.taper, setUp.machine.taper),
    fittingHolders:
      fit.verdict === 'fits'
        ? []
        : await fittingHolders(database, holder.bore, setUp.machine.taper, window, beforeHolderMm),
  }
}

async function fittingHolders(
  database: Database,
  bore: Bore,
  taper: string,
  { gaugeLengthMm }: MachineWindow,
  beforeHolderMm: number,
): Promise<SetUpAssemblyResponse['fittingHolders']> {
  const holders = await readHoldersOfBore(database, bore, {
    taper,
    shortestMm: gaugeLengthMm.shortest - beforeHolderMm - overlapToleranceMm,
    longestMm: gaugeLengthMm.longest - beforeHolderMm + overlapToleranceMm,
    toleranceMm: overlapToleranceMm,
    limit: mostHolders,
  })
  return holders.map(({ gaugeLengthMm: holderGaugeLengthMm, ...holder }) => ({
    ...holder,
    holderGaugeLengthMm,
    gaugeLengthMm: holderGaugeLengthMm + beforeHolderMm,
  }))
}

/** What isn't there is said at the place it was named. */
async function answeringAt<Row>(path: string, reading: Promise<Row>): Promise<Row> {
  try {
    return await reading
  } catch (error) {
    if (!(error instanceof AppError) || error.code !== 'not-found') throw error
    throw new AppError('impossible', error.detail, { errors: [{ path, message: error.detail }] })
  }
}
