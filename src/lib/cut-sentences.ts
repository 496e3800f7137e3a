import type { CutAnswer, CutAssumption } from '@/core/cutting/cut-answer'
import type { StickOutBand, StickOutBands } from '@/core/cutting/stick-out-caution'
import { decimalText } from '@/core/units/decimal-text'
import { type LengthUnit, mmPerInch } from '@/core/units/length-unit'
import { formatLength } from './format-length'
import { formatRpm, formatSpeed } from './format-speed'

/** What was taken for granted, each with what it means. */
export const assumptionSentences: Readonly<Record<CutAssumption, string>> = {
  estimate: 'All of it is an estimate: tables of cutting force differ by 20 to 40 % for one material.',
  'tip-load':
    'The side load is taken at the tip, the worst place; spindle, taper and clamping count as rigid.',
  'exponent-assumed': 'The table prints no exponent for this material; 0.25 is taken.',
  'point-angle-assumed': 'The drill’s point angle is not entered; 118° is taken.',
  'spindle-unknown': 'No spindle’s curve is known here: nothing says whether a machine drives this.',
  'speed-limited': 'Held to the fastest that spindle, holder and cutter allow.',
  'speed-below-spindle': 'This is slower than the spindle turns.',
  'speed-off-curve':
    'This is faster than the spindle’s curve goes: its power and torque there are not known.',
}

/** Those of them that are a caution and not only a remark. */
export const cautionAssumptions: readonly CutAssumption[] = [
  'speed-limited',
  'speed-below-spindle',
  'speed-off-curve',
]

/**
 * A stick-out over the shop's bands, in a sentence; null where it is within them.
 *
 * @example
 * bandSentence('caution', 5.25, { stickOutCautionRatio: 4, stickOutLimitRatio: 8 }) // => 'A long stick-out, 5.3 × diameter: the shop takes care from 4.'
 */
export function bandSentence(band: StickOutBand, ratio: number, bands: StickOutBands): string | null {
  const said = decimalText(ratio, 1, 1)
  if (band === 'plain') return null
  return band === 'over'
    ? `The stick-out is ${said} × diameter, over the shop’s limit of ${bands.stickOutLimitRatio}.`
    : `A long stick-out, ${said} × diameter: the shop takes care from ${bands.stickOutCautionRatio}.`
}

/** Whether the spindle drives the cut, with what it asks for and what there is; null where no curve says. */
export function driveSentence(answer: CutAnswer): string | null {
  const { drive, motorPowerKw, torqueNm, spindleRpm } = answer
  if (drive === null || motorPowerKw === null) return null
  const power = `${amount(motorPowerKw)} of ${amount(drive.powerKw)} kW`
  const torque = `${amount(torqueNm)} of ${amount(drive.torqueNm)} Nm`
  return drive.drives
    ? `The spindle drives it at ${formatRpm(spindleRpm)}: ${power}, ${torque}.`
    : `The spindle does not drive it at ${formatRpm(spindleRpm)}: ${power}, ${torque}.`
}

/** The figures a choice between assemblies is made by, each with its label. */
export function cutRows(answer: CutAnswer, unit: LengthUnit): [label: string, text: string][] {
  const held = answer.assumptions.includes('speed-limited') ? ', held to the fastest allowed' : ''
  const tooth =
    answer.kind === 'milling'
      ? ` · ${formatLength(answer.feedPerToothMm, unit, { extraDecimals: 1 })} a tooth${thinningWords(answer.chipThinningFactor)}`
      : ''
  return [
    ...(answer.kind === 'milling'
      ? ([
          ['Side load', `${amount(answer.sideLoadN)} N`],
          ['Deflection at the tip', `${amount(answer.deflectionUm)} µm`],
        ] as [string, string][])
      : ([['Thrust', `${amount(answer.thrustN)} N`]] as [string, string][])),
    [
      'Spindle speed',
      `${formatRpm(answer.spindleRpm)} · ${formatSpeed(answer.cuttingSpeedMPerMin, unit)}${held}`,
    ],
    ['Feed', `${formatFeed(answer.feedMmPerMin, unit)}${tooth}`],
    ['Power and torque', driveWords(answer)],
  ]
}

function driveWords({ drive, motorPowerKw, powerKw, torqueNm }: CutAnswer): string {
  if (drive === null || motorPowerKw === null)
    return `${amount(powerKw)} kW, ${amount(torqueNm)} Nm; what a spindle gives is not known`
  const words = drive.drives ? 'the spindle drives it' : 'the spindle does not drive it'
  return `${amount(motorPowerKw)} of ${amount(drive.powerKw)} kW, ${amount(torqueNm)} of ${amount(drive.torqueNm)} Nm: ${words}`
}

/**
 * How much the feed a tooth is raised for chips thinner than it; nothing where they are not.
 *
 * @example
 * thinningWords(1.1547) // => ', 1.15 × for thin chips'
 */
export function thinningWords(factor: number): string {
  return factor > 1 ? `, ${decimalText(factor, 2, 2)} × for thin chips` : ''
}

/**
 * A feed speed: whole millimetres, inches with a decimal.
 *
 * @example
 * formatFeed(1145.9, 'mm') // => '1146 mm/min'
 * formatFeed(1145.9, 'in') // => '45.1 in/min'
 */
export function formatFeed(mmPerMin: number, unit: LengthUnit): string {
  return unit === 'mm'
    ? `${decimalText(mmPerMin, 0, mmPerMin < 10 ? 1 : 0)} mm/min`
    : `${decimalText(mmPerMin / mmPerInch, 0, 1)} in/min`
}

/** An amount to three digits or so: what it is an estimate of is no surer. */
export function amount(value: number): string {
  return decimalText(value, 0, value < 1 ? 2 : value < 100 ? 1 : 0)
}
