import type { Scope } from '@/server/database'
import { PERSON_COLUMNS, presentPerson, type PersonRow } from '@/server/presenters/presentPerson'
import type { Person, Role } from '@/shared/schemas/person'

/** The people of the organisation by name, all or those with a role. */
export async function listPeople(scope: Scope, role: Role | undefined): Promise<Person[]> {
  const rows = await scope.select<PersonRow>(
    `SELECT ${PERSON_COLUMNS} FROM person
     WHERE organisation_id = $organisationId AND ($role::text IS NULL OR $role = ANY (roles))
     ORDER BY lower(name), person_id`,
    { organisationId: scope.organisationId, role: role ?? null },
  )
  return rows.map(presentPerson)
}
