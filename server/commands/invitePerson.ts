import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { conflictWith } from '@/server/errors'
import { PERSON_COLUMNS, presentPerson, type PersonRow } from '@/server/presenters/presentPerson'
import type { invitation, Person } from '@/shared/schemas/person'
import { recordAudit } from './recordAudit'

type Invitation = z.output<typeof invitation>

/**
 * Adds a person who has not joined yet and mails the link. Inviting the same address again before it has joined
 * corrects name and roles and sends a new link.
 *
 * @throws {Refusal} `address-taken`
 */
export async function invitePerson(
  { database, queue }: Pick<Context, 'database' | 'queue'>,
  actor: Actor,
  offer: Invitation,
): Promise<Person> {
  const row = await database.withScope(actor, (scope) => addInvited(scope, offer))
  await queue.send('send-link', {
    organisationId: actor.organisationId,
    personId: row.person_id,
    purpose: 'invitation',
  })
  return presentPerson(row)
}

async function addInvited(scope: Scope, offer: Invitation): Promise<PersonRow> {
  const { organisationId } = scope
  const columns = { organisationId, email: offer.email, name: offer.name, firm: offer.firm }
  const roles = JSON.stringify([...new Set(offer.roles)])
  const [again] = await scope.select<PersonRow>(
    `UPDATE person SET name = $name, firm = $firm, roles = ${ROLES_OF_JSON}
     WHERE organisation_id = $organisationId AND lower(email) = $email AND status = 'invited'
     RETURNING ${PERSON_COLUMNS}`,
    { ...columns, roles },
  )
  const row = again ?? (await insertInvited(scope, { ...columns, roles, personId: randomUUID() }))
  await recordAudit(scope, {
    action: 'invited',
    subjectType: 'person',
    subjectId: row.person_id,
    detail: { roles: row.roles },
  })
  return row
}

const ROLES_OF_JSON = `(SELECT array_agg(role) FROM json_array_elements_text($roles::json) AS role)`

async function insertInvited(scope: Scope, columns: Record<string, unknown>): Promise<PersonRow> {
  // Addresses are unique over all organisations, past what this one may see: let the index judge.
  const [row] = await scope.select<PersonRow>(
    `INSERT INTO person (organisation_id, person_id, email, name, firm, roles, status)
     VALUES ($organisationId, $personId, $email, $name, $firm, ${ROLES_OF_JSON}, 'invited')
     ON CONFLICT (lower(email)) DO NOTHING
     RETURNING ${PERSON_COLUMNS}`,
    columns,
  )
  if (row) return row
  throw conflictWith(
    'address-taken',
    'This e-mail address already belongs to an account. Nothing was changed; invite another address of the person.',
  )
}
