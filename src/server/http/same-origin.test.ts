import { describe, expect, it } from 'vitest'
import { isSameOrigin } from './same-origin'

const publicUrl = 'https://tools.shop.example'

function requestWith(headers: Record<string, string>): Request {
  return new Request('http://127.0.0.1:3000/api/cutters', { method: 'POST', headers })
}

describe('a request that changes something', () => {
  it.each([
    ['from the public address', { origin: publicUrl }],
    ['from the host it is sent to', { origin: 'http://127.0.0.1:3000', host: '127.0.0.1:3000' }],
    ['from a script, which names no origin', {}],
  ])('is taken %s', (_, headers) => {
    expect(isSameOrigin(requestWith(headers), publicUrl)).toBe(true)
  })

  it.each([
    ['from another site', { origin: 'https://elsewhere.example', host: 'tools.shop.example' }],
    ['from a page that hides its origin', { origin: 'null', host: 'tools.shop.example' }],
    ['from another port of the same machine', { origin: 'http://127.0.0.1:4000', host: '127.0.0.1:3000' }],
    ['that a browser marks as cross-site', { 'sec-fetch-site': 'cross-site' }],
  ])('is refused %s', (_, headers) => {
    expect(isSameOrigin(requestWith(headers), publicUrl)).toBe(false)
  })
})
