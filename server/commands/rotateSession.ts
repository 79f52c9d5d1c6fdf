import { SESSION_ABSOLUTE_MS, SESSION_IDLE_MS } from '@/server/auth/refreshCookie'
import { sha256Hex } from '@/server/auth/oneTimeToken'
import { childOf, readRefreshToken, writeRefreshToken, type RefreshToken } from '@/server/auth/refreshToken'
import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'
import { Refusal } from '@/server/errors'
import { ACCESS_TOKEN_S, signAccessToken } from '@/server/middleware/accessToken'
import { accountDisabled, deviceRevoked } from '@/server/middleware/authenticate'
import { readAccount } from '@/server/queries/readAccount'
import type { OpenedSession } from './openSession'
import { recordAudit } from './recordAudit'

interface SessionRow {
  session_id: string
  person_id: string
  device_id: string
  generation: number
  token_sha256: string
  parent_sha256: string | null
  rotation_sha256: string | null
  child_used: boolean
  created_at: Date
  last_used_at: Date
  revoked_at: Date | null
  person_status: string
  is_device_revoked: boolean
}

interface Rotation {
  readonly presented: string
  readonly token: RefreshToken
  readonly rotationId: string
}

/**
 * Exchanges a refresh token for its successor.
 *
 * A current token gives a new generation. The token spent last, with the rotation that spent it, gives the same
 * successor again until that one is used, so a lost answer can be repeated for as long as it takes. Any other spent
 * token ends the whole family: two hold it.
 *
 * @throws {Refusal} `session-ended`, `device-revoked`, `account-disabled`
 */
export async function rotateSession(
  { config, database, now, log }: Pick<Context, 'config' | 'database' | 'now' | 'log'>,
  presented: string,
  rotationId: string,
): Promise<OpenedSession> {
  const token = readRefreshToken(presented, config.sessionSecret)
  if (!token) throw sessionEnded()
  const rotation = { presented, token, rotationId }
  // The verdict leaves the transaction as a value: ending a family must be kept although the answer is a refusal.
  const verdict = await database.withScope({ organisationId: token.organisationId, personId: '' }, async (scope) => {
    const row = await lockSession(scope, token.sessionId)
    if (!row) return sessionEnded()
    const acting = { ...scope, personId: row.person_id }
    const refusal = await refuseDead(acting, row, now())
    if (refusal) return refusal
    return rotate(acting, row, { ...rotation, sessionSecret: config.sessionSecret, now: now() })
  })
  if (!(verdict instanceof Refusal)) return verdict
  if (verdict.code === 'session-ended') log.warn({ sessionId: token.sessionId }, 'refresh refused')
  throw verdict
}

async function lockSession(scope: Scope, sessionId: string): Promise<SessionRow | undefined> {
  const [row] = await scope.select<SessionRow>(
    `SELECT s.session_id, s.person_id, s.device_id, s.generation, s.token_sha256, s.parent_sha256, s.rotation_sha256,
       s.child_used, s.created_at, s.last_used_at, s.revoked_at,
       p.status AS person_status, d.revoked_at IS NOT NULL AS is_device_revoked
     FROM session s
     JOIN person p ON p.organisation_id = s.organisation_id AND p.person_id = s.person_id
     JOIN device d ON d.organisation_id = s.organisation_id AND d.device_id = s.device_id
     WHERE s.organisation_id = $organisationId AND s.session_id = $sessionId
     FOR UPDATE OF s`,
    { organisationId: scope.organisationId, sessionId },
  )
  return row
}

async function refuseDead(scope: Scope, row: SessionRow, now: Date): Promise<Refusal | undefined> {
  if (row.person_status !== 'active') return accountDisabled()
  if (row.is_device_revoked) return deviceRevoked()
  if (row.revoked_at !== null) return sessionEnded()
  const isIdle = now.getTime() - row.last_used_at.getTime() > SESSION_IDLE_MS
  const isOld = now.getTime() - row.created_at.getTime() > SESSION_ABSOLUTE_MS
  if (!isIdle && !isOld) return undefined
  await endSession(scope, row.session_id, isOld ? 'lasted-longest' : 'not-used', now)
  return sessionEnded()
}

async function rotate(
  scope: Scope,
  row: SessionRow,
  rotation: Rotation & { sessionSecret: string; now: Date },
): Promise<OpenedSession | Refusal> {
  const presentedSha256 = sha256Hex(rotation.presented)
  const rotationSha256 = sha256Hex(rotation.rotationId)
  const child = childOf(rotation.token, rotation.rotationId, rotation.sessionSecret)
  const refreshToken = writeRefreshToken(child, rotation.sessionSecret)
  const isCurrent = presentedSha256 === row.token_sha256
  const isRepeated = presentedSha256 === row.parent_sha256 && rotationSha256 === row.rotation_sha256 && !row.child_used

  if (!isCurrent && !isRepeated) {
    await endSession(scope, row.session_id, 'token-reused', rotation.now)
    await recordAudit(scope, { action: 'refresh-token-reused', subjectType: 'device', subjectId: row.device_id })
    return sessionEnded()
  }
  if (isCurrent) {
    await scope.execute(
      `UPDATE session SET generation = $generation, token_sha256 = $childSha256, parent_sha256 = $presentedSha256,
         rotation_sha256 = $rotationSha256, child_used = false, last_used_at = $now
       WHERE organisation_id = $organisationId AND session_id = $sessionId`,
      {
        organisationId: scope.organisationId,
        sessionId: row.session_id,
        generation: child.generation,
        childSha256: sha256Hex(refreshToken),
        presentedSha256,
        rotationSha256,
        now: rotation.now,
      },
    )
    await noteSeen(scope, row.device_id, rotation.now)
  }
  return reply(scope, row, { refreshToken, ...rotation })
}

async function reply(
  scope: Scope,
  row: SessionRow,
  { refreshToken, sessionSecret, now }: { refreshToken: string; sessionSecret: string; now: Date },
): Promise<OpenedSession> {
  const claims = {
    personId: row.person_id,
    organisationId: scope.organisationId,
    sessionId: row.session_id,
    deviceId: row.device_id,
  }
  const leftMs = row.created_at.getTime() + SESSION_ABSOLUTE_MS - now.getTime()
  return {
    session: {
      accessToken: signAccessToken(claims, sessionSecret, now),
      expiresInS: ACCESS_TOKEN_S,
      account: await readAccount(scope),
    },
    refreshToken,
    cookieLastsMs: Math.min(SESSION_IDLE_MS, leftMs),
  }
}

async function noteSeen(scope: Scope, deviceId: string, now: Date): Promise<void> {
  const { organisationId, personId } = scope
  await scope.execute(
    `WITH seen AS (UPDATE device SET last_seen_at = $now WHERE organisation_id = $organisationId AND device_id = $deviceId)
     UPDATE person SET last_seen_at = $now WHERE organisation_id = $organisationId AND person_id = $personId`,
    { organisationId, personId, deviceId, now },
  )
}

async function endSession(scope: Scope, sessionId: string, because: string, now: Date): Promise<void> {
  await scope.execute(
    `UPDATE session SET revoked_at = $now, revoked_because = $because
     WHERE organisation_id = $organisationId AND session_id = $sessionId`,
    { organisationId: scope.organisationId, sessionId, because, now },
  )
}

const sessionEnded = () =>
  new Refusal(
    401,
    'session-ended',
    'This session has ended. What is kept on this device is safe; sign in again to go on.',
  )
