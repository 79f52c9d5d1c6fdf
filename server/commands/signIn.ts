import type { Context } from '@/server/context'
import { recordAudit } from './recordAudit'
import { openSession, type OpenedSession } from './openSession'

/** Who proved a password. */
export interface ProvenPerson {
  readonly organisationId: string
  readonly personId: string
}

/** Opens a session for somebody who has just proved the password. */
export async function signIn(
  { config, database, now }: Pick<Context, 'config' | 'database' | 'now'>,
  person: ProvenPerson,
  device: { deviceId: string; name: string },
): Promise<OpenedSession> {
  return database.withScope(person, async (scope) => {
    const opened = await openSession(scope, { device, sessionSecret: config.sessionSecret, now: now() })
    await recordAudit(scope, { action: 'signed-in', subjectType: 'device', subjectId: device.deviceId })
    return opened
  })
}
