import type { Scope } from '@/server/database'

/**
 * Takes change numbers of the organisation for rows that devices pull. The organisation's row stays locked until the
 * transaction ends, so numbers become visible in their order and no cursor steps over a late commit. Take them as late
 * as possible, once, for all rows; each row that is pulled needs a number of its own.
 *
 * @param count how many, ≥ 1
 * @returns the first of `count` consecutive numbers
 */
export async function takeChangeNumbers(scope: Scope, count: number): Promise<number> {
  const [row] = await scope.select<{ head: string }>(
    'UPDATE organisation SET head = head + $count WHERE organisation_id = $organisationId RETURNING head',
    { organisationId: scope.organisationId, count },
  )
  if (!row) throw new Error('the organisation of the transaction is not there')
  return Number(row.head) - count + 1
}

/**
 * Locks the order of changes without taking a number yet: whoever must read what devices wrote before deciding how many
 * rows change, reads after this.
 */
export async function lockChangeOrder(scope: Scope): Promise<void> {
  // Not FOR UPDATE: rows that refer to the organisation may still be written by others meanwhile.
  await scope.select('SELECT head FROM organisation WHERE organisation_id = $organisationId FOR NO KEY UPDATE', {
    organisationId: scope.organisationId,
  })
}
