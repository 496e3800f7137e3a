import type { FieldProblem, Problem } from '@/schemas/problem'

/**
 * What the API answered, as the problem it is, or null where it is none. By hand and not by its schema: every page's
 * first script has this, and would carry the whole of zod for it.
 */
export function readProblem(answer: unknown): Problem | null {
  if (!isRecord(answer)) return null
  const { type, title, status, detail, code, requestId, errors } = answer
  const areTexts = [type, title, detail, code, requestId].every((value) => typeof value === 'string')
  const areErrors = errors === undefined || (Array.isArray(errors) && errors.every(isFieldProblem))
  return areTexts && typeof status === 'number' && areErrors ? (answer as Problem) : null
}

function isFieldProblem(value: unknown): value is FieldProblem {
  return isRecord(value) && typeof value.path === 'string' && typeof value.message === 'string'
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null
}
