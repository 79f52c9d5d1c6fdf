import type { Scope } from '@/server/database'
import { conflictWith, notFound } from '@/server/errors'

/** Holds a draft to the end of the transaction. @throws {Refusal} `not-found`, `edition-issued` */
export async function lockDraftEdition(scope: Scope, editionId: string): Promise<{ number: number; name: string }> {
  const [row] = await scope.select<{ number: number; name: string; state: string }>(
    `SELECT number, name, state FROM edition
     WHERE organisation_id = $organisationId AND edition_id = $editionId FOR UPDATE`,
    { organisationId: scope.organisationId, editionId },
  )
  if (!row) throw notFound('edition')
  if (row.state === 'issued') {
    throw conflictWith(
      'edition-issued',
      `Edition ${row.number} is issued and never changes. Nothing was changed; make a draft from it and change that.`,
    )
  }
  return row
}
