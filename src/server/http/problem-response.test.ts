import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { CoreInputError } from '@/core/core-input-error'
import { AppError } from '@/lib/app-error'
import { bodyProblemCode, knownProblemResponse, problemResponse } from './problem-response'

const body = z
  .object({ diameterMm: z.number().positive(), name: z.string().min(1), radiusMm: z.number() })
  .refine(({ diameterMm, radiusMm }) => radiusMm <= diameterMm / 2, {
    path: ['radiusMm'],
    error: 'Too large.',
  })

function codeOf(value: unknown): string {
  const parsed = body.safeParse(value)
  if (parsed.success) throw new Error('this was to be refused')
  return bodyProblemCode(parsed.error)
}

describe('a body that cannot be taken', () => {
  it.each([
    ['a text for a number', { diameterMm: '6', name: 'a', radiusMm: 1 }],
    ['a missing field', { diameterMm: 6, radiusMm: 1 }],
    ['an empty name', { diameterMm: 6, name: '', radiusMm: 1 }],
    ['a wrong shape beside an impossible value', { diameterMm: -6, name: 5, radiusMm: 1 }],
  ])('has the wrong shape for %s', (_, value) => {
    expect(codeOf(value)).toBe('wrong-shape')
  })

  it.each([
    ['a negative size', { diameterMm: -6, name: 'a', radiusMm: -9 }],
    ['a radius over half the diameter', { diameterMm: 6, name: 'a', radiusMm: 4 }],
  ])('is impossible for %s', (_, value) => {
    expect(codeOf(value)).toBe('impossible')
  })
})

describe('a problem', () => {
  it('carries status, code, sentence and request id as RFC 9457 says', async () => {
    const response = problemResponse('stale-version', 'Changed meanwhile.', 'r1', {
      extra: { current: { id: '7' } },
    })
    expect(response.status).toBe(409)
    expect(response.headers.get('content-type')).toBe('application/problem+json')
    expect(await response.json()).toMatchObject({
      type: 'about:blank',
      status: 409,
      code: 'stale-version',
      detail: 'Changed meanwhile.',
      requestId: 'r1',
      current: { id: '7' },
    })
  })

  it('never lets further members stand in for its own', async () => {
    const response = problemResponse('not-found', 'Nothing there.', 'r1', {
      extra: { status: 200, code: 'ok' },
    })
    expect(await response.json()).toMatchObject({ status: 404, code: 'not-found' })
  })

  it('names the field a calculation refused', async () => {
    const error = new CoreInputError(
      'not-positive',
      'cutter.cuttingDiameterMm',
      'A diameter must be positive.',
    )
    const response = knownProblemResponse(error, 'r1')
    expect(response?.status).toBe(422)
    expect(await response?.json()).toMatchObject({
      reason: 'not-positive',
      errors: [{ path: 'cutter.cuttingDiameterMm', message: 'A diameter must be positive.' }],
    })
  })

  it('keeps the note of an error for the log', async () => {
    const response = knownProblemResponse(
      new AppError('not-allowed', 'No.', { note: 'user 7 lacks it' }),
      'r1',
    )
    expect(await response?.text()).not.toContain('user 7')
  })

  it('knows nothing of an error of ours', () => {
    expect(knownProblemResponse(new TypeError('x is not a function'), 'r1')).toBeNull()
  })
})
