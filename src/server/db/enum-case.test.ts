import { describe, expect, it } from 'vitest'
import { cutterForms } from '@/core/tooling'
import { enumFromDb, enumToDb } from './enum-case'

describe('an enum on its way to the database and back', () => {
  it('is snake_case there', () => {
    expect(enumToDb('cornerRadius')).toBe('corner_radius')
    expect(enumFromDb('count_adjustment')).toBe('countAdjustment')
  })

  it('comes back as it went', () => {
    for (const form of cutterForms) expect(enumFromDb(enumToDb(form))).toBe(form)
  })
})
