import { QueryTypes, Sequelize, type Transaction } from 'sequelize'

/** Who acts, for the row-level policies of the database. */
export interface Actor {
  readonly organisationId: string
  readonly personId: string
}

/** One open transaction in which the database shows only the actor's organisation. */
export interface Scope {
  readonly organisationId: string
  readonly personId: string
  readonly transaction: Transaction
  /** Rows of a query with `$name` parameters; a type is promised by the caller, checked by its presenter's schema. */
  select<Row extends object>(sql: string, bind?: Readonly<Record<string, unknown>>): Promise<Row[]>
  /** Runs a statement that answers nothing of interest. */
  execute(sql: string, bind?: Readonly<Record<string, unknown>>): Promise<void>
}

export interface Database {
  readonly sequelize: Sequelize
  /**
   * Runs work in one transaction seen through row-level security; rolled back on any error.
   * `organisation_id` is set for the transaction only, so a pooled connection carries nothing over.
   */
  withScope<Result>(actor: Actor, work: (scope: Scope) => Promise<Result>, options?: ScopeOptions): Promise<Result>
  /** Statements outside any organisation: functions that the owner opened for this (sign-in, invitations). */
  selectPublic<Row extends object>(sql: string, bind?: Readonly<Record<string, unknown>>): Promise<Row[]>
  close(): Promise<void>
}

export interface ScopeOptions {
  readonly readOnly?: boolean
  readonly repeatableRead?: boolean
}

/** Opens a pool as the given role. */
export function openDatabase(url: string, { poolSize = 10 }: { poolSize?: number } = {}): Database {
  const sequelize = new Sequelize(url, {
    dialect: 'postgres',
    logging: false,
    pool: { max: poolSize, min: 0, idle: 10_000, acquire: 20_000 },
    dialectOptions: { statement_timeout: 60_000, application_name: 'tallystone' },
  })
  return {
    sequelize,
    async withScope(actor, work, options = {}) {
      return sequelize.transaction(async (transaction) => {
        const scope = makeScope(sequelize, actor, transaction)
        if (options.repeatableRead || options.readOnly) {
          const level = options.repeatableRead ? 'ISOLATION LEVEL REPEATABLE READ' : ''
          await scope.execute(`SET TRANSACTION ${level} ${options.readOnly ? 'READ ONLY' : ''}`)
        }
        await scope.execute(
          `SELECT set_config('app.organisation_id', $organisationId, true), set_config('app.person_id', $personId, true)`,
          { organisationId: actor.organisationId, personId: actor.personId },
        )
        return work(scope)
      })
    },
    selectPublic: <Row extends object>(sql: string, bind: Readonly<Record<string, unknown>> = {}) =>
      sequelize.query<Row>(sql, { bind: { ...bind }, type: QueryTypes.SELECT }),
    close: () => sequelize.close(),
  }
}

function makeScope(sequelize: Sequelize, actor: Actor, transaction: Transaction): Scope {
  return {
    ...actor,
    transaction,
    select: <Row extends object>(sql: string, bind: Readonly<Record<string, unknown>> = {}) =>
      sequelize.query<Row>(sql, { bind: { ...bind }, type: QueryTypes.SELECT, transaction }),
    async execute(sql, bind) {
      await sequelize.query(sql, { ...(bind ? { bind: { ...bind } } : {}), type: QueryTypes.RAW, transaction })
    },
  }
}
