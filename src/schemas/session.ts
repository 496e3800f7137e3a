import { z } from 'zod'
import { roles } from '@/core/policies/permissions'
import { lengthUnits } from '@/core/units/length-unit'

export const createSessionRequestSchema = z.object({
  email: z.string().trim().min(1, 'Type your e-mail address.').max(320),
  password: z.string().min(1, 'Type your password.').max(1000),
})
export type CreateSessionRequest = z.infer<typeof createSessionRequestSchema>

export const sessionUserSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  role: z.enum(roles),
  locationId: z.string(),
})

export const sessionResponseSchema = z.object({ user: sessionUserSchema })

/** Null follows the shop's unit. */
export const updateMeRequestSchema = z.object({ lengthUnit: z.enum(lengthUnits).nullable() })
export const meResponseSchema = sessionUserSchema.extend({ lengthUnit: z.enum(lengthUnits).nullable() })
