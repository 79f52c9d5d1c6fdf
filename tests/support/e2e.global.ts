import { mkdtempSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { z } from 'zod'
import { E2E_STATE, serverSettings, type E2eState } from './appServer'
import { dropTemplate, prepareTestServer } from './testDatabaseServer'

const seeded = z.object({
  accounts: z.array(z.object({ role: z.string(), name: z.string(), email: z.string(), password: z.string() })),
})

/** Once before all stories: a database server with two templates, one migrated and one that holds the demo. */
export default async function setUpStories(): Promise<() => Promise<void>> {
  // Imported late, because Playwright would rewrite these files as CommonJS, and they ask where they lie.
  const { runServerCommand } = await import('@/server/ops/commandLine.mjs')
  const { startThrowAwayCluster } = await import('@/server/ops/throwAwayCluster.mjs')
  const given = process.env.TEST_DATABASE_ADMIN_URL
  const cluster = given ? { adminUrl: given, stop: async () => {} } : await startThrowAwayCluster()
  const photoRoot = mkdtempSync(path.join(os.tmpdir(), 'tallystone-photos-'))
  const migrated = await prepareTestServer(cluster.adminUrl, (urls) =>
    runServerCommand('migrate', serverSettings(urls, { photoRoot, port: 0 })),
  )
  let accounts: E2eState['accounts'] = []
  const demo = await prepareTestServer(cluster.adminUrl, async (urls) => {
    const settings = serverSettings(urls, { photoRoot, port: 0 })
    await runServerCommand('migrate', settings)
    accounts = seeded.parse(await runServerCommand('seed-demo', settings)).accounts
  })
  const state: E2eState = { migrated, demo, accounts, photoRoot }
  process.env[E2E_STATE] = JSON.stringify(state)
  return async () => {
    await dropTemplate(migrated)
    await dropTemplate(demo)
    await cluster.stop()
    rmSync(photoRoot, { recursive: true, force: true })
  }
}
