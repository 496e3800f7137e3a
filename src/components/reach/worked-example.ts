import type { ReachDraft } from './reach-draft'
import { queryDraft } from './reach-query'
import type { Reading } from './read-field'

/**
 * An eighth-inch cutter with a relieved neck, against a straight wall an inch deep or near it. The case stands in the
 * reference tests; the chuck is an ordinary one, invented.
 */
const exampleQuery = [
  'depth=25',
  'c.form=square&c.DC=3.175&c.APMX=6.35&c.LCF=6.35&c.DN=3&c.LU=38.1&c.DMM=3.175&c.OAL=76.2&c.material=carbide',
  'h.A=100&h.takes=collet&h.series=ER16&h.depth=60&h.grip=20&h.segments=nut:18x28,holder:50x32-36,holder:32x50',
  'k.series=ER16&k.from=3&k.to=4&k.length=27.5',
].join('&')

export function workedExample(reading: Reading): ReachDraft {
  return queryDraft(exampleQuery, reading)
}
