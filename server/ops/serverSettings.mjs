import { clusterFolder, startCluster } from './cluster.mjs'
import { places, ROOT } from './places.mjs'
import { readSecrets } from './secrets.mjs'

const LOOPBACK = new Set(['127.0.0.1', 'localhost', '::1'])

/**
 * The port to serve on: `PORT`, or 8080.
 *
 * @throws {Error} naming the setting, when it is no port
 */
export function readPort(environment = process.env) {
  const text = environment.PORT ?? '8080'
  const port = Number(text)
  if (/^\d+$/.test(text) && port >= 1 && port <= 65_535) return port
  throw new Error(`PORT is "${text}"; it takes a number from 1 to 65535. Nothing was started.`)
}

/**
 * Whether the database is somebody else's.
 *
 * @throws {Error} when only one of the two addresses is set
 */
export function hasOwnDatabase({ DATABASE_URL, DATABASE_OWNER_URL } = process.env) {
  if (Boolean(DATABASE_URL) === Boolean(DATABASE_OWNER_URL)) return Boolean(DATABASE_URL)
  const [set, unset] = DATABASE_URL ? ['DATABASE_URL', 'DATABASE_OWNER_URL'] : ['DATABASE_OWNER_URL', 'DATABASE_URL']
  throw new Error(
    `${set} is set but ${unset} is not. Set both, to use a database of yours, or none, to get one here. Nothing was started.`,
  )
}

/**
 * Opens the database and completes the server's environment. What is already set is left as it is.
 *
 * @param {{ port: number }} options
 * @returns {Promise<{ environment: Record<string, string>, stop(): Promise<void> }>}
 */
export async function openDatabaseAndSettings({ port }, given = process.env) {
  const secrets = readSecrets(places.secrets)
  const cluster = hasOwnDatabase(given) ? undefined : await startCluster({ folder: clusterFolder(ROOT), secrets })
  const host = given.HOST ?? '127.0.0.1'
  const environment = {
    NODE_ENV: 'development',
    PORT: String(port),
    HOST: host,
    SESSION_SECRET: secrets.sessionSecret,
    WEB_ROOT: places.web,
    PHOTO_ROOT: `${places.local}/photos`,
    ...(cluster ? { DATABASE_URL: cluster.appUrl, DATABASE_OWNER_URL: cluster.ownerUrl } : {}),
    // Messages can be opened by anybody who reaches the address, so only where that is this machine.
    ...(given.MAIL_URL === undefined && given.NODE_ENV !== 'production' && LOOPBACK.has(host)
      ? { DEV_MAIL: 'true' }
      : {}),
    ...definedOf(given),
  }
  return { environment, stop: async () => cluster?.stop() }
}

function definedOf(environment) {
  return Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== undefined && value !== ''))
}
