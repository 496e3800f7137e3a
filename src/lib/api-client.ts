import type { FieldProblem, Problem } from '@/schemas/problem'
import { readProblem } from './read-problem'

/** An answer that is not a success, as a sentence; `problem` is null where no answer came at all. */
export class ApiError extends Error {
  override readonly name = 'ApiError'

  constructor(
    message: string,
    readonly problem: Problem | null,
  ) {
    super(message)
  }

  get code(): string {
    return this.problem?.code ?? 'unreachable'
  }

  get fieldProblems(): FieldProblem[] {
    return this.problem?.errors ?? []
  }
}

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

interface SendOptions {
  body?: unknown
  idempotencyKey?: string
  signal?: AbortSignal
}

/** Calls our own API; throws ApiError with a sentence that can be shown. The one place that calls `fetch`. */
export async function callApi<Answer>(
  method: Method,
  url: string,
  options: SendOptions = {},
): Promise<Answer> {
  const isForm = options.body instanceof FormData
  const headers: Record<string, string> = {}
  if (options.body !== undefined && !isForm) headers['content-type'] = 'application/json'
  if (options.idempotencyKey) headers['idempotency-key'] = options.idempotencyKey
  const body = isForm ? (options.body as FormData) : bodyText(options.body)
  const response = await reach(url, { method, headers, body, signal: options.signal ?? null })
  if (response.status === 204) return undefined as Answer
  const answer: unknown = await response.json().catch(() => null)
  if (response.ok) return answer as Answer
  const problem = readProblem(answer)
  throw problem
    ? new ApiError(problem.detail, problem)
    : new ApiError(`The server answered ${response.status} without saying why.`, null)
}

function bodyText(body: unknown): string | null {
  return body === undefined ? null : JSON.stringify(body)
}

async function reach(url: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(url, init)
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error
    throw new ApiError('Leadline cannot be reached. Check the network and try again.', null)
  }
}

/** The fetcher every SWR hook uses; the key is the URL. */
export function getJson<Answer>(url: string): Promise<Answer> {
  return callApi<Answer>('GET', url)
}
