import { cribMemberListResponseSchema } from '@/schemas/crib-member'
import { idParamsSchema } from '@/schemas/fields'
import { route } from '@/server/http/route'
import { listCribMembers } from '@/server/services/locations/crib-members'

export const GET = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: cribMemberListResponseSchema,
  handle: ({ params }) => listCribMembers(params.id),
})
