import { CoreInputError } from '@/core/core-input-error'
import type { MachineWindow } from '@/core/machine/machine-window'
import { centringMarginMm } from '@/core/machine/rotary-stock'
import { setUpWindow } from '@/core/machine/set-up-window'
import type { SetUpResponse } from '@/schemas/set-up'
import type { SetUpRow } from '../../db/read-models/set-up-rows'

/** A set-up with its window, or with what keeps it from having one. */
export function setUpAnswer(row: SetUpRow): SetUpResponse {
  const { machine: _, ...set } = row
  const { window, problem } = attemptedWindow(row)
  const stock = row.rotaryStock
  return {
    ...set,
    window,
    windowProblem: problem,
    centringMarginMm:
      stock === null || stock.partDiameterMm === null || stock.centringErrorMm === null
        ? null
        : centringMarginMm(stock, stock.partDiameterMm, stock.centringErrorMm),
  }
}

function attemptedWindow(row: SetUpRow): { window: MachineWindow | null; problem: string | null } {
  try {
    return { window: setUpWindow(row.machine, row), problem: null }
  } catch (error) {
    if (!(error instanceof CoreInputError)) throw error
    return { window: null, problem: error.message }
  }
}
