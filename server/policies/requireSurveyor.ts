import type { Scope } from '@/server/database'
import { unusable } from '@/server/errors'

/**
 * A beat goes only to a surveyor of the organisation whose account is not shut; an invited one may join later.
 *
 * @throws {Refusal} `input-not-usable`
 */
export async function requireSurveyor(scope: Scope, personId: string): Promise<void> {
  const [person] = await scope.select(
    `SELECT person_id FROM person
     WHERE organisation_id = $organisationId AND person_id = $personId
       AND status <> 'disabled' AND 'surveyor' = ANY (roles)`,
    { organisationId: scope.organisationId, personId },
  )
  if (person) return
  throw unusable('A beat can only be given to a surveyor. Nothing was changed; choose one of your surveyors.', [
    { pointer: '/body/surveyorId', code: 'not-a-surveyor', detail: 'no surveyor of the organisation has this id' },
  ])
}
