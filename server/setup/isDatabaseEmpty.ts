import { withOwner } from './withOwner'

/** Whether no organisation is there yet. */
export async function isDatabaseEmpty(ownerUrl: string): Promise<boolean> {
  const rows = await withOwner(ownerUrl, (owner) => owner.select('SELECT organisation_id FROM organisation LIMIT 1'))
  return rows.length === 0
}
