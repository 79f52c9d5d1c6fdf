import { openDatabaseAsync } from 'expo-sqlite'
import type { PlainDatabase, SqlValue } from './driver.types'

/** Opens a database file of expo-sqlite; only its asynchronous calls are used. */
export async function plainSqlite(name: string): Promise<PlainDatabase> {
  const database = await openDatabaseAsync(name)
  return {
    async run(sql: string, values: readonly SqlValue[] = []) {
      if (values.length === 0) await database.execAsync(sql)
      else await database.runAsync(sql, [...values])
    },
    all: <Row>(sql: string, values: readonly SqlValue[] = []) => database.getAllAsync<Row>(sql, [...values]),
    close: () => database.closeAsync(),
  }
}
