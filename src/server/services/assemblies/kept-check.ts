import type { KeptCheck } from '@/core/assemblies/types'
import type { ReachAnswer } from '@/core/reach/types'
import { AppError } from '@/lib/app-error'
import { verdictSentence } from '@/lib/reach-sentences'
import type { CreateAssemblyRequest } from '@/schemas/assembly'
import type { FieldProblem } from '@/schemas/problem'

/** The check of a request as it is kept: a clearance left out is the shop's own. */
export function checkOf({
  feature,
  clearances,
}: Pick<CreateAssemblyRequest, 'feature' | 'clearances'>): Omit<KeptCheck, 'id'> {
  if (clearances?.shankMm == null && clearances?.holderMm == null) return { feature, clearances: null }
  return {
    feature,
    clearances: {
      ...(clearances.shankMm == null ? {} : { shankMm: clearances.shankMm }),
      ...(clearances.holderMm == null ? {} : { holderMm: clearances.holderMm }),
    },
  }
}

/** Only what reaches is kept; a collet chuck without its collet is only half an assembly. */
export function refuseShort(
  answer: ReachAnswer,
  { feature }: Pick<KeptCheck, 'feature'>,
  path: string,
): void {
  if (answer.messages.some(({ code }) => code === 'collet-not-given'))
    throw impossible([{ path: 'collet', message: 'This chuck takes a collet: say which.' }])
  if (answer.verdict === 'reaches') return
  throw impossible([
    { path, message: `Only what reaches is kept. ${verdictSentence(answer, feature, 'mm')}` },
  ])
}

function impossible(errors: FieldProblem[]): AppError {
  return new AppError('impossible', errors[0]?.message ?? 'This cannot be kept.', { errors })
}
