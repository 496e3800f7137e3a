import { createWriteStream } from 'node:fs'
import { rm } from 'node:fs/promises'
import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { ReadableStream } from 'node:stream/web'
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
  let part: Readable | undefined
  let writing: Promise<void> | undefined
  form.on('field', (name, value) => {
    received.fields[name] = value
  })
  form.on('file', (name, file, fileName) => {
    if (name !== 'file' || writing) {
      file.resume()
      return
    }
    part = file
    received.fileName = plainName(fileName)
    file.on('data', (piece: Buffer) => {
      received.fileSizeBytes += piece.length
    })
    // As soon as it is known, so that the rest of the body is not read at all.
    file.on('limit', () => form.destroy(tooLarge()))
    writing = pipeline(file, createWriteStream(path, { mode: 0o600 }))
    writing.catch(() => undefined)
  })
  try {
    await pipeline(Readable.fromWeb(request.body as ReadableStream), form)
  } catch (error) {
    // The writer must let go of the file before it is removed.
    part?.destroy()
    await writing?.catch(() => undefined)
    if (error instanceof AppError) throw error
    throw new AppError('unreadable-body', 'The upload broke off or is no multipart form.', {
      note: String(error),
    })
  }
  if (!writing) throw noFile()
  await writing
  return received
}

/** The name a person knows the file by: shown, never used as a path. */
function plainName(name: string | undefined): string {
  const base = (name ?? '').split(/[\\/]/).at(-1) ?? ''
  return base.replace(/[\p{Cc}\p{Cs}]/gu, '').slice(0, longestName) || 'file.csv'
}
