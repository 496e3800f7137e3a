import type { Metadata } from 'next'
import { SignInForm } from '@/components/session/sign-in-form'

export const metadata: Metadata = { title: 'Sign in' }

/** Only a path of our own is followed after signing in. */
function safePath(next: string | string[] | undefined): string {
  return typeof next === 'string' && /^\/(?![/\\])/.test(next) ? next : '/reach'
}

export default async function SignInPage({
  searchParams,
}: {
  searchParams: Promise<Record<string, string | string[] | undefined>>
}) {
  const { next } = await searchParams
  return <SignInForm nextPath={safePath(next)} />
}
