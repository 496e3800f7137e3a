/** Aborts when somebody presses Ctrl-C, ends this process or closes its terminal; tells so once. */
export function listenForStop(): AbortSignal {
  const controller = new AbortController()
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
    process.on(signal, () => controller.abort())
  }
  // A reader that has gone away (`make start | head`) must not end this process before it has tidied up.
  process.stdout.on('error', () => undefined)
  process.stderr.on('error', () => undefined)
  return controller.signal
}

export function aborted(signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    if (signal.aborted) resolve()
    else signal.addEventListener('abort', () => resolve(), { once: true })
  })
}
