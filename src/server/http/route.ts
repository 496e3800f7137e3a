import { createHash, randomUUID } from 'node:crypto'
import { z } from 'zod'
import { can, type Permission } from '@/core/policies/permissions'
import { AppError } from '@/lib/app-error'
import { plainMessage } from '@/schemas/plain-message'
import type { Actor } from '../auth/actor'
import { findActor } from '../auth/session'
import { env } from '../env'
import { log } from '../log'
import {
  bodyProblemCode,
  fieldProblems,
  isDatabaseUnreachable,
  knownProblemResponse,
  problemResponse,
} from './problem-response'
import { isSameOrigin } from './same-origin'

/** `public` needs no session; `signedIn` any; else a permission of the one table. */
export type Access = 'public' | 'signedIn' | Permission

/** What makes a repeated call recognisable: one key, one body, one route. */
export interface IdempotencyClaim {
  key: string
  route: string
  bodyHash: string
}

type Parsed<Schema> = Schema extends z.ZodType ? z.output<Schema> : undefined

interface Context<IsPublic, Params, Query, Body> {
  actor: IsPublic extends 'public' ? Actor | null : Actor
  params: Parsed<Params>
  query: Parsed<Query>
  body: Parsed<Body>
  /** Present where the route asks for an `Idempotency-Key`. */
  idempotency: IdempotencyClaim
  request: Request
  requestId: string
}

interface RouteOptions<A extends Access, Params, Query, Body, Answer> {
  access: A
  params?: Params
  query?: Query
  body?: Body
  /** Answers are allow-lists: what this schema does not name does not leave. Null for an empty 204. */
  answer: Answer
  status?: number
  /** The call moves stock or money: a repeat with the same key must happen once. */
  needsIdempotencyKey?: boolean
  /** A `Response` is sent as it is: downloads, and answers that also set a cookie. */
  handle: (
    context: Context<A, Params, Query, Body>,
  ) => Promise<(Answer extends z.ZodType ? z.input<Answer> : unknown) | Response>
}

interface NextRouteContext {
  params: Promise<Record<string, string | string[] | undefined>>
}

const changingMethods = new Set(['POST', 'PUT', 'PATCH', 'DELETE'])
const bodyLimitBytes = 1_000_000

/** One declaration a route and method: identify, authorise, parse, run, answer, and map every error to problem+json. */
export function route<
  A extends Access,
  Answer extends z.ZodType | null,
  Params extends z.ZodType | undefined = undefined,
  Query extends z.ZodType | undefined = undefined,
  Body extends z.ZodType | undefined = undefined,
>(options: RouteOptions<A, Params, Query, Body, Answer>) {
  return async (request: Request, next: NextRouteContext): Promise<Response> => {
    const requestId = randomUUID()
    const path = new URL(request.url).pathname
    try {
      const actor = await authorise(request, options.access)
      const params = options.params ? parseInput(options.params, await next.params, 'path') : undefined
      const query = options.query ? parseInput(options.query, queryOf(request), 'query') : undefined
      const text = options.body ? await readText(request) : ''
      const body = options.body ? parseBody(options.body, text) : undefined
      const idempotency = idempotencyClaim(request, path, text, options.needsIdempotencyKey ?? false)
      const result = await options.handle({
        actor,
        params,
        query,
        body,
        idempotency,
        request,
        requestId,
      } as Context<A, Params, Query, Body>)
      if (result instanceof Response) return result
      return answer(options.answer, result, options.status, requestId)
    } catch (error) {
      return failure(error, request, path, requestId)
    }
  }
}

async function authorise(request: Request, access: Access): Promise<Actor | null> {
  if (changingMethods.has(request.method) && !isSameOrigin(request, env().publicUrl)) {
    throw new AppError('foreign-origin', 'This request comes from another site and is refused.')
  }
  if (access === 'public') return null
  const actor = await findActor()
  if (!actor) throw new AppError('not-signed-in', 'Sign in first.')
  if (access !== 'signedIn' && !can(actor.role, access)) {
    throw new AppError('not-allowed', 'Your role does not include this.', {
      note: `user ${actor.id} (${actor.role}) lacks ${access}`,
    })
  }
  return actor
}

function queryOf(request: Request): Record<string, string> {
  return Object.fromEntries(new URL(request.url).searchParams)
}

function parseInput(schema: z.ZodType, value: unknown, where: 'path' | 'query'): unknown {
  const parsed = schema.safeParse(value, { error: plainMessage })
  if (parsed.success) return parsed.data
  if (where === 'path') throw new AppError('not-found', 'There is nothing at this address.')
  // A list in one parameter is named by the parameter: whoever wrote it counts no members.
  const issues = parsed.error.issues.map((issue) => ({ ...issue, path: issue.path.slice(0, 1) }))
  throw new AppError('wrong-shape', 'The query of this address cannot be read.', {
    errors: fieldProblems(new z.ZodError(issues)),
  })
}

async function readText(request: Request): Promise<string> {
  const declared = Number(request.headers.get('content-length') ?? 0)
  const tooLarge = new AppError('too-large', 'This request is larger than one megabyte.')
  if (declared > bodyLimitBytes) throw tooLarge
  const text = await request.text()
  if (text.length > bodyLimitBytes) throw tooLarge
  return text
}

function parseBody(schema: z.ZodType, text: string): unknown {
  let value: unknown
  try {
    value = JSON.parse(text)
  } catch {
    throw new AppError('unreadable-body', 'The body is not JSON.')
  }
  const parsed = schema.safeParse(value, { error: plainMessage })
  if (parsed.success) return parsed.data
  throw new AppError(bodyProblemCode(parsed.error), 'Some fields cannot be taken as they are.', {
    errors: fieldProblems(parsed.error),
  })
}

function idempotencyClaim(request: Request, path: string, text: string, isNeeded: boolean): IdempotencyClaim {
  const key = request.headers.get('idempotency-key') ?? ''
  if (isNeeded && !/^[\x21-\x7e]{1,200}$/.test(key)) {
    throw new AppError(
      'idempotency-key-missing',
      'This call moves stock: send an Idempotency-Key header of up to 200 visible characters.',
    )
  }
  return {
    key,
    route: `${request.method} ${path}`,
    bodyHash: createHash('sha256').update(text).digest('hex'),
  }
}

function answer(schema: z.ZodType | null, result: unknown, status = 200, requestId: string): Response {
  const headers = {
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
    'x-request-id': requestId,
  }
  if (schema === null) return new Response(null, { status: 204, headers })
  return Response.json(schema.parse(result), { status, headers })
}

function failure(error: unknown, request: Request, path: string, requestId: string): Response {
  const entry = { requestId, method: request.method, path }
  const known = isAnswerFault(error) ? null : knownProblemResponse(error, requestId)
  if (known) {
    const note = error instanceof AppError ? error.options.note : undefined
    log.info({ ...entry, status: known.status, note }, 'refused')
    return known
  }
  if (isDatabaseUnreachable(error)) {
    log.error({ ...entry, error: String(error) }, 'database unreachable')
    return problemResponse(
      'database-unreachable',
      'The database does not answer. Try again shortly.',
      requestId,
    )
  }
  log.error({ ...entry, error: error instanceof Error ? error.stack : String(error) }, 'failed')
  return problemResponse('internal-error', 'Something failed here. Nothing was changed.', requestId)
}

/** A zod error that reaches the end came from an answer of ours: our fault, not the caller's. */
function isAnswerFault(error: unknown): boolean {
  return error instanceof Error && error.name === '$ZodError'
    ? true
    : error instanceof Error && error.name === 'ZodError'
}
