/** The address a request came from: the TLS front's word for it where there is one, else the connection's. */
export function remoteAddressOf(request: Request): string {
  const forwarded = request.headers.get('x-forwarded-for')?.split(',').at(-1)?.trim()
  return forwarded || 'unknown'
}
