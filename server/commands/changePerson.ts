import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { conflictWith, notFound } from '@/server/errors'
import { refuseLastSteward, type PersonChange } from '@/server/policies/refuseLastSteward'
import { PERSON_COLUMNS, presentPerson, type PersonRow } from '@/server/presenters/presentPerson'
import type { Person } from '@/shared/schemas/person'
import { recordAudit } from './recordAudit'

/**
 * Changes roles, or shuts and opens an account. Shutting it ends every session at once; what lies on the person's
 * devices stays there.
 *
 * @throws {Refusal} `not-found`, `last-steward`, `not-joined-yet`
 */
export async function changePerson(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  personId: string,
  change: PersonChange,
): Promise<Person> {
  return database.withScope(actor, async (scope) => {
    const before = await lockPerson(scope, personId)
    refuseLastSteward(before, change, await countOtherStewards(scope, personId))
    if (change.status === 'active' && before.status === 'invited') throw notJoinedYet()
    const [row] = await scope.select<PersonRow>(
      `UPDATE person SET status = $status,
         roles = (SELECT array_agg(role) FROM json_array_elements_text($roles::json) AS role)
       WHERE organisation_id = $organisationId AND person_id = $personId
       RETURNING ${PERSON_COLUMNS}`,
      {
        organisationId: scope.organisationId,
        personId,
        status: statusAfter(before, change),
        roles: JSON.stringify([...new Set(change.roles ?? before.roles)]),
      },
    )
    if (!row) throw notFound('person')
    if (row.status === 'disabled') await endSessions(scope, personId, now())
    await recordAudit(scope, {
      action: 'person-changed',
      subjectType: 'person',
      subjectId: personId,
      detail: { from: { roles: before.roles, status: before.status }, to: { roles: row.roles, status: row.status } },
    })
    return presentPerson(row)
  })
}

type LockedPerson = PersonRow & { has_password: boolean }

/** All stewards are locked with the person, in one order, so that two of them cannot disable each other. */
async function lockPerson(scope: Scope, personId: string): Promise<LockedPerson> {
  const rows = await scope.select<LockedPerson>(
    `SELECT ${PERSON_COLUMNS}, password_hash IS NOT NULL AS has_password FROM person
     WHERE organisation_id = $organisationId AND (person_id = $personId OR 'steward' = ANY (roles))
     ORDER BY person_id FOR UPDATE`,
    { organisationId: scope.organisationId, personId },
  )
  const person = rows.find((row) => row.person_id === personId)
  if (!person) throw notFound('person')
  return person
}

async function countOtherStewards(scope: Scope, personId: string): Promise<number> {
  const rows = await scope.select(
    `SELECT person_id FROM person
     WHERE organisation_id = $organisationId AND person_id <> $personId AND status = 'active' AND 'steward' = ANY (roles)`,
    { organisationId: scope.organisationId, personId },
  )
  return rows.length
}

/** Opening an account that was shut before its person joined leaves it invited. */
function statusAfter(before: LockedPerson, change: PersonChange): string {
  if (change.status === 'active' && !before.has_password) return 'invited'
  return change.status ?? before.status
}

async function endSessions(scope: Scope, personId: string, now: Date): Promise<void> {
  await scope.execute(
    `UPDATE session SET revoked_at = $now, revoked_because = 'account-disabled'
     WHERE organisation_id = $organisationId AND person_id = $personId AND revoked_at IS NULL`,
    { organisationId: scope.organisationId, personId, now },
  )
}

const notJoinedYet = () =>
  conflictWith(
    'not-joined-yet',
    'This person has not joined yet. Nothing was changed; send the invitation again instead.',
  )
