import Database from 'better-sqlite3'
import { createDriver } from '@/db/createDriver'
import type { Driver, SqlValue } from '@/db/driver.types'

/** The device's database in memory or in a file, with the same queue before it. */
export function memoryDriver(file = ':memory:'): Driver {
  const database = new Database(file)
  return createDriver({
    async run(sql: string, values: readonly SqlValue[] = []) {
      if (values.length === 0) database.exec(sql)
      else database.prepare(sql).run(...values)
    },
    async all<Row>(sql: string, values: readonly SqlValue[] = []): Promise<Row[]> {
      return database.prepare<SqlValue[], Row>(sql).all(...values)
    },
    async close() {
      database.close()
    },
  })
}
