import { cribMemberParamsSchema } from '@/schemas/crib-member'
import { route } from '@/server/http/route'
import { addCribMember, removeCribMember } from '@/server/services/locations/crib-members'

/** Makes a person a member, who gets the crib's mail; again changes nothing. */
export const PUT = route({
  access: 'keepCrib',
  params: cribMemberParamsSchema,
  answer: null,
  handle: ({ actor, params }) => addCribMember(actor, params),
})

export const DELETE = route({
  access: 'keepCrib',
  params: cribMemberParamsSchema,
  answer: null,
  handle: ({ actor, params }) => removeCribMember(actor, params),
})
