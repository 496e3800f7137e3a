/**
 * Whether a request that changes something may have come from our own pages. No `Origin` at all, as scripts send, is
 * allowed; an origin of elsewhere is not.
 */
export function isSameOrigin(request: Request, publicUrl: string): boolean {
  const origin = request.headers.get('origin')
  if (origin === null) return request.headers.get('sec-fetch-site') !== 'cross-site'
  if (origin === new URL(publicUrl).origin) return true
  const host = request.headers.get('host')
  return host !== null && (origin === `http://${host}` || origin === `https://${host}`)
}
