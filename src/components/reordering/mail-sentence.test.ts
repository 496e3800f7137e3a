import { expect, test } from 'vitest'
import { mailSentence } from './alerts-page'

test('it claims a mail only where there is a server that can send one', () => {
  expect(mailSentence(true)).toBe('A mail goes to the crib’s members when it happens.')
  expect(mailSentence(false)).toBe('No mail server is set, so nobody is mailed: look here.')
})
