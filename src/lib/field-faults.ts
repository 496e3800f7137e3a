import { ApiError } from './api-client'

/** What the server says of each field, by path; empty where it named none. */
export function fieldFaults(error: unknown): Record<string, string> {
  if (!(error instanceof ApiError)) return {}
  return Object.fromEntries(error.fieldProblems.map(({ path, message }) => [path, message]))
}

/** The sentence of an error that stands beside no field. */
export function faultSentence(error: unknown): string {
  return error instanceof Error ? error.message : 'This failed; nothing was changed.'
}
