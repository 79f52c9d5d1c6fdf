import { addFinding } from '@/server/commands/addFinding'
import { giveTickets } from '@/server/commands/giveTickets'
import { listBuilding } from '@/server/commands/listBuilding'
import type { Actor, Database } from '@/server/database'
import type { ListingPage } from '@/shared/schemas/listing'
import { runBuilding } from '@/shared/schemas/run'
import { demoId } from './seeding.types'

/** How the weighed mass of a code compares with the expected one, code by code in turn. */
const WEIGHED_SHARES = [0.94, 1.12, 0.81, 1.35, 1.02, 0.66]
const LOAD_T = 11.5
const KG_PER_T = 1_000

/** Two listed buildings: one that came down last month, with its tickets and a finding, and one of next year. */
export async function seedListings(database: Database, planner: Actor, runId: string): Promise<void> {
  const contractor: Actor = { ...planner, personId: demoId('person', 'contractor') }
  const order = { runId, recipientIds: [contractor.personId] }
  const [past, coming] = await chooseBuildings(database, planner, runId)
  if (past === undefined || coming === undefined) return
  const listed = await listBuilding({ database }, planner, {
    ...order,
    buildingId: past,
    comesDownOn: '2026-11-09',
    note: 'Access from the rear yard only.',
  })
  await giveTickets({ database }, contractor, listed.listingId, ticketsOf(listed))
  await addFinding({ database }, contractor, listed.listingId, 'Cellar under the yard, filled with brick rubble.')
  await listBuilding({ database }, planner, { ...order, buildingId: coming, comesDownOn: '2027-04-12', note: null })
}

async function chooseBuildings(database: Database, planner: Actor, runId: string): Promise<string[]> {
  const rows = await database.withScope(planner, (scope) =>
    scope.select<{ content: unknown }>(
      `SELECT content FROM run_building WHERE organisation_id = $organisationId AND run_id = $runId ORDER BY building_id`,
      { organisationId: scope.organisationId, runId },
    ),
  )
  return rows
    .map(({ content }) => runBuilding.parse(content))
    .filter(
      ({ structure, yearTo, massKg }) =>
        structure !== 'unknown' && yearTo !== null && yearTo < 1976 && massKg > 400_000,
    )
    .slice(0, 2)
    .map(({ buildingId }) => buildingId)
}

/** Loads of at most {@link LOAD_T} until the invented mass of each code is reached. */
function ticketsOf({ comparison }: ListingPage): string {
  const rows = comparison.flatMap(({ code, expectedKg }, index) => {
    let leftT = (expectedKg.likely / KG_PER_T) * (WEIGHED_SHARES[index % WEIGHED_SHARES.length] ?? 1)
    const loads: string[] = []
    while (leftT >= 0.01) {
      const massT = Math.min(LOAD_T, leftT)
      loads.push(`2026-11-${10 + (loads.length % 15)},${code},${massT.toFixed(2)}`)
      leftT -= massT
    }
    return loads
  })
  return ['date,waste_code,mass_t', ...rows].join('\n')
}
