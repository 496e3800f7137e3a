import { gzipSync } from 'node:zlib'

export interface ScriptFile {
  url: string
  body: Buffer
}

/** What these files take on the wire at gzip's usual level, each file counted once, in KB of 1024 bytes. */
export function gzippedKb(files: readonly ScriptFile[]): number {
  const bodies = new Map(files.map(({ url, body }) => [url, body]))
  return [...bodies.values()].reduce((sum, body) => sum + gzipSync(body).length, 0) / 1024
}
