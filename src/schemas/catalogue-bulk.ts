import { z } from 'zod'
import { colletResponseSchema, updateColletRequestSchema } from './collet'
import { cutterResponseSchema, updateCutterRequestSchema } from './cutter'
import { extensionResponseSchema, updateExtensionRequestSchema } from './extension'
import { idSchema } from './fields'
import { fixtureResponseSchema, updateFixtureRequestSchema } from './fixture'
import { holderResponseSchema, updateHolderRequestSchema } from './holder'

/** Rows one request changes at most: what one block of a list holds. */
export const bulkLimit = 500

function bulkSchema<Change extends z.ZodType<{ id: string }>>(change: Change) {
  return z.object({
    changes: z
      .array(change)
      .min(1, 'Name the rows to change.')
      .max(bulkLimit, `At most ${bulkLimit} rows at once.`)
      .refine(
        (changes) => new Set(changes.map(({ id }) => id)).size === changes.length,
        'A row stands here twice.',
      ),
    /** Says what stands against the changes and makes none. */
    isRehearsal: z.boolean('Only true or false.').optional(),
  })
}

/** Changes of many rows, each as a PATCH of it would be: all of them or none. */
export const bulkRequestSchemas = {
  cutter: bulkSchema(updateCutterRequestSchema.extend({ id: idSchema })),
  holder: bulkSchema(updateHolderRequestSchema.extend({ id: idSchema })),
  collet: bulkSchema(updateColletRequestSchema.extend({ id: idSchema })),
  extension: bulkSchema(updateExtensionRequestSchema.extend({ id: idSchema })),
  fixture: bulkSchema(updateFixtureRequestSchema.extend({ id: idSchema })),
}

function rowsSchema<Row extends z.ZodType>(row: Row) {
  return z.object({ rows: z.array(row) })
}

/** The rows as they are now, in the order they were sent. */
export const bulkResponseSchemas = {
  cutter: rowsSchema(cutterResponseSchema),
  holder: rowsSchema(holderResponseSchema),
  collet: rowsSchema(colletResponseSchema),
  extension: rowsSchema(extensionResponseSchema),
  fixture: rowsSchema(fixtureResponseSchema),
}
