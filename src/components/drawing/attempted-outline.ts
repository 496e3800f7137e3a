import { CoreInputError } from '@/core/core-input-error'
import type { OutlinePart } from '@/core/outline/types'

export type AttemptedOutline = { parts: OutlinePart[]; reason: null } | { parts: null; reason: string }

/** An outline, or in one sentence why these dimensions make none, as they may while someone is still typing. */
export function attemptedOutline(outline: () => OutlinePart[]): AttemptedOutline {
  try {
    return { parts: outline(), reason: null }
  } catch (error) {
    if (error instanceof CoreInputError) return { parts: null, reason: error.message }
    throw error
  }
}
