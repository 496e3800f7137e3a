import type { Page } from '@playwright/test'
import { expect } from '@playwright/test'
import type { Role } from '@/core/policies/permissions'
import { signedInAs, uniqueCode } from './api'

/**
 * Signs the browser in as someone made for this test alone, working in millimetres: what a test running beside it
 * sets for the demo accounts does not reach them.
 */
export async function signInAsNewPerson(page: Page, role: Role): Promise<void> {
  const admin = await signedInAs('admin')
  const email = `${uniqueCode('person')}@leadline.example`
  const made = await admin.post('/api/users', { email, name: 'Someone New', role })
  const password = uniqueCode('a password of their own')
  const token = String(made.body.link).split('/').at(-1)
  expect((await admin.post('/api/invitations', { token, password })).status).toBe(204)
  const answer = await page.request.post('/api/session', { data: { email, password } })
  expect(answer.status()).toBe(200)
  await page.request.patch('/api/me', { data: { lengthUnit: 'mm' } })
}
