import { createPart, themeQuartz } from 'ag-grid-community'

/** Whoever moves by arrow keys sees the whole row they are on, not a cell alone. */
const focusedRow = createPart({
  feature: 'partsListFocusedRow',
  css: '.ag-row-focus { background-color: var(--accent-wash); }',
})

/** A parts list as a drawing office rules it: thin rules, one heavy rule under the headings, no stripes, no boxes. */
export const partsListTheme = themeQuartz.withPart(focusedRow).withParams({
  accentColor: 'var(--accent)',
  backgroundColor: 'var(--sheet)',
  foregroundColor: 'var(--ink)',
  borderColor: 'var(--hairline)',
  browserColorScheme: 'inherit',
  fontFamily: 'inherit',
  fontSize: 15,
  headerFontSize: 14,
  headerFontWeight: 600,
  headerTextColor: 'var(--ink)',
  headerBackgroundColor: 'var(--sheet)',
  headerCellHoverBackgroundColor: 'var(--accent-wash)',
  headerRowBorder: { color: 'var(--ink)', width: 2, style: 'solid' },
  headerColumnBorder: { color: 'var(--hairline)', width: 1, style: 'solid' },
  headerColumnBorderHeight: '100%',
  headerColumnResizeHandleColor: 'transparent',
  headerHeight: 44,
  rowHeight: 32,
  rowBorder: { color: 'var(--hairline)', width: 1, style: 'solid' },
  columnBorder: { color: 'var(--hairline)', width: 1, style: 'solid' },
  pinnedColumnBorder: { color: 'var(--ink)', width: 1, style: 'solid' },
  oddRowBackgroundColor: 'var(--sheet)',
  rowHoverColor: 'var(--accent-wash)',
  cellHorizontalPadding: 10,
  wrapperBorder: false,
  wrapperBorderRadius: 0,
  borderRadius: 0,
  iconSize: 14,
  spacing: 6,
  tooltipBackgroundColor: 'var(--ink)',
  tooltipTextColor: 'var(--sheet)',
  tooltipBorder: false,
})

export const partsListThemeForFingers = partsListTheme.withParams({ rowHeight: 44 })
