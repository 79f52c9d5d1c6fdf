/** Column a table is sorted by, and which way. */
export interface SortOrder {
  readonly key: string
  readonly direction: 'up' | 'down'
}

/**
 * Rows in the order of one of their values. Equal ones keep their order, null stands last either way.
 *
 * @param sortBy the value a row is placed by: text in the order of the language, numbers by size
 */
export function sortRows<Row>(
  rows: readonly Row[],
  sortBy: (row: Row) => string | number | null,
  direction: 'up' | 'down',
): Row[] {
  const sign = direction === 'up' ? 1 : -1
  return [...rows].sort((one, other) => {
    const [a, b] = [sortBy(one), sortBy(other)]
    if (a === null || b === null) return Number(a === null) - Number(b === null)
    if (typeof a === 'number' && typeof b === 'number') return sign * (a - b)
    return sign * String(a).localeCompare(String(b), undefined, { numeric: true })
  })
}
