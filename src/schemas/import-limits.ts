/** What a file may be at most. One place for the page that says so, the route and the reader that hold to it. */
export const importLimits = {
  fileBytes: 50 * 1024 * 1024,
  columns: 200,
  cellCharacters: 10_000,
} as const

/** How many rejects and warnings an import's answer carries; the rest is in its rows and its reject file. */
export const listedProblems = 200

export const fileLimitText = '50 MB'
