/**
 * Letters wrong, missing, extra or swapped with their neighbour between two words: the textbook table (Damerau 1964, in
 * the form where no letter is edited twice), with nothing clever about it.
 */
export function editDistance(one: string, other: string): number {
  const from = [...one]
  const to = [...other]
  const table = Array.from({ length: from.length + 1 }, (_, row) =>
    Array.from({ length: to.length + 1 }, (_, column) => (row === 0 ? column : column === 0 ? row : 0)),
  )
  const at = (row: number, column: number) => table[row]?.[column] ?? Number.POSITIVE_INFINITY
  for (let row = 1; row <= from.length; row += 1) {
    for (let column = 1; column <= to.length; column += 1) {
      const isSame = from[row - 1] === to[column - 1]
      let least = Math.min(
        at(row - 1, column) + 1,
        at(row, column - 1) + 1,
        at(row - 1, column - 1) + (isSame ? 0 : 1),
      )
      const isSwapped =
        row > 1 && column > 1 && from[row - 1] === to[column - 2] && from[row - 2] === to[column - 1]
      if (isSwapped) least = Math.min(least, at(row - 2, column - 2) + 1)
      table[row]?.splice(column, 1, least)
    }
  }
  return at(from.length, to.length)
}
