import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { ballSpeedRequestSchema } from './ball-speed'
import { plainMessage } from './plain-message'
import { reachRequestSchema } from './reach'

function messages(schema: z.ZodType, value: unknown): Record<string, string> {
  const parsed = schema.safeParse(value, { error: plainMessage })
  return Object.fromEntries(
    (parsed.error?.issues ?? []).map(({ path, message }) => [path.join('.'), message]),
  )
}

describe('a fault that no schema has words for', () => {
  it('is said in plain words', () => {
    const schema = z.object({
      count: z.number(),
      name: z.string(),
      isOpen: z.boolean(),
      rows: z.array(z.string()).max(1),
      form: z.enum(['ball', 'square']),
      shape: z.discriminatedUnion('kind', [z.object({ kind: z.literal('wall') })]),
      share: z.number().positive().max(1),
      more: z.number(),
    })
    expect(
      messages(schema, {
        count: '6',
        name: 6,
        isOpen: 'no',
        rows: ['a', 'b'],
        form: 'round',
        shape: { kind: 'slope' },
        share: 0,
      }),
    ).toEqual({
      count: 'Give a number.',
      name: 'Give a text.',
      isOpen: 'Give true or false.',
      rows: 'At most 1 of them.',
      form: 'Only ball, square.',
      'shape.kind': 'This is none of the kinds there are.',
      share: 'More than 0.',
      more: 'This is missing.',
    })
  })

  it('leaves a schema its own words', () => {
    expect(messages(z.object({ depthMm: z.number('Give a depth.') }), {})).toEqual({
      depthMm: 'Give a depth.',
    })
  })
})

describe('a request of the calculations', () => {
  it('is told what is missing and where, also inside a tool', () => {
    expect(
      messages(reachRequestSchema, { feature: { kind: 'wall', depthMm: 10 }, holder: { segments: 3 } }),
    ).toEqual({
      cutter: 'This is missing.',
      'holder.gaugeLengthMm': 'Give a number.',
      'holder.segments': 'Give a list.',
    })
    expect(messages(ballSpeedRequestSchema, { cuttingDiameterMm: '6', depthOfCutMm: 0.3 })).toEqual({
      cuttingDiameterMm: 'Give a number.',
      tiltDeg: 'This is missing.',
    })
  })
})
