import PgBoss from 'pg-boss'
import { QueryTypes, type Sequelize } from 'sequelize'
import { JOB_NAMES, type JobName } from './queue'

export const QUEUE_SCHEMA = 'pgboss'

const options: Readonly<Record<JobName, PgBoss.Queue>> = {
  'compute-run': { name: 'compute-run', retryLimit: 1, expireInSeconds: 900 },
  'send-mail': { name: 'send-mail', retryLimit: 6, retryDelay: 10, retryBackoff: true, expireInSeconds: 120 },
  'send-link': { name: 'send-link', retryLimit: 6, retryDelay: 10, retryBackoff: true, expireInSeconds: 120 },
}

/**
 * Makes the tables of the queue and one queue a job name, as their owner, and gives the app's role the rights to
 * send and take jobs but none to change the tables.
 */
export async function installQueue(ownerUrl: string, owner: Sequelize): Promise<void> {
  const boss = new PgBoss({
    connectionString: ownerUrl,
    schema: QUEUE_SCHEMA,
    max: 1,
    supervise: false,
    schedule: false,
  })
  await boss.start()
  try {
    for (const name of JOB_NAMES) await boss.createQueue(name, options[name])
  } finally {
    await boss.stop({ graceful: false })
  }
  await owner.query(
    `GRANT USAGE ON SCHEMA ${QUEUE_SCHEMA} TO tallystone_app;
     GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA ${QUEUE_SCHEMA} TO tallystone_app;`,
    { type: QueryTypes.RAW },
  )
}
