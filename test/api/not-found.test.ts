import { describe, expect, it } from 'vitest'
import { asNobody } from '../support/api'

describe('an address of the API that is none', () => {
  it.each(['GET', 'POST', 'PUT', 'PATCH', 'DELETE'])(
    'is refused like everything else for %s',
    async (method) => {
      const answer = await asNobody().send(method, '/api/cuters/7')
      expect(answer.status).toBe(404)
      expect(answer.headers.get('content-type')).toContain('application/problem+json')
      expect(answer.body).toMatchObject({ code: 'not-found', status: 404, requestId: expect.any(String) })
    },
  )
})
