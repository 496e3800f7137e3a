/** A wrong setting stops the server at start, by name, instead of failing some request later. */
export async function register() {
  if (process.env.NEXT_RUNTIME === 'nodejs') {
    const { env } = await import('./server/env')
    env()
  }
}
