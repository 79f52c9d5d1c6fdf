/** What a column may hold; bytes never do, they lie beside the database. */
export type SqlValue = string | number | null

export interface Statements {
  run(sql: string, values?: readonly SqlValue[]): Promise<void>
  all<Row>(sql: string, values?: readonly SqlValue[]): Promise<Row[]>
}

/** The one way to the device's database. Every statement and transaction waits in one queue. */
export interface Driver extends Statements {
  /** All of the work or nothing of it. @throws whatever the work throws, after everything was rolled back */
  transaction<Result>(work: (inside: Statements) => Promise<Result>): Promise<Result>
  close(): Promise<void>
}

/** A database without a queue, as a platform gives it. */
export interface PlainDatabase extends Statements {
  close(): Promise<void>
}

/** Another tab owns the database of this browser. */
export class OpenElsewhereError extends Error {
  override readonly name = 'OpenElsewhereError'
}
