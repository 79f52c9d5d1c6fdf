/** Ids as one text parameter that PostgreSQL reads as uuid[]; it plans by their number, so few are found by an index. */
export function uuidArray(ids: readonly string[]): string {
  return `{${ids.join(',')}}`
}
