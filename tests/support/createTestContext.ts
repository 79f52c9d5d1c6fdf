import { pino } from 'pino'
import type { Config } from '@/server/config'
import type { Context } from '@/server/context'
import { openDatabase } from '@/server/database'
import { fakeClock, type FakeClock } from './fakeClock'
import { fakeMailer, type FakeMailer } from './fakeMailer'
import { fakePhotoStore, type FakePhotoStore } from './fakePhotoStore'
import { fakeQueue, type FakeQueue } from './fakeQueue'

/** A context on a real database, with everything else in memory and at hand. */
export interface TestContext extends Context {
  readonly mailer: FakeMailer
  readonly queue: FakeQueue
  readonly photoStore: FakePhotoStore
  readonly clock: FakeClock
  /** Lines of the log, parsed. */
  readonly logged: Record<string, unknown>[]
}

export const TEST_SECRET = 'only-for-tests-0123456789abcdef0123456789abcdef'

export function testConfig(appUrl: string, overrides: Partial<Config> = {}): Config {
  return Object.freeze({
    environment: 'test',
    port: 0,
    host: '127.0.0.1',
    publicUrl: 'http://127.0.0.1:8080',
    databaseUrl: appUrl,
    databaseOwnerUrl: undefined,
    sessionSecret: TEST_SECRET,
    webRoot: undefined,
    photoRoot: '/nowhere',
    mailUrl: undefined,
    mailFrom: 'Tallystone <no-reply@tallystone.invalid>',
    hasDevMail: false,
    trustedProxies: 0,
    logLevel: 'warn',
    signInsPerMinute: 10_000,
    ...overrides,
  })
}

/** @param appUrl address of a migrated database, as the app's role */
export function createTestContext(
  appUrl: string,
  {
    config = {},
    poolSize = 5,
    ...parts
  }: Partial<Omit<TestContext, 'config'>> & { config?: Partial<Config>; poolSize?: number } = {},
): TestContext {
  const logged: Record<string, unknown>[] = []
  const clock = parts.clock ?? fakeClock()
  return {
    config: testConfig(appUrl, config),
    database: parts.database ?? openDatabase(appUrl, { poolSize }),
    mailer: parts.mailer ?? fakeMailer(),
    queue: parts.queue ?? fakeQueue(),
    photoStore: parts.photoStore ?? fakePhotoStore(),
    log: pino({ level: 'info' }, { write: (line: string) => void logged.push(JSON.parse(line)) }),
    now: clock.now,
    clock,
    logged,
  }
}
