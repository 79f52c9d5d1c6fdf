import type { Database } from '@/server/database'
import type { AccessClaims } from '@/server/middleware/accessToken'
import type { SignedIn } from '@/server/middleware/signedIn'
import type { Role } from '@/shared/schemas/person'

interface SignedInRow {
  organisation_name: string
  is_demo: boolean
  name: string
  email: string
  roles: Role[]
  language: string
  status: string
  is_session_open: boolean
  is_device_revoked: boolean
}

/**
 * The person of a verified token as the database knows them now, in one statement.
 *
 * @returns the person, or why the token no longer opens anything
 */
export async function readSignedIn(
  database: Database,
  claims: AccessClaims,
): Promise<SignedIn | 'ended' | 'device-revoked' | 'account-disabled'> {
  const [row] = await database.selectPublic<SignedInRow>(
    'SELECT * FROM signed_in_lookup($organisationId, $personId, $sessionId, $deviceId)',
    { ...claims },
  )
  if (!row) return 'ended'
  if (row.status !== 'active') return 'account-disabled'
  if (row.is_device_revoked) return 'device-revoked'
  if (!row.is_session_open) return 'ended'
  return {
    personId: claims.personId,
    organisationId: claims.organisationId,
    organisationName: row.organisation_name,
    isDemo: row.is_demo,
    name: row.name,
    email: row.email,
    roles: row.roles,
    language: row.language,
    sessionId: claims.sessionId,
    deviceId: claims.deviceId,
  }
}
