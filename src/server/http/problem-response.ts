import { z } from 'zod'
import { CoreInputError } from '@/core/core-input-error'
import { AppError } from '@/lib/app-error'
import { type FieldProblem, type Problem, type ProblemCode, problemStatus } from '@/schemas/problem'

const titles: Record<number, string> = {
  400: 'The request has the wrong shape',
  401: 'Not signed in',
  403: 'Not allowed',
  404: 'Not found',
  409: 'The state has changed or forbids this',
  413: 'Too large',
  422: 'Not possible',
  429: 'Too many tries',
  500: 'Something failed here',
  503: 'The database does not answer',
}

/** Issue codes that speak of a value of the right shape that cannot be. */
const impossibleIssues = new Set(['too_small', 'too_big', 'custom', 'not_multiple_of'])

const jsonHeaders = { 'cache-control': 'no-store', 'x-content-type-options': 'nosniff' }

export function problemResponse(
  code: ProblemCode,
  detail: string,
  requestId: string,
  options: {
    errors?: FieldProblem[]
    extra?: Record<string, unknown>
    headers?: Record<string, string>
  } = {},
): Response {
  const status = problemStatus[code]
  const problem: Problem = {
    ...options.extra,
    type: 'about:blank',
    title: titles[status] ?? 'Problem',
    status,
    detail,
    code,
    requestId,
    ...(options.errors ? { errors: options.errors } : {}),
  }
  return Response.json(problem, {
    status,
    headers: {
      ...jsonHeaders,
      'content-type': 'application/problem+json',
      'x-request-id': requestId,
      ...options.headers,
    },
  })
}

export function fieldProblems(error: z.ZodError): FieldProblem[] {
  return error.issues.flatMap((issue) => {
    const path = issue.path.map(String)
    return issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({ path: [...path, key].join('.'), message: 'There is no such field here.' }))
      : [{ path: path.join('.'), message: issue.message }]
  })
}

/** 422 where every fault is a value of the right shape that cannot be; 400 otherwise. */
export function bodyProblemCode(error: z.ZodError): ProblemCode {
  const isImpossible = error.issues.every(
    (issue) =>
      impossibleIssues.has(issue.code) && !('origin' in issue && ['string', 'array'].includes(issue.origin)),
  )
  return isImpossible ? 'impossible' : 'wrong-shape'
}

/** The answer to an error a handler threw; null where it is none of those a person can do something about. */
export function knownProblemResponse(error: unknown, requestId: string): Response | null {
  if (error instanceof AppError) {
    return problemResponse(error.code, error.detail, requestId, error.options)
  }
  if (error instanceof CoreInputError) {
    return problemResponse('impossible', error.message, requestId, {
      errors: [{ path: error.path, message: error.message }],
      extra: { reason: error.code },
    })
  }
  if (error instanceof z.ZodError) {
    return problemResponse(bodyProblemCode(error), 'Some fields cannot be taken as they are.', requestId, {
      errors: fieldProblems(error),
    })
  }
  return null
}

const unreachableCodes = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'ENOTFOUND',
  'ETIMEDOUT',
  '57P01',
  '57P03',
  '08006',
  '08001',
])

export function isDatabaseUnreachable(error: unknown): boolean {
  if (!(error instanceof Error)) return false
  const code = 'code' in error ? String(error.code) : ''
  return unreachableCodes.has(code) || error.name === 'KnexTimeoutError'
}
