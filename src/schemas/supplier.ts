import { z } from 'zod'
import { lineSchema, optionalLineSchema, versionSchema } from './fields'
import { archivedChoices } from './paging'

export const leadTimeDaysSchema = z
  .number('Give the days as a number.')
  .multipleOf(1, 'Only whole days.')
  .min(0, 'Less than 0.')
  .max(3650, 'More than ten years: check the number.')

const emailSchema = z
  .union([z.literal(''), z.email('This is no e-mail address.').max(254, 'At most 254 characters.')])
  .transform((text) => (text === '' ? null : text))
  .nullable()

const supplierFields = {
  name: lineSchema('Give the supplier a name.', 200),
  email: emailSchema,
  phone: optionalLineSchema(100),
  contactName: optionalLineSchema(200),
  /** The shop's own number at the supplier. */
  accountNumber: optionalLineSchema(100),
  leadTimeDays: leadTimeDaysSchema.nullable(),
}

export const createSupplierRequestSchema = z.object({
  name: supplierFields.name,
  email: supplierFields.email.default(null),
  phone: supplierFields.phone.default(null),
  contactName: supplierFields.contactName.default(null),
  accountNumber: supplierFields.accountNumber.default(null),
  leadTimeDays: supplierFields.leadTimeDays.default(null),
})
export type CreateSupplierRequest = z.output<typeof createSupplierRequestSchema>

/** What is absent stays as it was. */
export const updateSupplierRequestSchema = z
  .object(supplierFields)
  .partial()
  .extend({ version: versionSchema, isArchived: z.boolean('Only true or false.').optional() })
export type UpdateSupplierRequest = z.output<typeof updateSupplierRequestSchema>

export const supplierListQuerySchema = z.strictObject({
  archived: z.enum(archivedChoices, 'Only no, only or all.').default('no'),
})

export const supplierResponseSchema = z.object({
  id: z.string(),
  version: z.number(),
  name: z.string(),
  email: z.string().nullable(),
  phone: z.string().nullable(),
  contactName: z.string().nullable(),
  accountNumber: z.string().nullable(),
  leadTimeDays: z.number().nullable(),
  isArchived: z.boolean(),
  /** Reorder points that name it. */
  reorderPoints: z.number(),
})
export type SupplierResponse = z.infer<typeof supplierResponseSchema>
export const supplierListResponseSchema = z.object({ rows: z.array(supplierResponseSchema) })
