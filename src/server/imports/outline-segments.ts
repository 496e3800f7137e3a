import type { RowProblem } from '@/schemas/import'
import type { FlatRecord, FlatSegment } from './flat-values'
import type { ImportRow, RowReader } from './row-reader'

interface Outline {
  segments: FlatSegment[]
  problems: RowProblem[]
}

/** The outline the rows of one holder or extension give, from the nose face up; none where they give none. */
export function outlineSegments(rows: readonly ImportRow[], reader: RowReader, flat: FlatRecord): Outline {
  const ofRows = rows.filter((row) => rowFields.some((field) => row.values.has(field)))
  const ofShape = rows.find((row) => shapeFields.some((field) => row.values.has(field)))
  if (ofRows.length > 0) return segmentRows(ofRows, reader)
  if (ofShape) return shapeSegments(ofShape, reader, flat)
  return { segments: [], problems: [] }
}

const rowFields = ['segmentLengthMm', 'segmentNoseDiameterMm', 'segmentSpindleDiameterMm']
const shapeFields = [
  'nutDiameterMm',
  'nutLengthMm',
  'noseDiameterMm',
  'noseLengthMm',
  'bodyDiameterMm',
  'bodyLengthMm',
]

function segmentRows(rows: readonly ImportRow[], reader: RowReader): Outline {
  const problems: RowProblem[] = []
  const inOrder = reader.has('segmentNumber')
    ? [...rows].sort((a, b) => numberOf(a, 'segmentNumber') - numberOf(b, 'segmentNumber'))
    : rows
  const segments = inOrder.map((row) => {
    for (const [field, what] of neededOfRow) {
      if (!row.values.has(field) && !row.failed.has(field))
        problems.push(reader.problemAt(row, [field], what))
    }
    const nose = numberOf(row, 'segmentNoseDiameterMm')
    return segment(
      reader,
      row.values.get('segmentPart') === 'nut' ? 'nut' : 'holder',
      numberOf(row, 'segmentLengthMm'),
      nose,
      row.values.has('segmentSpindleDiameterMm') ? numberOf(row, 'segmentSpindleDiameterMm') : nose,
    )
  })
  return { segments, problems }
}

const neededOfRow = [
  ['segmentLengthMm', 'Give the length of the segment.'],
  ['segmentNoseDiameterMm', 'Give the diameter at the nose end.'],
] as const

/** Nut or nose first, then the body; a body without a length goes up to the gauge line or the holder's nose. */
function shapeSegments(row: ImportRow, reader: RowReader, flat: FlatRecord): Outline {
  const problems: RowProblem[] = []
  const hasNut = row.values.has('nutDiameterMm') || row.values.has('nutLengthMm')
  const hasNose = row.values.has('noseDiameterMm') || row.values.has('noseLengthMm')
  if (hasNut && hasNose) {
    problems.push(
      reader.problemAt(row, ['noseDiameterMm'], 'Give a nut or a nose, not both, or one row a segment.'),
    )
  }
  const pieces = [
    ...(hasNut ? (['nut'] as const) : []),
    ...(hasNose ? (['nose'] as const) : []),
    ...(row.values.has('bodyDiameterMm') ? (['body'] as const) : []),
  ]
  const wholeMm = Number(flat.gauge_length_mm ?? flat.projection_mm ?? 0)
  let reachedMm = 0
  const segments = pieces.map((piece, index) => {
    const isLast = index === pieces.length - 1
    const restMm = isLast ? Math.max(0, roundMm(wholeMm - reachedMm)) : 0
    const lengthMm = row.values.has(`${piece}LengthMm`) ? numberOf(row, `${piece}LengthMm`) : restMm
    reachedMm += lengthMm
    if (lengthMm === 0)
      problems.push(reader.problemAt(row, [`${piece}LengthMm`], `Give the length of the ${piece}.`))
    if (!row.values.has(`${piece}DiameterMm`)) {
      problems.push(reader.problemAt(row, [`${piece}DiameterMm`], `Give the diameter of the ${piece}.`))
    }
    const diameterMm = numberOf(row, `${piece}DiameterMm`)
    return segment(reader, piece === 'nut' ? 'nut' : 'holder', lengthMm, diameterMm, diameterMm)
  })
  return { segments, problems: row.failed.size > 0 ? [] : problems }
}

function segment(
  reader: RowReader,
  part: 'nut' | 'holder',
  lengthMm: number,
  noseMm: number,
  spindleMm: number,
): FlatSegment {
  const piece = { length_mm: lengthMm, nose_diameter_mm: noseMm, spindle_diameter_mm: spindleMm }
  return reader.settings.kind === 'holders' ? { part, ...piece } : piece
}

function numberOf(row: ImportRow, field: string): number {
  const value = row.values.get(field)
  return typeof value === 'number' ? value : 0
}

/** As lengths are kept, to the nearest 1e-9 mm. */
function roundMm(mm: number): number {
  return Math.round(mm * 1e9) / 1e9
}
