import { z } from 'zod'
import { roles } from '@/core/policies/permissions'
import { lengthUnits } from '@/core/units/length-unit'

const longestPasswordBytes = 72
const textEncoder = new TextEncoder()

/** At least eight characters, no rules of composition; never cut, so what is past bcrypt's 72 bytes is refused. */
export const passwordSchema = z
  .string()
  .min(8, 'A password needs at least 8 characters; 15 or more are better.')
  .refine((text) => textEncoder.encode(text).length <= longestPasswordBytes, {
    error: 'A password may take at most 72 bytes.',
  })

export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'This e-mail address is too long.')
  .pipe(z.email('This is not an e-mail address.'))

export const personNameSchema = z
  .string()
  .trim()
  .min(1, 'A name is needed.')
  .max(200, 'This name is too long.')

export const createPersonRequestSchema = z.object({
  email: emailSchema,
  name: personNameSchema,
  role: z.enum(roles),
  homeCribId: z.string().nullable().optional(),
})
export type CreatePersonRequest = z.output<typeof createPersonRequestSchema>

export const updatePersonRequestSchema = z.object({
  version: z.number().int(),
  name: personNameSchema.optional(),
  role: z.enum(roles).optional(),
  isActive: z.boolean().optional(),
  homeCribId: z.string().nullable().optional(),
})
export type UpdatePersonRequest = z.output<typeof updatePersonRequestSchema>

export const personResponseSchema = z.object({
  id: z.string(),
  version: z.number(),
  name: z.string(),
  email: z.string(),
  role: z.enum(roles),
  isActive: z.boolean(),
  /** False until the invitation was taken up. */
  hasPassword: z.boolean(),
  homeCribId: z.string().nullable(),
  lastSeenAt: z.iso.datetime({ offset: true }).nullable(),
})
export type Person = z.infer<typeof personResponseSchema>

export const personListResponseSchema = z.object({ rows: z.array(personResponseSchema), total: z.number() })

/** The one-time address is shown once; only its hash is kept. */
export const personLinkResponseSchema = z.object({ person: personResponseSchema, link: z.string() })
export type PersonLink = z.infer<typeof personLinkResponseSchema>

export const acceptInvitationRequestSchema = z.object({
  token: z.string().min(1).max(200),
  password: passwordSchema,
})
export type AcceptInvitationRequest = z.output<typeof acceptInvitationRequestSchema>

export const changePasswordRequestSchema = z.object({
  currentPassword: z.string().min(1, 'Type your present password.').max(1000),
  newPassword: passwordSchema,
})
export type ChangePasswordRequest = z.output<typeof changePasswordRequestSchema>

export const setupRequestSchema = z.object({
  token: z.string().min(1).max(200),
  shopName: z.string().trim().min(1, 'The shop needs a name.').max(200),
  currency: z
    .string()
    .trim()
    .toUpperCase()
    .regex(/^[A-Z]{3}$/, 'A currency is three letters, such as EUR or USD.'),
  lengthUnit: z.enum(lengthUnits),
  cribCode: z.string().trim().min(1, 'The crib needs a short code.').max(20),
  cribName: z.string().trim().min(1, 'The crib needs a name.').max(200),
  timeZone: z.string().trim().min(1, 'The crib needs a time zone.').max(100),
  name: personNameSchema,
  email: emailSchema,
  password: passwordSchema,
})
export type SetupRequest = z.output<typeof setupRequestSchema>
