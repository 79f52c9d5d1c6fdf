import { readRefreshToken } from '@/server/auth/refreshToken'
import type { Context } from '@/server/context'
import { recordAudit } from './recordAudit'

/** Ends the session of a refresh token of ours; anything else changes nothing and is no error. */
export async function endSession(
  { config, database, now }: Pick<Context, 'config' | 'database' | 'now'>,
  presented: string,
): Promise<void> {
  const token = readRefreshToken(presented, config.sessionSecret)
  if (!token) return
  const { organisationId, sessionId } = token
  await database.withScope({ organisationId, personId: '' }, async (scope) => {
    const [row] = await scope.select<{ person_id: string; device_id: string }>(
      `UPDATE session SET revoked_at = $now, revoked_because = 'signed-out'
       WHERE organisation_id = $organisationId AND session_id = $sessionId AND revoked_at IS NULL
       RETURNING person_id, device_id`,
      { organisationId, sessionId, now: now() },
    )
    if (!row) return
    const acting = { ...scope, personId: row.person_id }
    await recordAudit(acting, { action: 'signed-out', subjectType: 'device', subjectId: row.device_id })
  })
}
