import type { z } from 'zod'

const wanted: Readonly<Record<string, string>> = {
  number: 'Give a number.',
  int: 'Give a whole number.',
  string: 'Give a text.',
  boolean: 'Give true or false.',
  array: 'Give a list.',
  object: 'Give an object.',
  record: 'Give an object.',
}

/** What is wrong in the words of this house, where a schema has none of its own. */
export function plainMessage(issue: z.core.$ZodRawIssue): string | undefined {
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined ? 'This is missing.' : wanted[issue.expected]
    case 'invalid_value':
      return issue.input === undefined ? 'This is missing.' : `Only ${issue.values.map(String).join(', ')}.`
    case 'invalid_union':
      return 'This is none of the kinds there are.'
    case 'too_small':
      return boundMessage(issue.origin, issue.inclusive ? 'At least' : 'More than', issue.minimum)
    case 'too_big':
      return boundMessage(issue.origin, issue.inclusive ? 'At most' : 'Less than', issue.maximum)
    default:
      return undefined
  }
}

function boundMessage(origin: string, words: string, bound: number | bigint): string {
  if (origin === 'string') return `${words} ${bound} characters.`
  return origin === 'array' ? `${words} ${bound} of them.` : `${words} ${bound}.`
}
