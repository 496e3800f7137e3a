import Link from 'next/link'

const examples = [
  ['A straight wall, 25 mm deep', 'depth=25'],
  ['A pocket 20 mm deep with 4 mm corners and a square floor', 'depth=20&opening=30&corner=4&floor=0'],
  ['A hole of 6 mm, 20 mm deep', 'feature=hole&diameter=6&depth=20'],
] as const

/** Before anything is asked: what to give, and three questions to try. */
export function SearchStart({ isRefused }: { isRefused: boolean }) {
  return (
    <div className="border-ink bg-sheet flex min-h-72 flex-col items-start justify-center gap-3 border px-6 py-10 sm:px-12">
      <p className="max-w-[46ch] text-lg" role="status">
        {isRefused
          ? 'The crib is searched once the marked field is mended.'
          : 'Give the depth of a wall or hole. The crib is searched for everything that reaches it: what to fetch, from where, and the stick-out to set.'}
      </p>
      <ul className="flex flex-col">
        {examples.map(([words, query]) => (
          <li key={query}>
            <Link
              href={`/search?${query}`}
              className="text-accent flex min-h-11 items-center font-semibold hover:underline"
            >
              {words}
            </Link>
          </li>
        ))}
      </ul>
    </div>
  )
}
