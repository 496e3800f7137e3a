export interface ScanCodeProps {
  /** What a scanner reads out of it. */
  text: string
  /** Modules a side, the quiet zone left out. */
  size: number
  /** The dark modules, row by row: `1` is dark. */
  rows: readonly string[]
}

/** One module of rest all round is what the code asks for; two are kinder to a cheap reader. */
const quietModules = 2

/** A Data Matrix as sharp as the paper: every dark module a square of the one path. */
export function ScanCode({ text, size, rows }: ScanCodeProps) {
  const whole = size + 2 * quietModules
  const path = rows
    .flatMap((row, y) =>
      [...row].map((module, x) => (module === '1' ? `M${x + quietModules} ${y + quietModules}h1v1h-1z` : '')),
    )
    .join('')
  return (
    <svg
      role="img"
      aria-label={`Code to scan: ${text}`}
      viewBox={`0 0 ${whole} ${whole}`}
      shapeRendering="crispEdges"
      className="block h-auto w-full"
    >
      <rect width={whole} height={whole} fill="#fff" />
      <path d={path} fill="#000" />
    </svg>
  )
}
