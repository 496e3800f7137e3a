/** Rows one change of everything found touches at most: what can be checked and written down while someone waits. */
export const foundLimit = 10_000

/** Refusals that are told row by row; the others are counted. */
export const listedRefusals = 200

/** Days in which it can be taken back. */
export const foundChangeDays = 30
