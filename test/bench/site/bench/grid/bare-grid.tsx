'use client'

// Registers the modules of the product's grid, whichever those are.
import '@/components/grid/parts-list-grid'
import type { ColDef, IDatasource } from 'ag-grid-community'
import { AgGridReact } from 'ag-grid-react'
import { blockSize } from '@/hooks/use-catalogue-rows'

/** As many columns as the cutter list shows. */
const columns: ColDef[] = [
  'code',
  'form',
  'cutting_diameter_mm',
  'corner_radius_mm',
  'length_of_cut_mm',
  'reach_length_mm',
  'shank_diameter_mm',
  'overall_length_mm',
  'flute_count',
  'taper_half_angle_deg',
  'point_angle_deg',
  'neck_taper_half_angle_deg',
  'neck_transition_angle_deg',
  'maker',
  'part_number',
  'description',
  'unit_cost_minor',
].map((field) => ({ field, colId: field, width: 90 }))

const datasource: IDatasource = {
  getRows: async ({ startRow, successCallback, failCallback }) => {
    const answer = await fetch(`/api/bench/list?view=plain&offset=${startRow}`)
    const answers: Record<string, unknown>[][] = await answer.json()
    const rows = answers.find((one) => one.some((row) => 'cutting_diameter_mm' in row))
    const total = answers.flat().find((row) => typeof row.total === 'number')?.total
    if (rows) successCallback(rows, Number(total))
    else failCallback()
  },
}

/** What the cutters page is held against: the same grid, modules and block, and nothing around it. */
export function BareGrid() {
  return (
    <div style={{ height: '100vh' }}>
      <AgGridReact
        rowModelType="infinite"
        cacheBlockSize={blockSize}
        infiniteInitialRowCount={1}
        datasource={datasource}
        columnDefs={columns}
      />
    </div>
  )
}
