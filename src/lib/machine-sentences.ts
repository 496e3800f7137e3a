import type { GaugeLengthFit, MachineWindow } from '@/core/machine/machine-window'
import { isSameTaper } from '@/core/machine/taper'
import { overlapToleranceMm } from '@/core/outline/types'
import type { LengthUnit } from '@/core/units/length-unit'
import { formatLength } from './format-length'

/** What the longest gauge length is held by. */
export const longestBoundNames: Readonly<Record<MachineWindow['longestBoundBy'], string>> = {
  retract: 'the retract over the highest thing',
  changer: 'the tool changer',
}

/**
 * What a set-up lets into the spindle, in sentences; what strikes comes first.
 *
 * @example
 * windowSentences(machineWindow({ gaugeLineToTableMm: 600, zTravelMm: 450, highestMm: 220, lowestTipMm: 60, retractClearanceMm: 25 }), 'mm') // => ['Takes gauge lengths from 90 mm to 355 mm.', 'Longer ones are stopped by the retract over the highest thing; shorter ones do not get down to the lowest tip position.']
 */
export function windowSentences(window: MachineWindow, unit: LengthUnit): string[] {
  const said = (mm: number) => formatLength(mm, unit)
  const { shortest, longest } = window.gaugeLengthMm
  const strike = strikeSentence(window, unit)
  const strikes = strike === null ? [] : [strike]
  if (longest <= 0) {
    return [
      ...strikes,
      'No tool fits: with Z at the top there is no room between the gauge line and the retract height.',
    ]
  }
  if (window.shortfallMm > 0) {
    return [
      ...strikes,
      `No tool fits, by ${said(window.shortfallMm)}: to get down it needs a gauge length of ${said(shortest)}, and ${longestBoundNames[window.longestBoundBy]} allows ${said(longest)}.`,
    ]
  }
  const bound = `Longer ones are stopped by ${longestBoundNames[window.longestBoundBy]}`
  return shortest > 0
    ? [
        ...strikes,
        `Takes gauge lengths from ${said(shortest)} to ${said(longest)}.`,
        `${bound}; shorter ones do not get down to the lowest tip position.`,
      ]
    : [...strikes, `Takes gauge lengths up to ${said(longest)}; every one gets down.`, `${bound}.`]
}

/** What turns and comes too near to the table; null where nothing does. */
export function strikeSentence(window: MachineWindow, unit: LengthUnit): string | null {
  const { tableStrikeMm, tableClearanceMm } = window
  if (tableStrikeMm === 0 || tableClearanceMm === null) return null
  return tableClearanceMm < 0
    ? `What turns strikes the table: it would go ${formatLength(-tableClearanceMm, unit)} into it. Raise the axis or take a smaller stock.`
    : `What turns comes within ${formatLength(tableClearanceMm, unit)} of the table, ${formatLength(tableStrikeMm, unit)} less than the clearance.`
}

/** Whether an assembly's gauge length is inside, or by how much it is not. */
export function fitSentence(fit: GaugeLengthFit, gaugeLengthMm: number, unit: LengthUnit): string {
  const length = formatLength(gaugeLengthMm, unit)
  const by = formatLength(fit.byMm, unit)
  switch (fit.verdict) {
    case 'fits':
      return `A gauge length of ${length} fits this set-up.`
    case 'tooLong':
      return `A gauge length of ${length} is too long by ${by}.`
    case 'tooShort':
      return `A gauge length of ${length} is too short by ${by}: it does not get down.`
  }
}

/**
 * How near the spindle's own nose comes to the highest thing with the tip as low as it goes; null where it keeps the
 * retract clearance. Whether it strikes depends on where that thing stands, which only a person sees.
 *
 * @example
 * noseSentence({ lowestTipMm: 50, highestMm: 110, retractClearanceMm: 20 }, 65, 'mm') // => 'With the tip at its lowest the spindle nose is 5 mm above the highest thing: see that it clears what stands beside the cut.'
 */
export function noseSentence(
  heights: { lowestTipMm: number; highestMm: number; retractClearanceMm: number },
  gaugeLengthMm: number,
  unit: LengthUnit,
): string | null {
  const aboveMm = heights.lowestTipMm + gaugeLengthMm - heights.highestMm
  if (aboveMm >= heights.retractClearanceMm - overlapToleranceMm) return null
  const where =
    aboveMm < 0
      ? `${formatLength(-aboveMm, unit)} below the top of the highest thing`
      : `${formatLength(aboveMm, unit)} above the highest thing`
  return `With the tip at its lowest the spindle nose is ${where}: see that it clears what stands beside the cut.`
}

/** What else keeps an assembly out of a machine's spindle or changer, beside its length; empty where nothing known does. */
export function machineRefusals(
  machine: { taper: string; widestToolMm: number | null },
  tool: { holderCode: string; taper: string | null; widestMm: number },
  unit: LengthUnit,
): string[] {
  const refusals: string[] = []
  if (tool.taper !== null && !isSameTaper(tool.taper, machine.taper)) {
    refusals.push(`${tool.holderCode} has a ${tool.taper} taper; this spindle takes ${machine.taper}.`)
  }
  if (machine.widestToolMm !== null && tool.widestMm > machine.widestToolMm + overlapToleranceMm) {
    refusals.push(
      `Its widest part, ${formatLength(tool.widestMm, unit)}, is more than the changer takes, ${formatLength(machine.widestToolMm, unit)}.`,
    )
  }
  return refusals
}

/** What is left to clean up when a bar is turned to its part. */
export function centringSentence(marginMm: number, unit: LengthUnit): string {
  return marginMm < 0
    ? `The part does not clean up: ${formatLength(-marginMm, unit)} is missing on the thinnest side.`
    : `${formatLength(marginMm, unit)} is left to clean up on the thinnest side.`
}
