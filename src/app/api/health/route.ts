import { z } from 'zod'
import { route } from '@/server/http/route'
import { checkHealth } from '@/server/services/health/check-health'

export const GET = route({
  access: 'public',
  answer: z.object({ status: z.literal('ok') }),
  handle: checkHealth,
})
