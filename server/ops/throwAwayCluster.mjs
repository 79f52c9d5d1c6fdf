import { randomBytes } from 'node:crypto'
import { chmodSync, mkdtempSync, readdirSync, rmSync, writeFileSync, existsSync, readFileSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { isAlive, startCluster, stopCluster } from './cluster.mjs'

const PREFIX = 'tallystone-test-'

/**
 * A cluster for tests in a temporary folder. Those that a killed run left behind are swept away first.
 *
 * @returns {Promise<{ adminUrl: string, stop(): Promise<void> }>} `stop` also removes the folder
 */
export async function startThrowAwayCluster() {
  await sweep()
  const folder = mkdtempSync(path.join(os.tmpdir(), PREFIX))
  chmodSync(folder, 0o711)
  writeFileSync(path.join(folder, 'started-by'), String(process.pid))
  const secret = () => randomBytes(24).toString('base64url')
  const secrets = { superuserPassword: secret(), ownerPassword: secret(), appPassword: secret() }
  const { adminUrl, stop } = await startCluster({ folder, secrets, isThrowAway: true })
  return {
    adminUrl,
    async stop() {
      await stop()
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

async function sweep() {
  const left = readdirSync(os.tmpdir()).filter((name) => name.startsWith(PREFIX))
  for (const name of left) {
    const folder = path.join(os.tmpdir(), name)
    const startedBy = path.join(folder, 'started-by')
    if (!existsSync(startedBy) || isAlive(Number(readFileSync(startedBy, 'utf8')))) continue
    try {
      await stopCluster(folder)
      rmSync(folder, { recursive: true, force: true })
    } catch {
      // Another run may be sweeping the same one, or it belongs to another account.
    }
  }
}
