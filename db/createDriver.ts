import type { Driver, PlainDatabase, Statements } from './driver.types'

/** Puts one queue before a database, because its own transactions let other statements in between. */
export function createDriver(database: PlainDatabase): Driver {
  let last: Promise<unknown> = Promise.resolve()
  const queued = <Result>(work: () => Promise<Result>): Promise<Result> => {
    const next = last.then(work, work)
    last = next.catch(() => undefined)
    return next
  }
  const inside: Statements = {
    run: (sql, values) => database.run(sql, values),
    all: (sql, values) => database.all(sql, values),
  }
  return {
    run: (sql, values) => queued(() => database.run(sql, values)),
    all: (sql, values) => queued(() => database.all(sql, values)),
    transaction: (work) =>
      queued(async () => {
        await database.run('BEGIN IMMEDIATE')
        try {
          const result = await work(inside)
          await database.run('COMMIT')
          return result
        } catch (error) {
          await database.run('ROLLBACK').catch(() => undefined)
          throw error
        }
      }),
    close: () => queued(() => database.close()),
  }
}
