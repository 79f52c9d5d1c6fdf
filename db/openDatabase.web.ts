import { createDriver } from './createDriver'
import { OpenElsewhereError, type Driver } from './driver.types'
import type { OpenOptions } from './openDatabase.types'
import { plainSqlite } from './plainSqlite'

const LOCK = 'tallystone-database'
const TAKE_OVER = 'take-over'

/**
 * Opens the database of one person. One tab owns it: a Web Lock is held as long as it is open, because a second tab
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
    const database = await plainSqlite(name)
    // the whole day is on this phone: a commit is on the disk before anybody is told so
    await database.run('PRAGMA synchronous = FULL')
    const driver = createDriver(database)
    const close = async () => {
      await driver.close()
      letGo()
    }
    channel.onmessage = ({ data }) => {
      if (data === TAKE_OVER) void close().then(onTaken)
    }
    return { ...driver, close }
  } catch (error) {
    letGo()
    if (isOwnedElsewhere(error)) throw new OpenElsewhereError('another tab owns the database', { cause: error })
    throw error
  }
}

/** Resolves with the function that lets the lock go, or null when another tab holds it. */
function holdLock(waits: boolean): Promise<(() => void) | null> {
  if (!('locks' in navigator)) return Promise.resolve(() => undefined)
  return new Promise((resolve, reject) => {
    navigator.locks
      .request(LOCK, waits ? {} : { ifAvailable: true }, (lock) => {
        if (!lock) {
          resolve(null)
          return undefined
        }
        return new Promise<void>((letGo) => resolve(letGo))
      })
      .catch(reject)
  })
}

function isOwnedElsewhere(error: unknown): boolean {
  return error instanceof Error && /NoModificationAllowed|createSyncAccessHandle/.test(`${error.name} ${error.message}`)
}
