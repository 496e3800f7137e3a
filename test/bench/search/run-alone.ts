import { bench } from '../search.bench'

/* `node --import tsx test/bench/search/run-alone.ts` measures the search by itself, without site or database. */

for (const { name, value, unit, limit, sides, note } of await bench.run()) {
  const held = sides ? `  (${sides.ours.toPrecision(3)} / ${sides.other.toPrecision(3)} ${sides.unit})` : ''
  process.stdout.write(
    `${name}: ${value.toPrecision(3)} ${unit} ${limit ? JSON.stringify(limit) : ''}${held}\n`,
  )
  if (note) process.stdout.write(`    ${note}\n`)
}
