import type { Metadata } from 'next'
import { SignInForm } from '@/components/session/sign-in-form'

export const metadata: Metadata = { title: 'Sign in' }

/** Any origin does: what is asked is whether an address stays within the one it is opened from. */
const here = 'http://here.invalid'

/** Only a path of our own is followed after signing in, read as browsers read it: they drop tabs and turn backslashes. */
function safePath(next: string | string[] | undefined): string {
  if (typeof next !== 'string' || !next.startsWith('/') || !URL.canParse(next, here)) return '/reach'
  const { origin, pathname, search, hash } = new URL(next, here)
  // A path that begins with two slashes would name a host once it stands alone.
  return origin === here && !pathname.startsWith('//') ? pathname + search + hash : '/reach'
}

export default async function SignInPage({
  searchParams,
}: {
  searchParams: Promise<Record<string, string | string[] | undefined>>
}) {
  const { next } = await searchParams
  return <SignInForm nextPath={safePath(next)} />
}
