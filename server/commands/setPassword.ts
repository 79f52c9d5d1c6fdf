import { hashPassword } from '@/server/auth/hashPassword'
import type { Context } from '@/server/context'
import { refuseWeakPassword } from '@/server/policies/refuseWeakPassword'
import { recordAudit } from './recordAudit'
import { linkNotValid, spendToken } from './spendToken'

/**
 * Sets a new password with the token of a reset link and ends every session of the person.
 *
 * @throws {Refusal} `link-not-valid`, `input-not-usable`
 */
export async function setPassword(
  context: Pick<Context, 'database' | 'now'>,
  token: string,
  password: string,
): Promise<void> {
  const passwordHash = await hashPassword(password)
  await spendToken(context, token, 'password-reset', async (scope) => {
    const { organisationId, personId } = scope
    const [row] = await scope.select<{ email: string }>(
      `UPDATE person SET password_hash = $passwordHash
       WHERE organisation_id = $organisationId AND person_id = $personId AND status = 'active' RETURNING email`,
      { organisationId, personId, passwordHash },
    )
    if (!row) throw linkNotValid('password-reset')
    refuseWeakPassword(password, row.email)
    await scope.execute(
      `UPDATE session SET revoked_at = $now, revoked_because = 'password-changed'
       WHERE organisation_id = $organisationId AND person_id = $personId AND revoked_at IS NULL`,
      { organisationId, personId, now: context.now() },
    )
    await recordAudit(scope, { action: 'password-changed', subjectType: 'person', subjectId: personId })
  })
}
