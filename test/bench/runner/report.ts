import { availableParallelism, loadavg } from 'node:os'
import { type Figure, type FigureUnit, isWithin, type Limit } from './bench'

/** What one bench came to: its figures, or why there are none. */
export interface Outcome {
  bench: string
  figures: Figure[]
  failure: string | null
  /** Processes that wanted to run, a minute's mean, when the bench began and when it ended. */
  load: { before: number; after: number }
  seconds: number
}

export const currentLoad = () => loadavg()[0] ?? 0

/** The table at the end: one line a figure, and a sentence of how many stand over their limit. */
export function reportTable(outcomes: readonly Outcome[]): string {
  const heading = ['Benchmark', 'Figure', 'Limit', '', 'Ours', 'Held against', 'Samples', 'Load']
  const rows = outcomes.flatMap((outcome) => [
    ...outcome.figures.map((figure) => figureRow(outcome, figure)),
    ...(outcome.failure === null
      ? []
      : [[outcome.bench, 'not measured', '', '', '', '', '', loadOf(outcome)]]),
  ])
  const widths = heading.map((text, at) => Math.max(text.length, ...rows.map((row) => row[at]?.length ?? 0)))
  const line = (row: readonly string[]) =>
    row
      .map((cell, at) =>
        at === 0 || at === 3 ? cell.padEnd(widths[at] ?? 0) : cell.padStart(widths[at] ?? 0),
      )
      .join('  ')
      .trimEnd()
  const notes = outcomes.flatMap(({ bench, figures, failure }) => [
    ...figures.flatMap(({ name, note }) => (note ? [`${bench}: ${name}: ${note}`] : [])),
    ...(failure === null ? [] : [`${bench}: not measured: ${failure}`]),
  ])
  return [
    line(heading),
    line(widths.map((width) => '-'.repeat(width))),
    ...rows.map(line),
    ...(notes.length > 0 ? ['', ...notes] : []),
    '',
    summary(outcomes),
  ].join('\n')
}

function figureRow(outcome: Outcome, figure: Figure): string[] {
  const { name, value, unit, limit, sides, samples } = figure
  return [
    `${outcome.bench}: ${name}`,
    figureText(value, unit),
    limit ? limitText(limit, unit) : 'reported',
    limit === null ? '' : isWithin(figure) ? 'within' : limitVerdict(limit),
    sides ? figureText(sides.ours, sides.unit) : '',
    sides ? figureText(sides.other, sides.unit) : '',
    String(samples),
    loadOf(outcome),
  ]
}

const limitVerdict = (limit: Limit) => ('atMost' in limit ? 'OVER THE LIMIT' : 'UNDER THE LIMIT')

function limitText(limit: Limit, unit: FigureUnit): string {
  return 'atMost' in limit ? `≤ ${figureText(limit.atMost, unit)}` : `≥ ${figureText(limit.atLeast, unit)}`
}

/** Three figures say enough of a measurement. */
function figureText(value: number, unit: FigureUnit): string {
  const decimals = Math.abs(value) >= 100 || Number.isInteger(value) ? 0 : Math.abs(value) >= 10 ? 1 : 2
  const text = value.toFixed(decimals)
  return unit === 'times' ? `${text} ×` : `${text} ${unit}`
}

const loadOf = ({ load }: Outcome) => `${load.before.toFixed(1)} → ${load.after.toFixed(1)}`

function summary(outcomes: readonly Outcome[]): string {
  const limited = outcomes.flatMap(({ figures }) => figures.filter(({ limit }) => limit !== null))
  const missed = limited.filter((figure) => !isWithin(figure)).length
  const unmeasured = outcomes.filter(({ failure }) => failure !== null).length
  const parts = [
    `${limited.length - missed} of ${limited.length} limits kept on ${availableParallelism()} cores`,
    ...(missed > 0 ? [`${missed} missed`] : []),
    ...(unmeasured > 0 ? [`${unmeasured} could not be measured`] : []),
  ]
  return `${parts.join(', ')}.`
}
