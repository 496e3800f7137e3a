/** A CSV file to be kept, sent as it is made. The name is made of letters, digits, dots and dashes. */
export function csvResponse({
  fileName,
  body,
}: {
  fileName: string
  body: ReadableStream<Uint8Array>
}): Response {
  return new Response(body, {
    headers: {
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': `attachment; filename="${fileName}"`,
      'cache-control': 'no-store',
      'x-content-type-options': 'nosniff',
    },
  })
}
