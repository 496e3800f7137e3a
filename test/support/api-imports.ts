import type { Answer, AnswerBody, ApiClient } from './api'

const boundary = 'leadline-test-boundary'

/** An upload as a browser sends it: the parts of a form, the file last. */
export function uploadForm(
  fields: Record<string, string>,
  content: string | null,
): { text: string; headers: Record<string, string> } {
  const parts = Object.entries(fields).map(
    ([name, value]) => `--${boundary}\r\ncontent-disposition: form-data; name="${name}"\r\n\r\n${value}\r\n`,
  )
  if (content !== null) {
    parts.push(
      `--${boundary}\r\ncontent-disposition: form-data; name="file"; filename="list.csv"\r\n` +
        `content-type: text/csv\r\n\r\n${content}\r\n`,
    )
  }
  return {
    text: `${parts.join('')}--${boundary}--\r\n`,
    headers: { 'content-type': `multipart/form-data; boundary=${boundary}` },
  }
}

export function upload(
  client: ApiClient,
  fields: Record<string, string>,
  content: string | null,
): Promise<Answer> {
  return client.send('POST', '/api/imports', uploadForm(fields, content))
}

/** Waits for the worker to bring an import to one of these states. */
export async function importIn(client: ApiClient, id: string, ...states: string[]): Promise<AnswerBody> {
  const end = Date.now() + 50_000
  for (;;) {
    const { status, body } = await client.get(`/api/imports/${id}`)
    if (status !== 200) throw new Error(`Import ${id} answered ${status}.`)
    if (states.includes(String(body.state))) return body
    if (Date.now() > end) throw new Error(`Import ${id} is ${body.state} still: does a worker run?`)
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
}

export async function checkedImport(
  client: ApiClient,
  fields: Record<string, string>,
  content: string,
): Promise<AnswerBody> {
  const { status, body } = await upload(client, fields, content)
  if (status !== 202) throw new Error(`The upload answered ${status}: ${JSON.stringify(body)}`)
  return importIn(client, body.id, 'checked', 'failed')
}
