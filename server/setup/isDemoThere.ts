import { withOwner } from './withOwner'

/** Whether the invented town is in this database. */
export async function isDemoThere(ownerUrl: string): Promise<boolean> {
  const rows = await withOwner(ownerUrl, (owner) =>
    owner.select('SELECT organisation_id FROM organisation WHERE is_demo LIMIT 1'),
  )
  return rows.length > 0
}
