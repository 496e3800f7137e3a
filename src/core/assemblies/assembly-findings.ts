import { CoreInputError } from '../core-input-error'
import { reachAnswer } from '../reach/reach-answer'
import type { ReachAnswer, ReachSettings } from '../reach/types'
import {
  assemblyGaugeLengthMm,
  isOverTolerance,
  measuredStickOutMm,
  offsetsOf,
  reachRequestOf,
} from './assembly-figures'
import { sizeChanges } from './size-changes'
import {
  type AssemblyTools,
  assemblyPartKinds,
  type Finding,
  type FindingDetail,
  type KeptCheck,
  offsetNames,
  type PartNow,
} from './types'

export interface KeptAssembly {
  stickOutMm: number
  /** The sizes everything noted about it goes by. */
  tools: AssemblyTools
  checks: KeptCheck[]
  /** Measured on it as it is built now; null where it was not. */
  measuredGaugeLengthMm: number | null
}

export interface AssemblyNow {
  tools: AssemblyTools
  parts: PartNow[]
  settings: ReachSettings
  /** A gauge length measured within this of the calculated one is taken as set. */
  toleranceMm: number
}

export interface CheckOutcome {
  checkId: string
  holds: boolean
  /** null where the sizes make nothing that could be checked. */
  answer: ReachAnswer | null
}

export interface Recheck {
  findings: Finding[]
  outcomes: CheckOutcome[]
}

/**
 * What of a kept assembly no longer holds, with the sizes and places its parts have now.
 *
 * Assumes the stick-out stays what it was set to. A gauge length measured beyond the shop's tolerance speaks of the
 * assembly as it really stands, so every check is asked at that stick-out too.
 *
 * Units      Millimetres.
 * Result     Findings, each with a key of its own; changed sizes alone are no fault. Every check has an outcome.
 * Errors     None: sizes that can't be are the finding `checkImpossible`.
 * Source     reach.md, by `reachAnswer`; what is a fault is this project's decision.
 * Tolerance  Offsets that differ by no more than 1e-9 mm are the same.
 */
export function assemblyFindings(kept: KeptAssembly, now: AssemblyNow): Recheck {
  const looked = kept.checks.map((check) => lookAt(check, kept, now))
  return {
    findings: [
      ...sizeFindings(kept, now),
      ...offsetFindings(kept, now),
      ...looked.flatMap(({ findings }) => findings),
      ...now.parts.flatMap(partFindings),
    ],
    outcomes: looked.map(({ outcome }) => outcome),
  }
}

function sizeFindings(kept: KeptAssembly, now: AssemblyNow): Finding[] {
  return assemblyPartKinds.flatMap((part) => {
    const [before, after] = [kept.tools[part], now.tools[part]]
    const changes = before && after ? sizeChanges(part, before, after) : []
    if (changes.length === 0) return []
    return [finding(`sizes:${part}`, false, null, { code: 'sizesChanged', part, changes })]
  })
}

const sameMm = 1e-9

function offsetFindings(kept: KeptAssembly, now: AssemblyNow): Finding[] {
  const before = offsetsOf(kept.tools, kept.stickOutMm)
  const after = offsetsOf(now.tools, kept.stickOutMm)
  return offsetNames
    .filter((offset) => Math.abs(before[offset] - after[offset]) > sameMm)
    .map((offset) =>
      finding(`offset:${offset}`, true, null, {
        code: 'offsetChanged',
        offset,
        beforeMm: before[offset],
        afterMm: after[offset],
      }),
    )
}

function lookAt(
  check: KeptCheck,
  kept: KeptAssembly,
  now: AssemblyNow,
): { findings: Finding[]; outcome: CheckOutcome } {
  const checkId = check.id
  try {
    const answer = reachAnswer(reachRequestOf(now.tools, check, kept.stickOutMm, now.settings))
    const holds = answer.verdict === 'reaches'
    const findings = holds
      ? asMeasured(check, kept, now)
      : [
          finding(`check:${checkId}`, true, checkId, {
            code: 'checkFails',
            checkId,
            feature: check.feature,
            answer,
          }),
        ]
    return { findings, outcome: { checkId, holds: findings.length === 0, answer } }
  } catch (error) {
    if (!(error instanceof CoreInputError)) throw error
    const detail: FindingDetail = { code: 'checkImpossible', checkId, message: error.message }
    return {
      findings: [finding(`check:${checkId}`, true, checkId, detail)],
      outcome: { checkId, holds: false, answer: null },
    }
  }
}

function asMeasured(check: KeptCheck, kept: KeptAssembly, now: AssemblyNow): Finding[] {
  const measuredMm = kept.measuredGaugeLengthMm
  if (measuredMm === null) return []
  const calculatedMm = assemblyGaugeLengthMm(now.tools, kept.stickOutMm)
  if (!isOverTolerance(measuredMm, calculatedMm, now.toleranceMm)) return []
  const stickOutMm = measuredStickOutMm(now.tools, measuredMm)
  if (stickOutMm <= 0) {
    const message = 'The gauge length measured is shorter than what holds the cutter.'
    return [
      finding(`measured:${check.id}`, true, check.id, {
        code: 'checkImpossible',
        checkId: check.id,
        message,
      }),
    ]
  }
  const answer = reachAnswer(reachRequestOf(now.tools, check, stickOutMm, now.settings))
  if (answer.verdict === 'reaches') return []
  return [
    finding(`measured:${check.id}`, true, check.id, {
      code: 'checkFailsAsMeasured',
      checkId: check.id,
      feature: check.feature,
      answer,
    }),
  ]
}

/** Where several assemblies take one heap for theirs, nobody knows whose part went: each is told. */
function partFindings({ kind: part, isArchived, presence }: PartNow): Finding[] {
  const isGone = presence !== null && presence.held < presence.claimed
  return [
    ...(isArchived ? [finding(`archived:${part}`, true, null, { code: 'partArchived', part })] : []),
    ...(isGone ? [finding(`gone:${part}`, true, null, { code: 'partGone', part, ...presence })] : []),
  ]
}

function finding(key: string, isFault: boolean, checkId: string | null, detail: FindingDetail): Finding {
  return { key, isFault, checkId, detail }
}
