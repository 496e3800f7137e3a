import { expect, it } from 'vitest'
import { problemSchema } from '@/schemas/problem'
import { readProblem } from './read-problem'

const problem = {
  type: 'about:blank',
  title: 'Conflict',
  status: 409,
  detail: 'Somebody changed this meanwhile.',
  code: 'stale-version',
  requestId: 'abc',
}

const answers: unknown[] = [
  problem,
  { ...problem, errors: [] },
  { ...problem, errors: [{ path: 'code', message: 'Taken.' }], current: { id: '1' } },
  ...Object.keys(problem).map((name) => ({ ...problem, [name]: undefined })),
  ...Object.keys(problem).map((name) => ({ ...problem, [name]: null })),
  { ...problem, status: '409' },
  { ...problem, errors: null },
  { ...problem, errors: {} },
  { ...problem, errors: [null] },
  { ...problem, errors: [{ path: 'code' }] },
  { ...problem, errors: [{ path: 1, message: 'Taken.' }] },
  {},
  [],
  null,
  undefined,
  'a proxy is down',
  502,
]

it.each(answers.map((answer) => [JSON.stringify(answer), answer]))(
  'it takes %s for a problem exactly where the schema does',
  (_, answer) => {
    const parsed = problemSchema.safeParse(answer)
    expect(readProblem(answer)).toEqual(parsed.success ? parsed.data : null)
  },
)
