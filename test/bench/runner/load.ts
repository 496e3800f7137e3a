import autocannon from 'autocannon'

const connections = 10

/** How long each answer took while ten connections asked for so many seconds, ms; any refused answer ends the bench. */
export async function answerTimes(
  url: string,
  headers: Record<string, string>,
  seconds: number,
): Promise<number[]> {
  const times: number[] = []
  const load = autocannon({ url, connections, duration: seconds, headers })
  load.on('response', (_client, _status, _bytes, responseTimeMs) => times.push(responseTimeMs))
  const { non2xx, errors, timeouts } = await load
  if (non2xx + errors + timeouts > 0)
    throw new Error(`${url}: ${non2xx} answers refused, ${errors} errors, ${timeouts} timed out.`)
  return times
}
