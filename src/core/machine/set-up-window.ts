import { type MachineWindow, machineWindow } from './machine-window'
import type { RotaryStock } from './rotary-stock'

export interface MachineSpace {
  gaugeLineToTableMm: number
  zTravelMm: number
  longestToolMm?: number | null
}

export interface SetUpHeights {
  highestMm: number
  lowestTipMm: number
  retractClearanceMm: number
  rotaryStock?: RotaryStock | null
  /** Each with the height of what it stands on. */
  fixtures: { baseMm: number; heightMm: number }[]
}

/**
 * The window of a machine with a set-up on it: as machineWindow, the highest thing being whatever stands highest of
 * what was named, the fixtures with what they stand on, and the swept circle.
 *
 * Units      Millimetres.
 * Errors     As machineWindow.
 * Source     machineWindow.
 *
 * @example
 * setUpWindow({ gaugeLineToTableMm: 600, zTravelMm: 450 }, { highestMm: 100, lowestTipMm: 60, retractClearanceMm: 25, fixtures: [{ baseMm: 30, heightMm: 90 }] }).highestMm // => 120
 */
export function setUpWindow(machine: MachineSpace, setUp: SetUpHeights): MachineWindow {
  const { fixtures, ...heights } = setUp
  const tops = fixtures.map(({ baseMm, heightMm }) => baseMm + heightMm)
  return machineWindow({
    gaugeLineToTableMm: machine.gaugeLineToTableMm,
    zTravelMm: machine.zTravelMm,
    longestToolMm: machine.longestToolMm ?? null,
    ...heights,
    highestMm: Math.max(heights.highestMm, ...tops),
  })
}
