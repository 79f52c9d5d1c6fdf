import type { Scope } from '@/server/database'
import { notSignedIn } from '@/server/errors'
import type { Account, Role } from '@/shared/schemas/person'

interface AccountRow {
  name: string
  email: string
  roles: Role[]
  language: string
  organisation_name: string
  is_demo: boolean
}

/** The acting person with the organisation, as the device keeps it. */
export async function readAccount(scope: Scope): Promise<Account> {
  const [row] = await scope.select<AccountRow>(
    `SELECT p.name, p.email, p.roles, p.language, o.name AS organisation_name, o.is_demo
     FROM person p JOIN organisation o USING (organisation_id)
     WHERE p.organisation_id = $organisationId AND p.person_id = $personId AND p.status = 'active'`,
    { organisationId: scope.organisationId, personId: scope.personId },
  )
  if (!row) throw notSignedIn()
  return {
    personId: scope.personId,
    organisationId: scope.organisationId,
    organisationName: row.organisation_name,
    isDemo: row.is_demo,
    name: row.name,
    email: row.email,
    roles: row.roles,
    language: row.language,
  }
}
