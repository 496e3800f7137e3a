import { gzipSync } from 'node:zlib'

export interface ScriptFile {
  url: string
  body: Buffer
}

/** Kilobytes (of 1000 bytes) that these files take on the wire at gzip's usual level, each file counted once. */
export function gzippedKb(files: readonly ScriptFile[]): number {
  const bodies = new Map(files.map(({ url, body }) => [url, body]))
  return [...bodies.values()].reduce((sum, body) => sum + gzipSync(body).length, 0) / 1000
}
