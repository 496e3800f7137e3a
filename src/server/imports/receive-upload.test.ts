import { existsSync, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { importLimits } from '@/schemas/import-limits'
import { receiveUpload } from './receive-upload'

const folder = mkdtempSync(join(tmpdir(), 'leadline-upload-'))
const path = join(folder, 'upload.csv')
afterAll(() => rmSync(folder, { recursive: true, force: true }))

/** A form that arrives in network-sized pieces, one after another, without saying how long it is. */
async function slowly(form: FormData): Promise<{ request: Request; sent: () => number }> {
  const whole = new Request('http://127.0.0.1/', { method: 'POST', body: form })
  const bytes = new Uint8Array(await whole.arrayBuffer())
  let at = 0
  const body = new ReadableStream<Uint8Array>({
    pull: async (controller) => {
      await new Promise((resolve) => setImmediate(resolve))
      if (at >= bytes.length) return controller.close()
      controller.enqueue(bytes.subarray(at, at + 65_536))
      at += 65_536
    },
  })
  const headers = { 'content-type': whole.headers.get('content-type') ?? '' }
  const init = { method: 'POST', body, headers, duplex: 'half' }
  return { request: new Request('http://127.0.0.1/', init), sent: () => at }
}

function formOf(content: string, name = 'list.csv'): FormData {
  const form = new FormData()
  form.set('kind', 'cutters')
  form.set('file', new File([content], name))
  form.set('unit', 'in')
  return form
}

describe('an upload', () => {
  it('it is written as it arrives, fields in front of the file and behind it', async () => {
    const { request } = await slowly(formOf('Code;Ø\r\nA;1\r\n'))
    expect(await receiveUpload(request, path)).toEqual({
      fields: { kind: 'cutters', unit: 'in' },
      fileName: 'list.csv',
      fileSizeBytes: 14,
    })
    expect(readFileSync(path, 'utf8')).toBe('Code;Ø\r\nA;1\r\n')
  })

  it('it may be 50 MB, and one byte more is refused before the rest is read', async () => {
    const most = await slowly(formOf('x'.repeat(importLimits.fileBytes)))
    expect((await receiveUpload(most.request, path)).fileSizeBytes).toBe(importLimits.fileBytes)
    expect(statSync(path).size).toBe(importLimits.fileBytes)
    const larger = await slowly(formOf('x'.repeat(importLimits.fileBytes + 1)))
    await expect(receiveUpload(larger.request, path)).rejects.toMatchObject({ code: 'too-large' })
    expect(existsSync(path)).toBe(false)
    const muchLarger = await slowly(formOf('x'.repeat(importLimits.fileBytes + 20_000_000)))
    await expect(receiveUpload(muchLarger.request, path)).rejects.toMatchObject({ code: 'too-large' })
    expect(muchLarger.sent()).toBeLessThan(importLimits.fileBytes + 1_000_000)
    expect(existsSync(path)).toBe(false)
  })

  it('it leaves no file where it breaks off, or has no file', async () => {
    const text = '--b\r\ncontent-disposition: form-data; name="file"; filename="a.csv"\r\n\r\nhalf a fi'
    const headers = { 'content-type': 'multipart/form-data; boundary=b' }
    const broken = new Request('http://127.0.0.1/', { method: 'POST', body: text, headers })
    await expect(receiveUpload(broken, path)).rejects.toMatchObject({ code: 'unreadable-body' })
    expect(existsSync(path)).toBe(false)
    const empty = new FormData()
    empty.set('kind', 'cutters')
    await expect(receiveUpload((await slowly(empty)).request, path)).rejects.toMatchObject({
      code: 'wrong-shape',
    })
    expect(existsSync(path)).toBe(false)
  })

  it('it fails with the cause where the disk does not take it', async () => {
    const { request } = await slowly(formOf('x'.repeat(5_000_000)))
    await expect(receiveUpload(request, join(folder, 'no', 'such', 'folder.csv'))).rejects.toMatchObject({
      code: 'ENOENT',
    })
  })

  it('it is known by a plain name, whatever path it was given', async () => {
    const { request } = await slowly(formOf('a', '..\\..\\x/tools\u0007.csv'))
    expect((await receiveUpload(request, path)).fileName).toBe('tools.csv')
  })
})
