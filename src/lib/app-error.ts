import type { FieldProblem, ProblemCode } from '@/schemas/problem'

export interface AppErrorOptions {
  /** What is wrong beside which field. */
  errors?: FieldProblem[]
  /** Further members of the answer, such as the current row of a stale edit. */
  extra?: Record<string, unknown>
  /** For the log alone. */
  note?: string
}

/** A refusal with a stable code and a sentence a person can read. Services throw it; the route wrapper answers it. */
export class AppError extends Error {
  override readonly name = 'AppError'

  constructor(
    readonly code: ProblemCode,
    readonly detail: string,
    readonly options: AppErrorOptions = {},
  ) {
    super(detail)
  }
}
