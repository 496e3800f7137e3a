import { z } from 'zod'

/** Every code the API answers with, and its status. The only such table. */
export const problemStatus = {
  'wrong-shape': 400,
  'unreadable-body': 400,
  'idempotency-key-missing': 400,
  'not-signed-in': 401,
  'wrong-credentials': 401,
  'not-allowed': 403,
  'foreign-origin': 403,
  'not-found': 404,
  'stale-version': 409,
  'found-changed': 409,
  'idempotency-key-reused': 409,
  'not-enough-stock': 409,
  'code-taken': 409,
  'name-taken': 409,
  'email-taken': 409,
  'still-in-use': 409,
  'already-reversed': 409,
  'wrong-state': 409,
  'assembly-does-not-hold': 409,
  'import-not-ready': 409,
  'import-already-committed': 409,
  'setup-done': 409,
  'too-large': 413,
  impossible: 422,
  'too-many-found': 422,
  'movement-not-possible': 422,
  'import-has-rejects': 422,
  'link-expired': 422,
  'too-many-tries': 429,
  /** Nobody waits for this answer any more; only the log sees it. */
  'search-cancelled': 499,
  'internal-error': 500,
  'database-unreachable': 503,
} as const

export type ProblemCode = keyof typeof problemStatus

export const fieldProblemSchema = z.object({ path: z.string(), message: z.string() })
export type FieldProblem = z.infer<typeof fieldProblemSchema>

/** RFC 9457. `current` is the row as it is now, where a stale version was sent. */
export const problemSchema = z.looseObject({
  type: z.string(),
  title: z.string(),
  status: z.number(),
  detail: z.string(),
  code: z.string(),
  requestId: z.string(),
  errors: z.array(fieldProblemSchema).optional(),
})
export type Problem = z.infer<typeof problemSchema>
