import type { Context } from '@/server/context'
import { conflictWith } from '@/server/errors'
import { ACCESS_TOKEN_S, signAccessToken } from '@/server/middleware/accessToken'
import { deviceRevoked } from '@/server/middleware/authenticate'
import type { SignedIn } from '@/server/middleware/signedIn'
import { recordAudit } from './recordAudit'

/**
 * Goes on in a session under a new device id, for a phone that was restored from a copy (rule P4). The old device stays
 * known, so what it handed in is known again by its ids. Asking twice with one id is harmless.
 *
 * @throws {Refusal} `device-of-another-person`, `device-revoked`
 */
export async function renewDevice(
  { config, database, now }: Pick<Context, 'config' | 'database' | 'now'>,
  signedIn: SignedIn,
  device: { deviceId: string; name: string },
): Promise<{ accessToken: string; expiresInS: number }> {
  const { organisationId, personId, sessionId } = signedIn
  await database.withScope(signedIn, async (scope) => {
    const [row] = await scope.select<{ person_id: string; revoked_at: Date | null }>(
      `INSERT INTO device (organisation_id, device_id, person_id, name, enrolled_at, last_seen_at)
       VALUES ($organisationId, $deviceId, $personId, $name, $now, $now)
       ON CONFLICT (organisation_id, device_id) DO UPDATE SET last_seen_at = device.last_seen_at
       RETURNING person_id, revoked_at`,
      { organisationId, personId, ...device, now: now() },
    )
    if (row?.person_id !== personId) {
      throw conflictWith(
        'device-of-another-person',
        'This device id belongs to somebody. Nothing was changed; take another.',
      )
    }
    if (row.revoked_at !== null) throw deviceRevoked()
    if (device.deviceId === signedIn.deviceId) return
    await scope.execute(
      'UPDATE session SET device_id = $deviceId WHERE organisation_id = $organisationId AND session_id = $sessionId',
      { organisationId, sessionId, deviceId: device.deviceId },
    )
    await recordAudit(scope, {
      action: 'device-renewed',
      subjectType: 'device',
      subjectId: device.deviceId,
      detail: { before: signedIn.deviceId },
    })
  })
  const claims = { personId, organisationId, sessionId, deviceId: device.deviceId }
  return { accessToken: signAccessToken(claims, config.sessionSecret, now()), expiresInS: ACCESS_TOKEN_S }
}
