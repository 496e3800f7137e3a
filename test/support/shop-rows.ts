import type { Knex } from 'knex'
import { type ApiClient, uniqueCode } from './api'
import { createCutter, createShelf, putOnShelf, type Shelf } from './api-stock'

export interface NeckedToolRows {
  cutterId: string
  cutterCode: string
  /** Stands in the cutter's description and nowhere else. */
  word: string
  holderId: string
  holderCode: string
  colletId: string
  colletCode: string
  shelf: Shelf
}

/** A word of letters alone that no other row has. */
export function uniqueWord(prefix: string): string {
  const letters = uniqueCode('').replace(/[^0-9a-f]/g, '')
  return prefix + letters.replace(/\d/g, (digit) => 'ghijklmnop'[Number(digit)] ?? digit)
}

/** One letter of a word changed places with the next. */
export function misspelt(word: string): string {
  const at = [...word].findIndex((letter, index) => index > 1 && letter !== word[index + 1])
  return `${word.slice(0, at)}${word[at + 1]}${word[at]}${word.slice(at + 2)}`
}

/** The necked end mill, the chuck and the collet of the hand cases of reach, five of the cutter in bin A-1. */
export async function createNeckedTool(db: Knex, crib: ApiClient): Promise<NeckedToolRows> {
  const [cutterCode, holderCode, colletCode] = [uniqueCode('NECK'), uniqueCode('CHUCK'), uniqueCode('COL')]
  const word = uniqueWord('wolfram')
  const cutterId = await createCutter(crib, {
    code: cutterCode,
    description: `Long ${word}`,
    cuttingDiameterMm: 3.175,
    lengthOfCutMm: 6.35,
    fluteLengthMm: 6.35,
    neckDiameterMm: 3,
    reachLengthMm: 38.1,
    shankDiameterMm: 3.175,
    overallLengthMm: 76.2,
    unitCost: 4321,
  })
  const holder = await crib.post('/api/holders', {
    code: holderCode,
    gaugeLengthMm: 100,
    bore: { kind: 'collet', series: 'ER16' },
    boreDepthMm: 75,
    minimumGripMm: 10,
    segments: [{ part: 'nut', lengthMm: 18, noseDiameterMm: 28, spindleDiameterMm: 28 }],
  })
  const collet = await crib.post('/api/collets', {
    code: colletCode,
    series: 'ER16',
    minimumMm: 3,
    maximumMm: 4,
    lengthMm: 27.5,
    minimumGripMm: 10,
  })
  for (const { status, body } of [holder, collet])
    if (status !== 201) throw new Error(`A row of the test was refused: ${JSON.stringify(body)}`)
  const shelf = await createShelf(crib)
  await putOnShelf(db, crib, { itemId: cutterId, binId: shelf.binId, quantity: 5 })
  const [holderId, colletId] = [holder.body.id, collet.body.id]
  return { cutterId, cutterCode, word, holderId, holderCode, colletId, colletCode, shelf }
}

/** A crib of the test's own, its bins, and the code it is called by. */
export async function createNamedShelf(crib: ApiClient): Promise<Shelf & { cribCode: string }> {
  const shelf = await createShelf(crib)
  const { rows } = (await crib.get('/api/cribs')).body
  const cribCode = rows.find((row) => row.id === shelf.cribId)?.code
  if (!cribCode) throw new Error('The crib of the test is not among the cribs.')
  return { ...shelf, cribCode }
}
