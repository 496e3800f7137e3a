import { z } from 'zod'

/** Ids are 64-bit in the database, strings in JSON, and opaque outside. */
export const idSchema = z.string().regex(/^[1-9]\d{0,17}$/, 'This is not an id.')

export const idParamsSchema = z.object({ id: idSchema })
