type Cell = string | number | boolean | null

/**
 * Rows of the factor book for a CSV file with all digits: one column for each field, in the order of the first row.
 *
 * @param rows flat rows of one kind
 * @returns the head and the rows; nothing without rows
 * @example factorCsvRows([{ code: '17 01 01', isHazardous: false }]) // => [['code', 'isHazardous'], ['17 01 01', 'no']]
 */
export function factorCsvRows<Row extends { readonly [Field in keyof Row]: Cell }>(
  rows: readonly Row[],
): (string | number | null)[][] {
  const first = rows[0]
  if (!first) return []
  const fields = Object.keys(first).filter((field): field is Extract<keyof Row, string> => field in first)
  return [fields, ...rows.map((row) => fields.map((field) => written(row[field])))]
}

function written(cell: Cell): string | number | null {
  return typeof cell === 'boolean' ? (cell ? 'yes' : 'no') : cell
}
