import type { Role } from '@/core/policies/permissions'
import { asNobody, signedInAs, uniqueCode } from './api'

export interface TestPerson {
  id: string
  name: string
  email: string
  password: string
}

const password = 'a password of the tests'

/** A person of the test's own, added by the admin and let in by the one-time address, as a shop would do it. */
export async function createPerson(role: Role): Promise<TestPerson> {
  const admin = await signedInAs('admin')
  const name = uniqueCode('Person')
  const email = `${name.toLowerCase()}@leadline.example`
  const added = await admin.post('/api/users', { name, email, role })
  if (added.status !== 201) throw new Error(`Adding ${email} answered ${added.status}.`)
  const token = new URL(String(added.body.link)).pathname.split('/').at(-1)
  const accepted = await asNobody().post('/api/invitations', { token, password })
  if (accepted.status >= 300) throw new Error(`The invitation of ${email} answered ${accepted.status}.`)
  const { id } = added.body.person as { id: string }
  return { id, name, email, password }
}
