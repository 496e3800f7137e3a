import { Download } from 'lucide-react'

const examples = [
  ['cutters-inch.csv', 'Cutters in inches: fractions, drill sizes, semicolons, Windows-1252'],
  ['cutters-mm-iso.csv', 'Cutters in mm by ISO 13399 symbols'],
  ['holders-by-segment.csv', 'Holders, one row a segment'],
  ['holders-one-row.csv', 'Holders in inches, nut and body in one row, tabs'],
  ['collets.csv', 'Collets with their range in one column'],
  ['extensions.csv', 'Extensions'],
  ['opening-stock.csv', 'Opening stock of the inch cutters in crib MAIN'],
  ['reorder-points.csv', 'Reorder points of the inch cutters in crib MAIN'],
] as const

/** Files to try the import with, and to copy headings from. */
export function ExampleFiles() {
  return (
    <section aria-labelledby="examples-heading" className="lg:border-hairline lg:border-l lg:pl-8">
      <h2 id="examples-heading" className="text-lg">
        Example files
      </h2>
      <p className="text-ink-soft text-sm">Invented tools under headings as lists really have them.</p>
      <ul className="mt-2">
        {examples.map(([name, description]) => (
          <li key={name} className="border-hairline border-b">
            <a
              href={`/examples/${name}`}
              download
              className="hover:bg-accent-wash flex min-h-11 items-start gap-2.5 py-2"
            >
              <Download aria-hidden="true" className="text-accent mt-0.5 size-5 shrink-0" />
              <span>
                <span className="text-accent block font-semibold break-all">{name}</span>
                <span className="text-ink-soft block text-sm">{description}</span>
              </span>
            </a>
          </li>
        ))}
      </ul>
    </section>
  )
}
