import { randomBytes, randomUUID } from 'node:crypto'
import { SESSION_IDLE_MS } from '@/server/auth/refreshCookie'
import { sha256Hex } from '@/server/auth/oneTimeToken'
import { writeRefreshToken } from '@/server/auth/refreshToken'
import type { Scope } from '@/server/database'
import { conflictWith } from '@/server/errors'
import { ACCESS_TOKEN_S, signAccessToken } from '@/server/middleware/accessToken'
import { deviceRevoked } from '@/server/middleware/authenticate'
import { readAccount } from '@/server/queries/readAccount'
import type { Session } from '@/shared/api/auth'

/** A session as it goes to the device: the reply, and the cookie beside it. */
export interface OpenedSession {
  readonly session: Session
  readonly refreshToken: string
  readonly cookieLastsMs: number
}

/**
 * Enrols the device for the acting person, ends an earlier session there, and opens a new one.
 *
 * @throws {Refusal} `device-of-another-person`, `device-revoked`
 */
export async function openSession(
  scope: Scope,
  { device, sessionSecret, now }: { device: { deviceId: string; name: string }; sessionSecret: string; now: Date },
): Promise<OpenedSession> {
  await enrolDevice(scope, device, now)
  const { organisationId, personId } = scope
  await scope.execute(
    `UPDATE session SET revoked_at = $now, revoked_because = 'signed-in-again'
     WHERE organisation_id = $organisationId AND device_id = $deviceId AND revoked_at IS NULL`,
    { organisationId, deviceId: device.deviceId, now },
  )
  const sessionId = randomUUID()
  const refreshToken = writeRefreshToken(
    { organisationId, sessionId, generation: 0, secret: randomBytes(32) },
    sessionSecret,
  )
  await scope.execute(
    `INSERT INTO session (organisation_id, session_id, person_id, device_id, token_sha256, created_at, last_used_at)
     VALUES ($organisationId, $sessionId, $personId, $deviceId, $tokenSha256, $now, $now)`,
    { organisationId, sessionId, personId, deviceId: device.deviceId, tokenSha256: sha256Hex(refreshToken), now },
  )
  await scope.execute(
    `UPDATE person SET last_seen_at = $now WHERE organisation_id = $organisationId AND person_id = $personId`,
    { organisationId, personId, now },
  )
  const accessToken = signAccessToken(
    { personId, organisationId, sessionId, deviceId: device.deviceId },
    sessionSecret,
    now,
  )
  const account = await readAccount(scope)
  return {
    session: { accessToken, expiresInS: ACCESS_TOKEN_S, account },
    refreshToken,
    cookieLastsMs: SESSION_IDLE_MS,
  }
}

async function enrolDevice(scope: Scope, device: { deviceId: string; name: string }, now: Date): Promise<void> {
  const { organisationId, personId } = scope
  const [row] = await scope.select<{ person_id: string; revoked_at: Date | null }>(
    `INSERT INTO device (organisation_id, device_id, person_id, name, enrolled_at, last_seen_at)
     VALUES ($organisationId, $deviceId, $personId, $name, $now, $now)
     ON CONFLICT (organisation_id, device_id) DO UPDATE
       SET last_seen_at = CASE WHEN device.person_id = excluded.person_id THEN excluded.last_seen_at ELSE device.last_seen_at END,
           name = CASE WHEN device.person_id = excluded.person_id THEN excluded.name ELSE device.name END
     RETURNING person_id, revoked_at`,
    { organisationId, personId, deviceId: device.deviceId, name: device.name, now },
  )
  if (row?.person_id !== personId) {
    throw conflictWith(
      'device-of-another-person',
      'This device is enrolled for another person. What it holds is safe; sign in again with a new device number.',
    )
  }
  if (row.revoked_at !== null) throw deviceRevoked()
}
