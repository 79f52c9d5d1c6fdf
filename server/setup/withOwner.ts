import { QueryTypes, Sequelize, type Transaction } from 'sequelize'

/** The database as the owner of its tables, in one transaction; for setting up, never for a request. */
export interface OwnerScope {
  select<Row extends object>(sql: string, bind?: Readonly<Record<string, unknown>>): Promise<Row[]>
}

/** Runs work as the owner, whole or not at all. */
export async function withOwner<Result>(
  ownerUrl: string,
  work: (owner: OwnerScope) => Promise<Result>,
): Promise<Result> {
  const sequelize = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false, pool: { max: 1 } })
  try {
    return await sequelize.transaction((transaction: Transaction) =>
      work({
        select: <Row extends object>(sql: string, bind: Readonly<Record<string, unknown>> = {}) =>
          sequelize.query<Row>(sql, { bind: { ...bind }, type: QueryTypes.SELECT, transaction }),
      }),
    )
  } finally {
    await sequelize.close()
  }
}
