import { execFileSync } from 'node:child_process'
import { existsSync, readdirSync } from 'node:fs'
import path from 'node:path'
import { run } from './run.mjs'

const DEBIAN_FOLDER = '/usr/lib/postgresql'
const MIN_VERSION = 15

/**
 * Folder with initdb, pg_ctl, postgres and psql: `POSTGRES_BIN`, or Debian's newest, or the one on the path.
 *
 * @param {string} [version] major version a data folder was made with
 * @returns {string | undefined}
 */
export function findPostgres(version) {
  const set = process.env.POSTGRES_BIN
  if (set) return existsSync(path.join(set, 'initdb')) ? set : undefined
  const versions = existsSync(DEBIAN_FOLDER) ? readdirSync(DEBIAN_FOLDER) : []
  const usable = versions
    .filter((name) => (version === undefined ? Number(name) >= MIN_VERSION : name === version))
    .sort((a, b) => Number(a) - Number(b))
    .map((name) => path.join(DEBIAN_FOLDER, name, 'bin'))
    .filter((folder) => existsSync(path.join(folder, 'initdb')))
  // The oldest that will do: PostGIS is installed for that one.
  return usable[0] ?? (process.env.PATH ?? '').split(':').find((folder) => existsSync(path.join(folder, 'initdb')))
}

/**
 * Runs a program of PostgreSQL. The server refuses to be root, so root hands these to the account `postgres`.
 *
 * @param {string} bin folder of {@link findPostgres}
 */
export function runPostgres(bin, program, args, options = {}) {
  const command = path.join(bin, program)
  const [first, ...rest] = isRoot() ? [...asPostgres(), command, ...args] : [command, ...args]
  return run(first, rest, { cwd: '/', ...options })
}

/** @param {string} url address of the database; @param {string} sql statements, run as one script */
export function runSql(bin, url, sql) {
  const { username, password, hostname, port, pathname } = new URL(url)
  return run(
    path.join(bin, 'psql'),
    ['--no-psqlrc', '--quiet', '--no-align', '--tuples-only', '--set=ON_ERROR_STOP=1', '--file=-'],
    {
      cwd: '/',
      input: sql,
      env: {
        PGUSER: decodeURIComponent(username),
        PGPASSWORD: decodeURIComponent(password),
        PGHOST: hostname,
        PGPORT: port,
        PGDATABASE: pathname.slice(1),
        PGCLIENTENCODING: 'UTF8',
        PGOPTIONS: '-c client_min_messages=warning',
      },
    },
  )
}

export function isRoot() {
  return process.getuid?.() === 0
}

/** @returns {{ uid: number, gid: number }} of the account the database runs as */
export function postgresAccount() {
  if (!isRoot()) return { uid: process.getuid?.() ?? 0, gid: process.getgid?.() ?? 0 }
  const read = (flag) => Number(execFileSync('id', [flag, 'postgres'], { encoding: 'utf8' }).trim())
  return { uid: read('-u'), gid: read('-g') }
}

function asPostgres() {
  return ['setpriv', '--reuid=postgres', '--regid=postgres', '--init-groups', '--']
}
