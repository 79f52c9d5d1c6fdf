import { existsSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { findPostgres, isRoot } from './postgres.mjs'
import { hasProgram, run } from './run.mjs'

const CHROMIUM = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium'

/**
 * What a machine must have beside Node. `isThere` looks, `debian` names the packages of Debian 12,
 * `byHand` says in words what others install.
 */
const needs = {
  database: {
    isThere: () => hasPostgis(),
    debian: ['postgresql-15', 'postgresql-15-postgis-3'],
    byHand: 'PostgreSQL 15 or newer with PostGIS 3 (its programs on the PATH, or their folder in POSTGRES_BIN)',
  },
  browser: {
    isThere: () => existsSync(CHROMIUM),
    debian: ['chromium', 'fonts-dejavu-core'],
    byHand: 'Chromium (its program in CHROMIUM_PATH)',
  },
  compiler: {
    isThere: () => ['g++', 'make', 'python3'].every(hasProgram),
    debian: ['g++', 'make', 'python3'],
    byHand: 'a C++ compiler, make and Python 3',
  },
}

/** Where Debian decides whether an installed server gets a cluster of its own; ours is elsewhere. */
const NO_MAIN_CLUSTER = '/etc/postgresql-common/createcluster.d/tallystone.conf'

/** @param {readonly ('database' | 'browser' | 'compiler')[]} wanted; @returns {string[]} those that are missing */
export function missingNeeds(wanted) {
  return wanted.filter((name) => !needs[name].isThere())
}

/**
 * Installs what is missing, as root or through sudo.
 *
 * @param {readonly ('database' | 'browser' | 'compiler')[]} missing
 * @throws {Error} saying what to install by hand, where this is not Debian 12 or we may not install
 */
export async function installNeeds(missing, log) {
  const packages = missing.flatMap((name) => needs[name].debian)
  if (!isDebian12()) throw new Error(byHand(missing))
  const prefix = await rootPrefix(packages)
  const asRoot = (...args) => {
    const [program, ...rest] = [...prefix, ...args]
    return run(program, rest, { env: { DEBIAN_FRONTEND: 'noninteractive' }, log })
  }
  await asRoot('apt-get', 'update', '--quiet=2')
  const mindsCluster = missing.includes('database')
  if (mindsCluster) {
    await asRoot('mkdir', '-p', path.dirname(NO_MAIN_CLUSTER))
    await asRoot('sh', '-c', `echo 'create_main_cluster = false' > ${NO_MAIN_CLUSTER}`)
  }
  try {
    await asRoot('apt-get', 'install', '--yes', '--quiet=2', '--no-install-recommends', ...packages)
  } finally {
    if (mindsCluster) await asRoot('rm', '-f', NO_MAIN_CLUSTER)
  }
  const stillMissing = missingNeeds(missing)
  if (stillMissing.length > 0) throw new Error(byHand(stillMissing))
}

async function rootPrefix(packages) {
  if (isRoot()) return []
  try {
    await run('sudo', ['-n', 'true'])
    return ['sudo', '-n']
  } catch {
    throw new Error(
      'Packages of the system are missing, and this account may not install any without a password.\n' +
        `Run this, then try again:\n  sudo apt-get install --no-install-recommends ${packages.join(' ')}`,
    )
  }
}

function byHand(missing) {
  return [
    'This machine lacks what Tallystone needs, and it is not Debian 12, where it could be installed for you.',
    'Please install, then try again:',
    ...missing.map((name) => `  - ${needs[name].byHand}`),
    'Nothing was changed.',
  ].join('\n')
}

function isDebian12() {
  if (!existsSync('/etc/os-release') || !hasProgram('apt-get')) return false
  const release = readFileSync('/etc/os-release', 'utf8')
  return /^ID=debian$/m.test(release) && /^VERSION_ID="?12"?$/m.test(release)
}

function hasPostgis() {
  const bin = findPostgres()
  if (!bin) return false
  const debianVersion = /^\/usr\/lib\/postgresql\/(\d+)\/bin$/.exec(bin)?.[1]
  // Elsewhere the database itself says so when the extension is made.
  return debianVersion === undefined || existsSync(`/usr/share/postgresql/${debianVersion}/extension/postgis.control`)
}
