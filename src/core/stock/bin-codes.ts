import { CoreInputError } from '../core-input-error'

/** More at once is a slip of the hand. */
export const mostBinCodes = 2000

interface Part {
  kind: 'letters' | 'digits' | 'between'
  text: string
}

/**
 * The codes of a wall of bins from its first to its last, row by row: each run of letters and each run of digits counts
 * on its own, the last one fastest.
 *
 * Shapes     Both codes have the same parts: `A1` and `F12`, `B-01` and `C-20`. Runs of letters are as long as each
 *            other. A first number with leading zeros keeps its width.
 * Result     1 to 2000 codes, the first one first.
 * Errors     CoreInputError at `first` or `last`: `empty`, `shapes-differ`, `backwards`, `too-many`.
 *
 * @example
 * binCodes('A1', 'B2') // => ['A1', 'A2', 'B1', 'B2']
 * binCodes('C-09', 'C-11') // => ['C-09', 'C-10', 'C-11']
 */
export function binCodes(first: string, last: string): string[] {
  const from = partsOf(first.trim(), 'first', 'The first code')
  const to = partsOf(last.trim(), 'last', 'The last code')
  if (from.length !== to.length || from.some((part, index) => !isSameShape(part, to[index]))) {
    throw new CoreInputError(
      'shapes-differ',
      'last',
      'Both codes need the same pattern of letters and numbers, such as A1 and F12.',
    )
  }
  const runs = from.map((part, index) => ({ part, low: countOf(part), high: countOf(to[index] ?? part) }))
  if (runs.some(({ low, high }) => low > high)) {
    throw new CoreInputError(
      'backwards',
      'last',
      'Every letter and number of the last code is at least the first one’s.',
    )
  }
  const total = runs.reduce((product, { low, high }) => product * (high - low + 1), 1)
  if (total > mostBinCodes) {
    throw new CoreInputError(
      'too-many',
      'last',
      `That is more than ${mostBinCodes} bins at once: make them in parts.`,
    )
  }
  return runs.reduce<string[]>(
    (codes, { part, low, high }) =>
      codes.flatMap((code) =>
        Array.from({ length: high - low + 1 }, (_, step) => `${code}${textOf(part, low + step)}`),
      ),
    [''],
  )
}

function partsOf(code: string, path: string, name: string): Part[] {
  if (code === '') throw new CoreInputError('empty', path, `${name} is missing.`)
  const runs = code.match(/[A-Z]+|[a-z]+|\d{1,9}|[^A-Za-z\d]+/g) ?? []
  return runs.map((text) => {
    if (/^\d/.test(text)) return { kind: 'digits', text }
    return { kind: /^[A-Za-z]/.test(text) ? 'letters' : 'between', text }
  })
}

function isSameShape(part: Part, other: Part | undefined): boolean {
  if (other?.kind !== part.kind) return false
  if (part.kind === 'digits') return true
  if (part.kind === 'between') return part.text === other.text
  return part.text.length === other.text.length && isUpper(part.text) === isUpper(other.text)
}

const isUpper = (text: string) => text === text.toUpperCase()
const alphabet = 26

function countOf({ kind, text }: Part): number {
  if (kind === 'digits') return Number(text)
  if (kind === 'between') return 0
  return [...text.toUpperCase()].reduce((count, letter) => count * alphabet + letter.charCodeAt(0) - 65, 0)
}

function textOf({ kind, text }: Part, count: number): string {
  if (kind === 'between') return text
  if (kind === 'digits')
    return text.startsWith('0') ? String(count).padStart(text.length, '0') : String(count)
  let letters = ''
  for (let rest = count, place = 0; place < text.length; place += 1) {
    letters = String.fromCharCode(65 + (rest % alphabet)) + letters
    rest = Math.floor(rest / alphabet)
  }
  return isUpper(text) ? letters : letters.toLowerCase()
}
