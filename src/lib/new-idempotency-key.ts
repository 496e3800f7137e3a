/**
 * A key no other call has, to be made once for what a person means to do once. `crypto.randomUUID` is not there on a
 * shop's plain http network; this is.
 */
export function newIdempotencyKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('')
}
