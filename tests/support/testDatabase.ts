import { inject } from 'vitest'
import { copyTemplate, type TestDatabase } from './testDatabaseServer'

/**
 * A fresh, migrated database for one test file. Call in `beforeAll`, drop in `afterAll`.
 *
 * @example const { appUrl, drop } = await createTestDatabase()
 */
export function createTestDatabase(): Promise<TestDatabase> {
  return copyTemplate(inject('testDatabaseServer'))
}
