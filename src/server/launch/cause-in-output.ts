/** Causes that a person can act on, said plainly; each is looked for in the whole output of the failed command. */
const knownCauses: { pattern: RegExp; say: (match: RegExpExecArray) => string }[] = [
  { pattern: /ENOSPC|No space left on device/, say: () => 'the disk is full' },
  { pattern: /EADDRINUSE.*?:(\d+)/, say: ([, port]) => `port ${port} is taken by another program` },
  { pattern: /ECONNREFUSED (\S+:\d+)/, say: ([, address]) => `nothing answers at ${address}` },
  { pattern: /(?:ENOTFOUND|EAI_AGAIN) ([\w.-]+)/, say: ([, host]) => `the host ${host} cannot be found` },
  { pattern: /(?:ETIMEDOUT|EHOSTUNREACH) (\S+:\d+)/, say: ([, address]) => `${address} cannot be reached` },
  { pattern: /^(\S+\(\d+,\d+\)): error TS\d+: (.+)$/m, say: ([, place, fault]) => `${place}: ${fault}` },
]

/** A line that states an error, as Node, PostgreSQL, TypeScript and Next write them. */
const errorLine = /^\W*(?:[A-Za-z]* ?[Ee]rror|FATAL|PANIC)(?: \[\w+\]| \w+\d+)?: *(\S.*)$/m

const noise = /^\s*(?:at |Node\.js v|\^|[{}[\]()]*;?\s*$)/

/** The one line of a failed command's output that best says why it failed, without its full stop. */
export function causeInOutput(output: string): string {
  return (findKnownCause(output) ?? findLine(output) ?? 'it gave no reason')
    .trim()
    .replace(/[\s.]+$/, '')
    .slice(0, 300)
}

function findKnownCause(output: string): string | undefined {
  for (const { pattern, say } of knownCauses) {
    const match = pattern.exec(output)
    if (match) return say(match)
  }
  return undefined
}

function findLine(output: string): string | undefined {
  return errorLine.exec(output)?.[1] ?? output.split('\n').findLast((line) => !noise.test(line))
}
