import type { z } from 'zod'
import { sha256Hex } from '@/server/auth/oneTimeToken'
import { findTokenOwner, linkNotValid } from '@/server/commands/spendToken'
import type { Context } from '@/server/context'
import type { readInvitation as endpoint } from '@/shared/api/auth'
import type { Role } from '@/shared/schemas/person'

/** What an invitation link offers. @throws {Refusal} `link-not-valid` */
export async function readInvitation(
  { database, now }: Pick<Context, 'database' | 'now'>,
  token: string,
): Promise<z.infer<typeof endpoint.response>> {
  const tokenSha256 = sha256Hex(token)
  const owner = await findTokenOwner(database, tokenSha256, 'invitation')
  const [row] = await database.withScope(
    owner,
    (scope) =>
      scope.select<{ organisation_name: string; email: string; name: string; roles: Role[] }>(
        `SELECT o.name AS organisation_name, p.email, p.name, p.roles
         FROM one_time_token t
         JOIN person p USING (organisation_id, person_id)
         JOIN organisation o USING (organisation_id)
         WHERE t.organisation_id = $organisationId AND t.token_sha256 = $tokenSha256
           AND t.used_at IS NULL AND t.expires_at > $now AND p.status = 'invited'`,
        { organisationId: owner.organisationId, tokenSha256, now: now() },
      ),
    { readOnly: true },
  )
  if (!row) throw linkNotValid('invitation')
  return { organisationName: row.organisation_name, email: row.email, name: row.name, roles: row.roles }
}
