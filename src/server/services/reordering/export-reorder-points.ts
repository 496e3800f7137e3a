import type { ReorderPointSelection } from '@/schemas/reordering'
import { db } from '../../db/connection'
import { readAllReorderPointKeys, readReorderPointRows } from '../../db/read-models/reorder-point-rows'
import { readShopSettings } from '../../db/stores/shop-settings-store'
import { ReorderPointFile } from '../../imports/reorder-point-file'

const rowsAPiece = 500

/** All rows a list shows, in its order, as CSV that the import takes back without changing anything. */
export async function exportReorderPoints(
  query: ReorderPointSelection,
): Promise<{ fileName: string; body: ReadableStream<Uint8Array> }> {
  const file = new ReorderPointFile((await readShopSettings(db())).decimalComma)
  const keys = await readAllReorderPointKeys(db(), query)
  const encoder = new TextEncoder()
  let done = 0
  const body = new ReadableStream<Uint8Array>({
    start: (controller) => controller.enqueue(encoder.encode(file.headings())),
    pull: async (controller) => {
      const rows = await readReorderPointRows(db(), keys.slice(done, done + rowsAPiece))
      done += rowsAPiece
      if (rows.length > 0) controller.enqueue(encoder.encode(rows.map((row) => file.row(row)).join('')))
      if (done >= keys.length) controller.close()
    },
  })
  return { fileName: 'reorder-points.csv', body }
}
