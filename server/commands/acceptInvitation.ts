import { hashPassword } from '@/server/auth/hashPassword'
import type { Context } from '@/server/context'
import { refuseWeakPassword } from '@/server/policies/refuseWeakPassword'
import { openSession, type OpenedSession } from './openSession'
import { recordAudit } from './recordAudit'
import { linkNotValid, spendToken } from './spendToken'

/**
 * Lets an invited person join with a name and a password, and signs the device in.
 *
 * @throws {Refusal} `link-not-valid`, `input-not-usable`, `device-of-another-person`
 */
export async function acceptInvitation(
  context: Pick<Context, 'config' | 'database' | 'now'>,
  token: string,
  joining: { name: string; password: string; device: { deviceId: string; name: string } },
): Promise<OpenedSession> {
  const passwordHash = await hashPassword(joining.password)
  return spendToken(context, token, 'invitation', async (scope) => {
    const { organisationId, personId } = scope
    const [row] = await scope.select<{ email: string }>(
      `UPDATE person SET name = $name, password_hash = $passwordHash, status = 'active'
       WHERE organisation_id = $organisationId AND person_id = $personId AND status = 'invited' RETURNING email`,
      { organisationId, personId, passwordHash, name: joining.name },
    )
    if (!row) throw linkNotValid('invitation')
    refuseWeakPassword(joining.password, row.email)
    await recordAudit(scope, { action: 'joined', subjectType: 'person', subjectId: personId })
    return openSession(scope, {
      device: joining.device,
      sessionSecret: context.config.sessionSecret,
      now: context.now(),
    })
  })
}
