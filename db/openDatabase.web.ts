import { createDriver } from './createDriver'
import { OpenElsewhereError, type Driver, type PlainDatabase } from './driver.types'
import { KEEP_NOW } from './keepNow'
import type { OpenOptions } from './openDatabase.types'
import { plainSqlite } from './plainSqlite'

const LOCK = 'tallystone-database'
const TAKE_OVER = 'take-over'

/** How long another tab is given to let go [ms]. */
const PATIENCE_MS = 15_000
/** How long this tab may need to close what it had open for somebody else [ms]. */
const OWN_PATIENCE_MS = 1_500
const RETRY_MS = 250
const MOST_RETRIES = 20

/**
 * Opens the database of one person. One tab owns it: a Web Lock is held as long as the tab lives, because a second tab
 * would break the file pool under the first one.
 *
 * @throws {OpenElsewhereError} another tab has it
 */
export async function openDatabase(name: string, { takeOver = false, onTaken }: OpenOptions): Promise<Driver> {
  const channel = new BroadcastChannel(LOCK)
  if (takeOver) channel.postMessage(TAKE_OVER)
  const release = await holdLock(takeOver)
  if (!release) {
    channel.close()
    throw new OpenElsewhereError('another tab owns the database')
  }
  const letGo = () => {
    channel.close()
    release()
  }
  try {
    const database = await openPatiently(name)
    // the whole day is on this phone: a commit is on the disk before anybody is told so
    await database.run('PRAGMA synchronous = FULL')
    const driver = createDriver(database)
    channel.onmessage = ({ data }) => {
      if (data === TAKE_OVER) void yieldTab(driver).then(onTaken)
    }
    const close = async () => {
      await driver.close().finally(letGo)
    }
    return { ...driver, close }
  } catch (error) {
    letGo()
    if (isOwnedElsewhere(error)) throw new OpenElsewhereError('another tab owns the database', { cause: error })
    throw error
  }
}

/**
 * Lets forms write what they hold, closes the database, and loads the tab anew: the worker of SQLite keeps its file
 * handles until its page goes, and the lock goes with the page.
 */
async function yieldTab(driver: Driver): Promise<void> {
  window.dispatchEvent(new Event(KEEP_NOW))
  await driver.close()
  window.location.reload()
}

/** The worker of a tab that has just gone may hold the files for a moment longer. */
async function openPatiently(name: string): Promise<PlainDatabase> {
  for (let tries = 1; ; tries += 1) {
    try {
      return await plainSqlite(name)
    } catch (error) {
      if (!isOwnedElsewhere(error) || tries >= MOST_RETRIES) throw error
      await new Promise((resolve) => setTimeout(resolve, RETRY_MS))
    }
  }
}

/** Resolves with the function that lets the lock go, or null when another tab holds it. */
function holdLock(isTakingOver: boolean): Promise<(() => void) | null> {
  if (!('locks' in navigator)) return Promise.resolve(() => undefined)
  return new Promise((resolve, reject) => {
    const signal = AbortSignal.timeout(isTakingOver ? PATIENCE_MS : OWN_PATIENCE_MS)
    navigator.locks
      .request(LOCK, { signal }, () => new Promise<void>((letGo) => resolve(letGo)))
      .catch((error: unknown) => {
        if (error instanceof DOMException && error.name === 'TimeoutError') resolve(null)
        else reject(error)
      })
  })
}

function isOwnedElsewhere(error: unknown): boolean {
  return (
    error instanceof Error &&
    /NoModificationAllowed|createSyncAccessHandle|Access Handle/i.test(`${error.name} ${error.message}`)
  )
}
