import { rmSync } from 'node:fs'
import path from 'node:path'
import { fingerprint, isFresh, writeStamp } from './fingerprint.mjs'
import { places, ROOT } from './places.mjs'

const INPUTS = ['server', 'shared', 'assets/factors', 'package.json', 'package-lock.json', 'tsconfig.json']
const ENTRIES = ['server/main.ts', 'server/cli.ts', 'server/jobs/photoWorker.mjs']

/**
 * Bundles the server and its command line into `.build/server`, packages left where they are.
 *
 * @returns {Promise<boolean>} false when it was fresh already
 */
export async function buildServer({ isForced = false } = {}) {
  const stamp = path.join(places.build, 'server.stamp')
  const print = fingerprint(ROOT, INPUTS)
  if (!isForced && isFresh(stamp, print)) return false
  const { build } = await import('esbuild')
  rmSync(stamp, { force: true })
  await build({
    absWorkingDir: ROOT,
    entryPoints: ENTRIES,
    outdir: places.server,
    outExtension: { '.js': '.mjs' },
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    alias: { '@': ROOT },
    sourcemap: true,
    logLevel: 'warning',
  })
  writeStamp(stamp, print)
  return true
}
