import { createDriver } from './createDriver'
import type { Driver } from './driver.types'
import type { OpenOptions } from './openDatabase.types'
import { plainSqlite } from './plainSqlite'

/** Opens the database of one person; an app on a phone has it for itself. */
export async function openDatabase(name: string, _options: OpenOptions): Promise<Driver> {
  const database = await plainSqlite(name)
  await database.run('PRAGMA journal_mode = WAL')
  await database.run('PRAGMA synchronous = FULL')
  return createDriver(database)
}
