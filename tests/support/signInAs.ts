import { randomUUID } from 'node:crypto'
import { signAccessToken } from '@/server/middleware/accessToken'
import type { TestPerson } from './buildPerson'
import type { TestApp } from './createTestApp'

export interface SignedInPerson extends TestPerson {
  readonly deviceId: string
  readonly sessionId: string
  readonly token: string
  /** Header for supertest: `.set(person.bearer)`. */
  readonly bearer: { readonly Authorization: string }
}

/** Enrols a device, opens a session and signs a token, without the cost of a password. */
export async function signInAs(
  { owner, context }: Pick<TestApp, 'owner' | 'context'>,
  person: TestPerson,
  overrides: { deviceId?: string; deviceName?: string } = {},
): Promise<SignedInPerson> {
  const deviceId = overrides.deviceId ?? randomUUID()
  const sessionId = randomUUID()
  const { organisationId, personId } = person
  await owner.run(
    `INSERT INTO device (organisation_id, device_id, person_id, name)
     VALUES ($organisationId, $deviceId, $personId, $name) ON CONFLICT DO NOTHING`,
    { organisationId, deviceId, personId, name: overrides.deviceName ?? 'Test phone' },
  )
  await owner.run(
    `INSERT INTO session (organisation_id, session_id, person_id, device_id, token_sha256)
     VALUES ($organisationId, $sessionId, $personId, $deviceId, $digest)`,
    { organisationId, sessionId, personId, deviceId, digest: randomUUID() },
  )
  const token = signAccessToken(
    { personId, organisationId, sessionId, deviceId },
    context.config.sessionSecret,
    context.now(),
  )
  return { ...person, deviceId, sessionId, token, bearer: { Authorization: `Bearer ${token}` } }
}
