import 'server-only'
import { headers } from 'next/headers'
import { redirect } from 'next/navigation'
import { cache } from 'react'
import { can, type Permission } from '@/core/policies/permissions'
import type { Actor } from './actor'
import { findActor } from './session'

const currentActor = cache(findActor)

/** The person a page is for; signed out leads to the sign-in page, a missing permission to the page that says so. */
export async function requireActor(permission: Permission = 'see'): Promise<Actor> {
  const actor = await currentActor()
  if (!actor) redirect(await signInAddress())
  if (!can(actor.role, permission)) redirect('/not-allowed')
  return actor
}

/** A session that ended is led back, after signing in, to the page it was asking for; the proxy says which. */
async function signInAddress(): Promise<string> {
  const asked = (await headers()).get('x-asked-page')
  return asked ? `/sign-in?next=${encodeURIComponent(asked)}` : '/sign-in'
}
