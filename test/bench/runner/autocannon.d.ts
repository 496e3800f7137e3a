/** What is used of the load generator; the package brings no types. */
declare module 'autocannon' {
  interface Options {
    url: string
    connections: number
    /** Seconds. */
    duration: number
    headers?: Record<string, string>
  }
  interface Result {
    '2xx': number
    non2xx: number
    errors: number
    timeouts: number
  }
  interface Instance extends Promise<Result> {
    on(
      event: 'response',
      heard: (client: unknown, statusCode: number, bytes: number, responseTimeMs: number) => void,
    ): void
    stop(): void
  }
  export default function autocannon(options: Options): Instance
}
