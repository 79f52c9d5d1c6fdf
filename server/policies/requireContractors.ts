import type { Scope } from '@/server/database'
import { unusable } from '@/server/errors'

/** What is shown to the yard is shown to contractors only. @throws {Refusal} `input-not-usable` naming who is none */
export async function requireContractors(scope: Scope, recipientIds: readonly string[]): Promise<void> {
  const contractors = await scope.select<{ person_id: string }>(
    `SELECT person_id FROM person WHERE organisation_id = $organisationId AND 'contractor' = ANY(roles) AND status <> 'disabled'`,
    { organisationId: scope.organisationId },
  )
  const known = new Set(contractors.map(({ person_id }) => person_id))
  const faults = recipientIds.flatMap((recipientId, index) =>
    known.has(recipientId)
      ? []
      : [
          {
            pointer: `/body/recipientIds/${index}`,
            code: 'not-a-contractor',
            detail: 'This is no contractor of the organisation.',
          },
        ],
  )
  if (faults.length > 0)
    throw unusable('Only contractors of the organisation can be its readers; nothing was published.', faults)
}
