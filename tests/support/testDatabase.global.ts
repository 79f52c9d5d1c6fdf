import type { TestProject } from 'vitest/node'
import { migrate } from '@/server/migrate'
import { startThrowAwayCluster } from '@/server/ops/throwAwayCluster.mjs'
import { dropTemplate, prepareTestServer, type TestDatabaseServer } from './testDatabaseServer'

declare module 'vitest' {
  export interface ProvidedContext {
    readonly testDatabaseServer: TestDatabaseServer
  }
}

let close = async () => {}

/**
 * Once before all server tests: a PostgreSQL of our own, or the one that `TEST_DATABASE_ADMIN_URL` names (a superuser's
 * address), with a migrated template in it.
 */
export async function setup({ provide }: Pick<TestProject, 'provide'>): Promise<void> {
  const given = process.env.TEST_DATABASE_ADMIN_URL
  const cluster = given ? { adminUrl: given, stop: async () => {} } : await startThrowAwayCluster()
  const server = await prepareTestServer(cluster.adminUrl, ({ ownerUrl }) => migrate(ownerUrl))
  provide('testDatabaseServer', server)
  close = async () => {
    await dropTemplate(server)
    await cluster.stop()
  }
}

export function teardown(): Promise<void> {
  return close()
}
