import { sha256Hex } from '@/server/auth/oneTimeToken'
import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'
import { Refusal } from '@/server/errors'
import type { LINK_LASTS_MS } from '@/server/auth/oneTimeToken'

type Purpose = keyof typeof LINK_LASTS_MS

/**
 * Runs work as the person a one-time token was sent to, and spends the token with it: both happen, or neither.
 *
 * @throws {Refusal} `link-not-valid` for an unknown, used, expired or foreign token
 */
export async function spendToken<Result>(
  { database, now }: Pick<Context, 'database' | 'now'>,
  token: string,
  purpose: Purpose,
  work: (scope: Scope) => Promise<Result>,
): Promise<Result> {
  const tokenSha256 = sha256Hex(token)
  const owner = await findTokenOwner(database, tokenSha256, purpose)
  return database.withScope(owner, async (scope) => {
    const spent = await scope.select(
      `UPDATE one_time_token SET used_at = $now
       WHERE organisation_id = $organisationId AND token_sha256 = $tokenSha256 AND purpose = $purpose
         AND used_at IS NULL AND expires_at > $now
       RETURNING person_id`,
      { organisationId: scope.organisationId, tokenSha256, purpose, now: now() },
    )
    if (spent.length === 0) throw linkNotValid(purpose)
    return work(scope)
  })
}

/** The person an unspent token was sent to. @throws {Refusal} `link-not-valid` */
export async function findTokenOwner(
  database: Context['database'],
  tokenSha256: string,
  purpose: Purpose,
): Promise<{ organisationId: string; personId: string }> {
  const [row] = await database.selectPublic<{ organisation_id: string; person_id: string; purpose: string }>(
    'SELECT * FROM one_time_token_lookup($tokenSha256)',
    { tokenSha256 },
  )
  if (row?.purpose !== purpose) throw linkNotValid(purpose)
  return { organisationId: row.organisation_id, personId: row.person_id }
}

export function linkNotValid(purpose: Purpose): Refusal {
  const next =
    purpose === 'invitation'
      ? 'Ask the steward who invited you for a new one.'
      : 'Ask for a new link on the sign-in page.'
  return new Refusal(404, 'link-not-valid', `This link was used already or has run out. Nothing was changed. ${next}`)
}
