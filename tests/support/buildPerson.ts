import { randomUUID } from 'node:crypto'
import { hashPassword } from '@/server/auth/hashPassword'
import type { Role } from '@/shared/schemas/person'
import { buildOrganisation } from './buildOrganisation'
import type { TestApp } from './createTestApp'

export interface TestPerson {
  readonly organisationId: string
  readonly personId: string
  readonly email: string
  readonly name: string
  readonly roles: readonly Role[]
}

export const TEST_PASSWORD = 'rope walk kiln upper fold'
let hashOfTestPassword: Promise<string> | undefined

/**
 * A person who may sign in with {@link TEST_PASSWORD}; in a new organisation when none is given.
 */
export async function buildPerson(
  testApp: Pick<TestApp, 'owner'>,
  overrides: Partial<TestPerson> & { status?: 'invited' | 'active' | 'disabled'; firm?: string } = {},
): Promise<TestPerson> {
  const organisationId = overrides.organisationId ?? (await buildOrganisation(testApp)).organisationId
  const person = drawPerson(organisationId, overrides)
  const status = overrides.status ?? 'active'
  hashOfTestPassword ??= hashPassword(TEST_PASSWORD)
  await testApp.owner.run(
    `INSERT INTO person (organisation_id, person_id, email, name, firm, password_hash, roles, status)
     VALUES ($organisationId, $personId, $email, $name, $firm, $passwordHash,
       (SELECT array_agg(role) FROM json_array_elements_text($roles::json) AS role), $status)`,
    {
      ...person,
      firm: overrides.firm ?? null,
      passwordHash: status === 'invited' ? null : await hashOfTestPassword,
      roles: JSON.stringify(person.roles),
      status,
    },
  )
  return person
}

function drawPerson(organisationId: string, overrides: Partial<TestPerson>): TestPerson {
  const personId = overrides.personId ?? randomUUID()
  return {
    organisationId,
    personId,
    email: overrides.email ?? `person-${personId}@ferrow.invalid`,
    name: overrides.name ?? 'Ines Varga',
    roles: overrides.roles ?? ['surveyor'],
  }
}
