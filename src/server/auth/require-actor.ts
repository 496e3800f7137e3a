import 'server-only'
import { redirect } from 'next/navigation'
import { cache } from 'react'
import { can, type Permission } from '@/core/policies/permissions'
import type { Actor } from './actor'
import { findActor } from './session'

const currentActor = cache(findActor)

/** The person a page is for; signed out leads to the sign-in page, a missing permission to the page that says so. */
export async function requireActor(permission: Permission = 'see'): Promise<Actor> {
  const actor = await currentActor()
  if (!actor) redirect('/sign-in')
  if (!can(actor.role, permission)) redirect('/not-allowed')
  return actor
}
