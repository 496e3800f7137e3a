import { readFileSync } from 'node:fs'

/** An example file as it lies there, byte for byte, made this test's own: its codes and its makers. */
export function exampleFile(
  name: string,
  mark: string,
): { content: string; toBuffer: (content: string) => Buffer } {
  // As one byte a character, whatever the file's encoding is, so that it goes up again as it is.
  const text = readFileSync(new URL(`../../public/examples/${name}`, import.meta.url), 'latin1')
  const content = text
    .replace(/^EX-/gm, `${mark}-`)
    .replace(/Brackwater Tool|Quillon|Elvered|Tallow Drill/g, mark)
  return { content, toBuffer: (changed) => Buffer.from(changed, 'latin1') }
}
