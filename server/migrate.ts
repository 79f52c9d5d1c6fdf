import { QueryTypes, Sequelize } from 'sequelize'
import { SequelizeStorage, Umzug } from 'umzug'
import { installQueue, QUEUE_SCHEMA } from './jobs/installQueue'
import { allMigrations } from './migrations/allMigrations'

/**
 * Brings the schema up to date, one transaction a step; as the owner of the tables.
 *
 * @returns names of the steps that were taken now
 */
export async function migrate(ownerUrl: string): Promise<string[]> {
  return withOwner(ownerUrl, async (sequelize) => {
    const taken = await makeUmzug(sequelize).up()
    await sequelize.query('GRANT SELECT ON schema_step TO tallystone_app', { type: QueryTypes.RAW })
    await installQueue(ownerUrl, sequelize)
    return taken.map((step) => step.name)
  })
}

/** Takes all steps back; for tests of the way back. */
export async function migrateDown(ownerUrl: string): Promise<void> {
  await withOwner(ownerUrl, async (sequelize) => {
    await makeUmzug(sequelize).down({ to: 0 })
    await sequelize.query(`DROP SCHEMA IF EXISTS ${QUEUE_SCHEMA} CASCADE`, { type: QueryTypes.RAW })
  })
}

/** Name of the last step this program knows; a database without it is not ready. */
export const LAST_MIGRATION = allMigrations.at(-1)?.name ?? ''

async function withOwner<Result>(ownerUrl: string, work: (sequelize: Sequelize) => Promise<Result>): Promise<Result> {
  const sequelize = new Sequelize(ownerUrl, { dialect: 'postgres', logging: false, pool: { max: 2 } })
  try {
    return await work(sequelize)
  } finally {
    await sequelize.close()
  }
}

function makeUmzug(sequelize: Sequelize) {
  return new Umzug({
    migrations: allMigrations.map(({ name, up, down }) => ({
      name,
      up: () => runStep(sequelize, up),
      down: () => runStep(sequelize, down),
    })),
    storage: new SequelizeStorage({ sequelize, modelName: 'schema_step', tableName: 'schema_step' }),
    logger: undefined,
  })
}

async function runStep(sequelize: Sequelize, sql: string): Promise<void> {
  await sequelize.transaction((transaction) => sequelize.query(sql, { type: QueryTypes.RAW, transaction }))
}
