/** How many groups there are, as a sentence. */
export function groupsText(total: number, many: string): string {
  return total === 1
    ? `1 group of ${many} measures the same.`
    : `${total} groups of ${many} measure the same.`
}
