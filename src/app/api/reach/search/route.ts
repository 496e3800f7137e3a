import { reachSearchRequestSchema, reachSearchResponseSchema } from '@/schemas/reach-search'
import { route } from '@/server/http/route'
import { searchTools } from '@/server/services/reach-search/search-tools'

export const POST = route({
  access: 'see',
  body: reachSearchRequestSchema,
  answer: reachSearchResponseSchema,
  handle: async ({ actor, body, request }) => {
    const { results, ...totals } = await searchTools(actor, body, request.signal)
    const [only] = results
    return body.features || !only ? { results, ...totals } : { ...only, ...totals }
  },
})
