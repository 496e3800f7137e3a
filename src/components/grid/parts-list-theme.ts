import { createPart, themeQuartz } from 'ag-grid-community'

/** Whoever moves by arrow keys sees the whole row they are on, not a cell alone. */
const focusedRow = createPart({
  feature: 'partsListFocusedRow',
  css: '.ag-row-focus { background-color: var(--accent-wash); }',
})

/** What can be typed into is underlined by dots; what was not taken stands out by more than its colour. */
const editedCells = createPart({
  feature: 'partsListEditedCells',
  css: `
    .parts-list-editable { text-decoration: underline dotted var(--ink-soft); text-underline-offset: 4px; }
    .parts-list-refused {
      color: var(--collision); font-weight: 600; box-shadow: inset 0 0 0 2px var(--collision);
      text-decoration: underline wavy var(--collision);
    }
  `,
})

/** A parts list as a drawing office rules it: thin rules, one heavy rule under the headings, no stripes, no boxes. */
export const partsListTheme = themeQuartz
  .withPart(focusedRow)
  .withPart(editedCells)
  .withParams({
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
