import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { conflictWith, notFound } from '@/server/errors'
import { takeInventory } from '@/server/listing/takeInventory'
import { requireContractors } from '@/server/policies/requireContractors'
import { readFullEdition } from '@/server/queries/readEditions'
import { readListingPage } from '@/server/queries/readListings'
import { readRunSummary } from '@/server/queries/readRuns'
import type { listBuilding as endpoint } from '@/shared/api/listings'
import type { ListingPage } from '@/shared/schemas/listing'
import { runBuilding, type RunBuilding } from '@/shared/schemas/run'
import { recordAudit } from './recordAudit'

/**
 * Lists one building of a finished run with its day of demolition to chosen contractors. Its inventory is frozen, so that
 * what was shown can be compared with what is weighed.
 *
 * @throws {Refusal} `not-found`, `run-not-done`, `already-listed`, `input-not-usable` for recipients that are no contractors
 */
export function listBuilding(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  order: z.output<typeof endpoint.body>,
): Promise<ListingPage> {
  return database.withScope(actor, async (scope) => {
    const run = await readRunSummary(scope, order.runId)
    if (run.state !== 'done') {
      throw conflictWith(
        'run-not-done',
        'Only a building of a finished run can be listed. Wait for it to finish; nothing was listed.',
      )
    }
    const building = await readRunBuilding(scope, order.runId, order.buildingId)
    await refuseSecondListing(scope, order.buildingId)
    await requireContractors(scope, order.recipientIds)
    const { rows } = await readFullEdition(scope, run.editionId)
    const listingId = randomUUID()
    await scope.execute(
      `INSERT INTO listing (organisation_id, listing_id, run_id, building_id, label, comes_down_on, note, inventory, listed_by)
       VALUES ($organisationId, $listingId, $runId, $buildingId, $label, $comesDownOn, $note, $inventory::jsonb, $personId)`,
      {
        organisationId: scope.organisationId,
        personId: scope.personId,
        listingId,
        runId: order.runId,
        buildingId: order.buildingId,
        label: building.label,
        comesDownOn: order.comesDownOn,
        note: order.note === '' ? null : order.note,
        inventory: JSON.stringify(takeInventory(building, rows)),
      },
    )
    await scope.execute(
      `INSERT INTO listing_recipient (organisation_id, listing_id, person_id)
       SELECT DISTINCT $organisationId::uuid, $listingId::uuid, value::uuid FROM json_array_elements_text($recipients::json)`,
      { organisationId: scope.organisationId, listingId, recipients: JSON.stringify(order.recipientIds) },
    )
    await recordAudit(scope, { action: 'building-listed', subjectType: 'listing', subjectId: listingId })
    return readListingPage(scope, { listingId })
  })
}

/** Two inventories of one building would be weighed against the same tonnes. */
async function refuseSecondListing(scope: Scope, buildingId: string): Promise<void> {
  const [open] = await scope.select(
    `SELECT listing_id FROM listing
     WHERE organisation_id = $organisationId AND building_id = $buildingId AND withdrawn_at IS NULL`,
    { organisationId: scope.organisationId, buildingId },
  )
  if (open) {
    throw conflictWith(
      'already-listed',
      'This building is listed already. Open it in the list, or take it back first; nothing was listed.',
    )
  }
}

async function readRunBuilding(scope: Scope, runId: string, buildingId: string): Promise<RunBuilding> {
  const [row] = await scope.select<{ content: unknown }>(
    `SELECT content FROM run_building
     WHERE organisation_id = $organisationId AND run_id = $runId AND building_id = $buildingId`,
    { organisationId: scope.organisationId, runId, buildingId },
  )
  if (!row) throw notFound('building of this run')
  return runBuilding.parse(row.content)
}
