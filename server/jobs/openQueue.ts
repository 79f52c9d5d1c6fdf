import PgBoss from 'pg-boss'
import type { Logger } from 'pino'
import { describeFault } from '@/server/middleware/describeFault'
import type { JobName, JobPayloads, Queue } from './queue'
import { QUEUE_SCHEMA } from './installQueue'

const STOP_TIMEOUT_MS = 20_000
const POLL_S = 0.5

/** The queue in PostgreSQL, as the app's role. Its schema is made by {@link installQueue} before. */
export async function openQueue(databaseUrl: string, log: Logger): Promise<Queue> {
  const boss = new PgBoss({
    connectionString: databaseUrl,
    schema: QUEUE_SCHEMA,
    application_name: 'tallystone-queue',
    max: 3,
    migrate: false,
    schedule: false,
    archiveCompletedAfterSeconds: 3_600,
    deleteAfterDays: 7,
  })
  boss.on('error', (error) => log.error({ fault: describeFault(error) }, 'queue failed'))
  await boss.start()
  return {
    async send<Name extends JobName>(name: Name, payload: JobPayloads[Name]) {
      await boss.send(name, payload)
    },
    async work<Name extends JobName>(name: Name, handler: (payload: JobPayloads[Name]) => Promise<void>) {
      await boss.work<JobPayloads[Name]>(name, { pollingIntervalSeconds: POLL_S, batchSize: 1 }, async (jobs) => {
        for (const job of jobs) await runJob(name, () => handler(job.data), log)
      })
    },
    async isReady() {
      return Boolean(await boss.isInstalled())
    },
    stop: () => boss.stop({ graceful: true, wait: true, timeout: STOP_TIMEOUT_MS }),
  }
}

async function runJob(name: JobName, run: () => Promise<void>, log: Logger): Promise<void> {
  try {
    await run()
  } catch (error) {
    log.error({ job: name, fault: describeFault(error) }, 'job failed')
    throw new Error(`job ${name} failed`)
  }
}
