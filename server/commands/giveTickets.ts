import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { parseTickets } from '@/server/listing/parseTickets'
import { readListingPage } from '@/server/queries/readListings'
import type { ListingPage } from '@/shared/schemas/listing'
import { recordAudit } from './recordAudit'

/**
 * Takes a contractor's weighbridge tickets in place of those they gave before: all rows or none.
 *
 * @throws {Refusal} `not-found`, `listing-withdrawn`, `input-not-usable` with the faults by row
 */
export function giveTickets(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  listingId: string,
  csv: string,
): Promise<ListingPage> {
  const tickets = parseTickets(csv)
  return database.withScope(actor, async (scope) => {
    const { organisationId, personId } = scope
    const filter = { listingId, recipientId: personId }
    await readListingPage(scope, filter)
    await scope.execute(
      `DELETE FROM weighbridge_ticket
       WHERE organisation_id = $organisationId AND listing_id = $listingId AND person_id = $personId`,
      { organisationId, listingId, personId },
    )
    await scope.execute(
      `INSERT INTO weighbridge_ticket (organisation_id, listing_id, person_id, position, weighed_on, waste_code, mass_kg)
       SELECT $organisationId, $listingId, $personId, position, "weighedOn", code, "massKg"
       FROM ROWS FROM (json_to_recordset($tickets::json) AS ("weighedOn" date, code text, "massKg" double precision))
         WITH ORDINALITY AS t("weighedOn", code, "massKg", position)`,
      { organisationId, listingId, personId, tickets: JSON.stringify(tickets) },
    )
    await recordAudit(scope, {
      action: 'tickets-given',
      subjectType: 'listing',
      subjectId: listingId,
      detail: { tickets: tickets.length },
    })
    return readListingPage(scope, filter)
  })
}
