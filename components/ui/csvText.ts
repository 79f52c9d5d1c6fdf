/** What a cell of a CSV may hold; null is an empty cell. */
export type CsvCell = string | number | null

/** First letters that a spreadsheet takes for a formula. */
const FORMULA_START = /^[=+\-@\t\r]/

/**
 * A table as CSV (RFC 4180): commas, CRLF, quotes where they are needed, a byte order mark so that spreadsheets read
 * UTF-8. Numbers keep all their digits and the point, whatever the language. A text that a spreadsheet would run as a
 * formula gets an apostrophe before it.
 *
 * @param rows head and body, cell by cell
 * @example csvText([['material', 'mass_kg'], ['timber', 1290.5]]) // => '\uFEFFmaterial,mass_kg\r\ntimber,1290.5\r\n'
 */
export function csvText(rows: readonly (readonly CsvCell[])[]): string {
  return `\uFEFF${rows.map((row) => `${row.map(cellText).join(',')}\r\n`).join('')}`
}

function cellText(cell: CsvCell): string {
  if (cell === null) return ''
  if (typeof cell === 'number') return Number.isFinite(cell) ? String(cell) : ''
  const safe = FORMULA_START.test(cell) ? `'${cell}` : cell
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe
}
