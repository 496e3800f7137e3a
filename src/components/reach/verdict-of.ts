import type { LengthUnit } from '@/core/units/length-unit'
import { verdictSentence } from '@/lib/reach-sentences'
import type { CheckResult } from './compile-check'
import { listWords } from './start-sheet'
import type { VerdictTone } from './verdict-line'

export interface VerdictWords {
  tone: VerdictTone
  sentence: string
}

/** The sentence at the head: the verdict while there is one, else what is wrong or still needed. */
export function verdictOf(
  result: CheckResult,
  missing: readonly string[],
  isFresh: boolean,
  unit: LengthUnit,
): VerdictWords {
  if (result.state === 'answered') {
    const { answer, request } = result
    const tone = answer.verdict === 'reaches' ? 'holds' : 'collision'
    return { tone, sentence: verdictSentence(answer, request.feature, unit) }
  }
  if (result.state === 'refused') {
    const places = Object.keys(result.errors).length
    const marked = places === 1 ? 'One field needs another look.' : `${places} fields need another look.`
    return { tone: 'caution', sentence: `No verdict yet. ${result.reason ?? marked}` }
  }
  if (isFresh) return { tone: 'plain', sentence: 'Does it reach?' }
  return { tone: 'plain', sentence: `No verdict yet. Still needed: ${listWords(missing)}.` }
}
