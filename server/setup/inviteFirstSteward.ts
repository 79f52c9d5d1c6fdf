import { randomUUID } from 'node:crypto'
import { LINK_LASTS_MS, makeOneTimeToken } from '@/server/auth/oneTimeToken'
import { withOwner, type OwnerScope } from './withOwner'

/** Who opens a new installation, and for which organisation. */
export interface FirstSteward {
  readonly organisationName: string
  readonly name: string
  readonly email: string
}

interface WaitingRow {
  organisation_id: string
  person_id: string
  email: string
}

/**
 * Makes the first organisation and its steward, and a link to join by. While that steward has not joined, asking again
 * gives a new link and corrects nothing else; after that there is nothing to give.
 *
 * @returns the link and the address to sign in with, or undefined when the installation is in use
 */
export async function inviteFirstSteward(
  ownerUrl: string,
  publicUrl: string,
  first: FirstSteward,
  now: Date,
): Promise<{ link: string; email: string } | undefined> {
  return withOwner(ownerUrl, async (owner) => {
    // Two starts at once must not make two organisations.
    await owner.select('SELECT pg_advisory_xact_lock(20261201)')
    const [counted] = await owner.select<{ n: number }>('SELECT count(*)::integer AS n FROM organisation')
    const waiting = counted?.n === 0 ? await addSteward(owner, first) : await findWaiting(owner)
    if (!waiting) return undefined
    const { token, tokenSha256 } = makeOneTimeToken()
    await storeLink(owner, waiting, tokenSha256, now)
    return { link: `${publicUrl}/join/${token}`, email: waiting.email }
  })
}

async function addSteward(owner: OwnerScope, first: FirstSteward): Promise<WaitingRow> {
  const ids = { organisationId: randomUUID(), personId: randomUUID() }
  const email = first.email.toLowerCase()
  await owner.select(
    'INSERT INTO organisation (organisation_id, name) VALUES ($organisationId, $name) RETURNING organisation_id',
    { organisationId: ids.organisationId, name: first.organisationName },
  )
  await owner.select(
    `INSERT INTO person (organisation_id, person_id, email, name, roles, status)
     VALUES ($organisationId, $personId, $email, $name, '{steward,planner}', 'invited') RETURNING person_id`,
    { ...ids, email, name: first.name },
  )
  return { organisation_id: ids.organisationId, person_id: ids.personId, email }
}

/** The steward of an installation in which nobody has joined. */
async function findWaiting(owner: OwnerScope): Promise<WaitingRow | undefined> {
  const [row] = await owner.select<WaitingRow>(
    `SELECT organisation_id, person_id, email FROM person
     WHERE status = 'invited' AND 'steward' = ANY (roles) AND NOT EXISTS (SELECT FROM person WHERE status <> 'invited')
     LIMIT 1`,
  )
  return row
}

async function storeLink(owner: OwnerScope, person: WaitingRow, tokenSha256: string, now: Date): Promise<void> {
  const ids = { organisationId: person.organisation_id, personId: person.person_id }
  await owner.select(
    `UPDATE one_time_token SET used_at = $now
     WHERE organisation_id = $organisationId AND person_id = $personId AND used_at IS NULL RETURNING person_id`,
    { ...ids, now },
  )
  await owner.select(
    `INSERT INTO one_time_token (organisation_id, token_sha256, person_id, purpose, expires_at, created_at)
     VALUES ($organisationId, $tokenSha256, $personId, 'invitation', $expiresAt, $now) RETURNING person_id`,
    { ...ids, tokenSha256, now, expiresAt: new Date(now.getTime() + LINK_LASTS_MS.invitation) },
  )
}
