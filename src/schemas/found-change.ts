import { z } from 'zod'
import { catalogueKinds } from '@/core/stock/kinds'
import { catalogueFilterSchemas } from './catalogue-counts'
import { updateColletRequestSchema } from './collet'
import { updateCutterRequestSchema } from './cutter'
import { updateExtensionRequestSchema } from './extension'
import { updateFixtureRequestSchema } from './fixture'
import { updateHolderRequestSchema } from './holder'

/** An item's own code is no value for many; a bore and an outline are more than one field. */
const notOfMany = { version: true, archivedAt: true, code: true } as const

const oneField = (change: object) => Object.values(change).filter((value) => value !== undefined).length === 1

const changeSchemas = {
  cutter: updateCutterRequestSchema.omit(notOfMany).refine(oneField, 'Change exactly one field.'),
  holder: updateHolderRequestSchema
    .omit({ ...notOfMany, bore: true, segments: true })
    .refine(oneField, 'Change exactly one field.'),
  collet: updateColletRequestSchema.omit(notOfMany).refine(oneField, 'Change exactly one field.'),
  extension: updateExtensionRequestSchema
    .omit({ ...notOfMany, bore: true, segments: true })
    .refine(oneField, 'Change exactly one field.'),
  fixture: updateFixtureRequestSchema.omit(notOfMany).refine(oneField, 'Change exactly one field.'),
}

function rehearsalSchema<Filters extends z.ZodType, Change extends z.ZodType>(
  filters: Filters,
  change: Change,
) {
  return z.object({ filters, change })
}

/** The filters are those of the list, as its address has them. */
export const foundRehearsalRequestSchemas = {
  cutter: rehearsalSchema(catalogueFilterSchemas.cutter, changeSchemas.cutter),
  holder: rehearsalSchema(catalogueFilterSchemas.holder, changeSchemas.holder),
  collet: rehearsalSchema(catalogueFilterSchemas.collet, changeSchemas.collet),
  extension: rehearsalSchema(catalogueFilterSchemas.extension, changeSchemas.extension),
  fixture: rehearsalSchema(catalogueFilterSchemas.fixture, changeSchemas.fixture),
}

/** What the rehearsal answered, sent back: only the rows it was about, as they were, are changed. */
const seen = {
  total: z.int('Send the total of the rehearsal.').min(1, 'Nothing was found.'),
  mark: z.string('Send the mark of the rehearsal.').max(100),
}

export const foundChangeRequestSchemas = {
  cutter: foundRehearsalRequestSchemas.cutter.extend(seen),
  holder: foundRehearsalRequestSchemas.holder.extend(seen),
  collet: foundRehearsalRequestSchemas.collet.extend(seen),
  extension: foundRehearsalRequestSchemas.extension.extend(seen),
  fixture: foundRehearsalRequestSchemas.fixture.extend(seen),
}

export interface FoundRehearsalRequest {
  filters: Record<string, unknown>
  change: Record<string, unknown>
}

export type FoundChangeRequest = FoundRehearsalRequest & { total: number; mark: string }

export const foundRefusalSchema = z.object({
  id: z.string(),
  code: z.string(),
  /** The field it is about, which need not be the one changed. */
  path: z.string(),
  message: z.string(),
})

export const foundRehearsalResponseSchema = z.object({
  total: z.number(),
  /** Rows that would change, and those that have the value already. */
  changed: z.number(),
  unchanged: z.number(),
  refusedCount: z.number(),
  refused: z.array(foundRefusalSchema),
  /** Names these rows as they are; another set or another version of one has another. */
  mark: z.string(),
})
export type FoundRehearsal = z.infer<typeof foundRehearsalResponseSchema>

export const foundChangeResponseSchema = z.object({
  id: z.string(),
  kind: z.enum(catalogueKinds),
  field: z.string(),
  value: z.union([z.string(), z.number(), z.null()]),
  /** Rows it changed. */
  count: z.number(),
  changedAt: z.iso.datetime(),
})
export type FoundChange = z.infer<typeof foundChangeResponseSchema>

export const foundChangeListQuerySchema = z.strictObject({ kind: z.enum(catalogueKinds, 'Which list?') })
export const foundChangeListResponseSchema = z.object({ rows: z.array(foundChangeResponseSchema) })
