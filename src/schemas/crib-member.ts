import { z } from 'zod'
import { roles } from '@/core/policies/permissions'
import { idSchema } from './fields'

export const cribMemberParamsSchema = z.object({ id: idSchema, userId: idSchema })

/** Someone who may be a member of a crib, and whether they are: members get its mail. */
export const cribMemberSchema = z.object({
  userId: z.string(),
  name: z.string(),
  email: z.string(),
  role: z.enum(roles),
  isMember: z.boolean(),
})
export type CribMember = z.infer<typeof cribMemberSchema>

export const cribMemberListResponseSchema = z.object({ rows: z.array(cribMemberSchema) })
