import { existsSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { places, ROOT } from './places.mjs'
import { run } from './run.mjs'

const NODE_RANGE = 'Node 20.19 or newer, below 23'

/** @throws {Error} in words, when this Node will not do */
export function checkNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split('.').map(Number)
  if ((major === 20 && minor >= 19) || major === 21 || major === 22) return
  throw new Error(`Tallystone needs ${NODE_RANGE}; this is ${version}. Install Node 20 and try again.`)
}

/** Whether node_modules holds just what the lock names (packages for other kinds of machine aside). */
export function hasNodePackages() {
  const installed = readPackages(path.join(places.modules, '.package-lock.json'))
  if (!installed) return false
  return Object.entries(readPackages(path.join(ROOT, 'package-lock.json')) ?? {}).every(
    ([name, { version, optional }]) =>
      name === '' || (installed[name] ? installed[name].version === version : optional),
  )
}

/**
 * Installs what the lock names. Scripts of packages are not run: none is needed to serve.
 */
export async function installNodePackages(log) {
  await run('npm', ['ci', '--ignore-scripts', '--no-audit', '--no-fund', '--loglevel=error'], { cwd: ROOT, log })
}

/** Whether the SQLite that tests use in place of a phone's has been compiled. */
export function hasTestSqlite() {
  return existsSync(path.join(places.modules, 'better-sqlite3', 'build', 'Release', 'better_sqlite3.node'))
}

/** Fetches or compiles it. */
export async function installTestSqlite(log) {
  await run('npm', ['rebuild', 'better-sqlite3', '--loglevel=error'], { cwd: ROOT, log })
}

function readPackages(file) {
  if (!existsSync(file)) return undefined
  return JSON.parse(readFileSync(file, 'utf8')).packages
}
