import { once } from 'node:events'
import { createWriteStream } from 'node:fs'
import { rm } from 'node:fs/promises'
import type { Writable } from 'node:stream'
import { finished, pipeline } from 'node:stream/promises'
import { Busboy } from '@fastify/busboy'
import { AppError } from '@/lib/app-error'
import { fileLimitText, importLimits } from '@/schemas/import-limits'

export interface ReceivedUpload {
  fields: Record<string, string>
  fileName: string
  fileSizeBytes: number
}

/** Room for the form's other parts and their envelopes. */
const envelopeBytes = 2_000_000
const longestName = 255

const tooLarge = () =>
  new AppError('too-large', `This file is larger than ${fileLimitText}. Split it and upload the parts.`, {
    errors: [{ path: 'file', message: `At most ${fileLimitText}.` }],
  })

const noFile = () =>
  new AppError('wrong-shape', 'Send the file as the part “file” of a multipart form.', {
    errors: [{ path: 'file', message: 'Choose a file.' }],
  })

/**
 * Takes a multipart form apart while it arrives and writes its part `file` to `path`, never holding more than a piece of
 * it. Whatever goes wrong, the file is gone again.
 */
export async function receiveUpload(request: Request, path: string): Promise<ReceivedUpload> {
  if (Number(request.headers.get('content-length') ?? 0) > importLimits.fileBytes + envelopeBytes)
    throw tooLarge()
  try {
    return await receive(request, path)
  } catch (error) {
    await rm(path, { force: true })
    throw error
  }
}

async function receive(request: Request, path: string): Promise<ReceivedUpload> {
  const contentType = request.headers.get('content-type') ?? ''
  if (!/^multipart\/form-data;.*boundary=/i.test(contentType) || !request.body) throw noFile()
  const form = new Busboy({
    headers: { 'content-type': contentType },
    limits: { fileSize: importLimits.fileBytes, files: 1, fields: 20, fieldSize: 500_000 },
  })
  const received: ReceivedUpload = { fields: {}, fileName: '', fileSizeBytes: 0 }
  const stop = new AbortController()
  let sink: Writable | undefined
  let writing: Promise<void> | undefined
  form.on('field', (name, value) => {
    received.fields[name] = value
  })
  form.on('file', (name, file, fileName) => {
    if (name !== 'file' || writing) {
      file.resume()
      return
    }
    received.fileName = plainName(fileName)
    file.on('data', (piece: Buffer) => {
      received.fileSizeBytes += piece.length
    })
    // As soon as it is known, so that the rest of the body is not read at all.
    file.on('limit', () => stop.abort(tooLarge()))
    sink = createWriteStream(path, { mode: 0o600 })
    writing = pipeline(file, sink)
    // A fault of the disk; one of the form is told by the form.
    writing.catch((error: Error) => {
      if ('syscall' in error) stop.abort(error)
    })
  })
  try {
    await feed(form, request.body, stop.signal)
  } catch (error) {
    const { aborted, reason } = stop.signal
    // The writer must let go of the file before it is removed.
    if (sink) await closed(sink)
    if (aborted) throw reason
    throw new AppError('unreadable-body', 'The upload broke off or is no multipart form.', {
      note: String(error),
    })
  }
  if (!writing) throw noFile()
  await writing
  return received
}

async function closed(stream: Writable): Promise<void> {
  stream.destroy()
  if (!stream.closed) await new Promise((resolve) => stream.once('close', resolve))
}

/**
 * Writes the body into the form piece by piece, waiting where the disk is slower. At a fault it stops reading and leaves
 * the rest to the server, which passes over it: cancelling the body of a request may never come to an end.
 */
async function feed(form: Writable, body: ReadableStream<Uint8Array>, signal: AbortSignal): Promise<void> {
  const ended = finished(form, { signal })
  ended.catch(() => undefined)
  const reader = body.getReader()
  for (;;) {
    signal.throwIfAborted()
    const { done, value } = await reader.read()
    if (done) break
    if (!form.write(value)) await Promise.race([once(form, 'drain', { signal }), ended])
  }
  form.end()
  await ended
}

/** The name a person knows the file by: shown, never used as a path. */
function plainName(name: string | undefined): string {
  const base = (name ?? '').split(/[\\/]/).at(-1) ?? ''
  return base.replace(/[\p{Cc}\p{Cs}]/gu, '').slice(0, longestName) || 'file.csv'
}
