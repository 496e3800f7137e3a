/**
 * A moment as it stands in a book, in the reader's own time zone: day first by size, so that columns sort by eye.
 *
 * @example
 * formatInstant('2026-12-01T11:48:18Z') // => '2026-12-01 11:48' in UTC
 */
export function formatInstant(iso: string): string {
  const moment = new Date(iso)
  const two = (value: number) => String(value).padStart(2, '0')
  const day = `${moment.getFullYear()}-${two(moment.getMonth() + 1)}-${two(moment.getDate())}`
  return `${day} ${two(moment.getHours())}:${two(moment.getMinutes())}`
}
