import { pino } from 'pino'
import { publishRun } from '@/server/commands/publishRun'
import { insertRun } from '@/server/commands/startRun'
import { openDatabase } from '@/server/database'
import { computeRun } from '@/server/jobs/computeRun'
import { scenario } from '@/shared/schemas/run'
import { seedListings } from './seedListings'
import { demoId } from './seeding.types'

/** Runs of the demo go the way of every run, so their figures are real figures of invented sheets. */
const RUNS = [
  { round: 'ropewalk-2021', name: 'Book lifetimes, not calibrated', hazardMultiplier: 1, isPublished: false },
  { round: 'kiln-2026', name: 'Calibrated on demolitions seen since 2020', hazardMultiplier: 0.3, isPublished: true },
] as const

/** Computes two runs of the demo, publishes one to its contractors, and lists two of its buildings. */
export async function seedRuns(ownerUrl: string): Promise<void> {
  const database = openDatabase(ownerUrl, { poolSize: 2 })
  const log = pino({ level: 'silent' })
  const planner = { organisationId: demoId('organisation'), personId: demoId('person', 'planner') }
  try {
    for (const { round, name, hazardMultiplier, isPublished } of RUNS) {
      const order = {
        roundId: demoId('round', round),
        editionId: demoId('edition', 1),
        scenario: scenario.parse({ name, hazardMultiplier }),
        seed: 1,
      }
      const { runId } = await database.withScope(planner, (scope) => insertRun(scope, order))
      await computeRun({ database, log }, { ...planner, runId })
      if (isPublished) {
        const recipientIds = [demoId('person', 'contractor'), demoId('person', 'contractor-2')]
        await publishRun({ database }, planner, { runId, title: 'Kiln Quarter, years ahead', recipientIds })
        await seedListings(database, planner, runId)
      }
    }
  } finally {
    await database.close()
  }
}
