import { z } from 'zod'
import { isoGroups } from '@/core/speeds/iso-groups'
import { substrates } from '@/core/tooling'
import { lineSchema, versionSchema } from './fields'

const speedSchema = z
  .number('Give a cutting speed.')
  .positive('A cutting speed is more than 0.')
  .max(10_000, 'More than 10,000 m/min: check the unit.')

const fields = {
  isoGroup: z.enum(isoGroups, 'Choose one of P, M, K, N, S and H.'),
  material: lineSchema('Name the material.', 200),
  substrate: z.enum(substrates, 'Choose carbide or high-speed steel.'),
  lowMPerMin: speedSchema,
  highMPerMin: speedSchema,
  /** Where the figures come from, and what is doubtful in them. */
  sourceNote: z.string('This is a text.').trim().max(1000, 'At most 1,000 characters.').default(''),
}

function refuseCrossed(range: { lowMPerMin: number; highMPerMin: number }, context: z.RefinementCtx): void {
  if (range.lowMPerMin <= range.highMPerMin) return
  context.addIssue({
    code: 'custom',
    path: ['highMPerMin'],
    message: 'The higher speed is below the lower one.',
  })
}

export const createStartingSpeedRequestSchema = z.object(fields).superRefine(refuseCrossed)
export type CreateStartingSpeedRequest = z.output<typeof createStartingSpeedRequestSchema>

/** The whole row anew, with the version that was read. */
export const updateStartingSpeedRequestSchema = z
  .object({ ...fields, version: versionSchema })
  .superRefine(refuseCrossed)
export type UpdateStartingSpeedRequest = z.output<typeof updateStartingSpeedRequestSchema>

export const startingSpeedResponseSchema = z.object({
  id: z.string(),
  version: z.number(),
  isoGroup: z.enum(isoGroups),
  material: z.string(),
  substrate: z.enum(substrates),
  lowMPerMin: z.number(),
  highMPerMin: z.number(),
  sourceNote: z.string(),
})
export type StartingSpeed = z.infer<typeof startingSpeedResponseSchema>

/** They are few: all of them, by group, material and substrate. */
export const startingSpeedListResponseSchema = z.object({ rows: z.array(startingSpeedResponseSchema) })
