import { createReadStream } from 'node:fs'
import { open } from 'node:fs/promises'

export type TextEncoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252'

const headBytes = 64 * 1024
const pieceBytes = 128 * 1024

/** The first bytes of a file, enough to tell what it is. */
export async function readHead(path: string): Promise<Uint8Array> {
  const file = await open(path)
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(headBytes), 0, headBytes, 0)
    return buffer.subarray(0, bytesRead)
  } finally {
    await file.close()
  }
}

const signatures: readonly (readonly [bytes: readonly number[], name: string])[] = [
  [[0x50, 0x4b, 0x03, 0x04], 'a workbook or a zip archive'],
  [[0xd0, 0xcf, 0x11, 0xe0], 'an old workbook or document'],
  [[0x25, 0x50, 0x44, 0x46], 'a PDF'],
  [[0x89, 0x50, 0x4e, 0x47], 'an image'],
  [[0xff, 0xd8, 0xff], 'an image'],
  [[0x47, 0x49, 0x46, 0x38], 'an image'],
  [[0x1f, 0x8b], 'a compressed file'],
  [[0x37, 0x7a, 0xbc, 0xaf], 'a compressed file'],
]

/** What a file is that is no text, in words; null for what may be text. */
export function nonTextKind(head: Uint8Array): string | null {
  const known = signatures.find(([bytes]) => bytes.every((byte, index) => head[index] === byte))
  if (known) return known[1]
  return wideEncoding(head) === null && head.includes(0) ? 'a file of another kind' : null
}

/** UTF-16 by its mark, or by every second byte being nothing where the text is mostly Latin. */
function wideEncoding(head: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  if (head[0] === 0xff && head[1] === 0xfe) return 'utf-16le'
  if (head[0] === 0xfe && head[1] === 0xff) return 'utf-16be'
  const pairs = Math.floor(head.length / 2)
  let [evenNuls, oddNuls] = [0, 0]
  for (let at = 0; at + 1 < head.length; at += 2) {
    if (head[at] === 0) evenNuls += 1
    if (head[at + 1] === 0) oddNuls += 1
  }
  if (pairs === 0) return null
  if (oddNuls > pairs * 0.4 && evenNuls < pairs * 0.05) return 'utf-16le'
  return evenNuls > pairs * 0.4 && oddNuls < pairs * 0.05 ? 'utf-16be' : null
}

function hasUtf8Mark(head: Uint8Array): boolean {
  return head[0] === 0xef && head[1] === 0xbb && head[2] === 0xbf
}

/**
 * The encoding of a text file: by its mark where it has one, UTF-16 by its look, UTF-8 where every byte of the file
 * fits, else Windows-1252.
 */
export async function detectEncoding(path: string): Promise<TextEncoding> {
  const head = await readHead(path)
  const wide = wideEncoding(head)
  if (wide) return wide
  if (hasUtf8Mark(head)) return 'utf-8'
  return (await isUtf8(path)) ? 'utf-8' : 'windows-1252'
}

async function isUtf8(path: string): Promise<boolean> {
  const decoder = new TextDecoder('utf-8', { fatal: true })
  try {
    for await (const piece of createReadStream(path, { highWaterMark: pieceBytes })) {
      decoder.decode(piece, { stream: true })
    }
    decoder.decode()
    return true
  } catch (error) {
    if (error instanceof TypeError) return false
    throw error
  }
}

/** The encoding as the head alone tells it, for a first look before the whole file is read. */
export function encodingOfHead(head: Uint8Array): TextEncoding {
  const wide = wideEncoding(head)
  if (wide) return wide
  if (hasUtf8Mark(head)) return 'utf-8'
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(head, { stream: true })
    return 'utf-8'
  } catch {
    return 'windows-1252'
  }
}

/** What Windows-1252 has at 0x80 to 0x9f. Node 20's own decoder leaves these as control characters. */
const upperSigns = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ'

function decodeWindows1252(bytes: Uint8Array): string {
  return Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength)
    .toString('latin1')
    .replace(/[\u0080-\u009f]/g, (sign) => upperSigns[sign.charCodeAt(0) - 0x80] ?? sign)
}

/** A decoder that is fed piece by piece; bytes the encoding does not have throw TypeError. */
function pieceDecoder(encoding: TextEncoding, fatal = true): (bytes: Uint8Array | null) => string {
  if (encoding === 'windows-1252') return (bytes) => (bytes ? decodeWindows1252(bytes) : '')
  const decoder = new TextDecoder(encoding, { fatal })
  return (bytes) => (bytes ? decoder.decode(bytes, { stream: true }) : decoder.decode())
}

/** The text of a head, without what was cut in the middle of a character; bytes that are wrong are told when all is read. */
export function decodeHead(head: Uint8Array, encoding: TextEncoding): string {
  return pieceDecoder(encoding, false)(head)
}

/** The text of a file, in pieces; a mark at its beginning is left out. */
export async function* readText(path: string, encoding: TextEncoding): AsyncGenerator<string> {
  const decode = pieceDecoder(encoding)
  for await (const piece of createReadStream(path, { highWaterMark: pieceBytes })) yield decode(piece)
  yield decode(null)
}
