import { randomUUID } from 'node:crypto'
import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { readListingPage } from '@/server/queries/readListings'
import type { ListingPage } from '@/shared/schemas/listing'

/** Keeps what a contractor found on site. @throws {Refusal} `not-found`, `listing-withdrawn` */
export function addFinding(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  listingId: string,
  text: string,
): Promise<ListingPage> {
  return database.withScope(actor, async (scope) => {
    const filter = { listingId, recipientId: scope.personId }
    await readListingPage(scope, filter)
    await scope.execute(
      `INSERT INTO listing_finding (organisation_id, finding_id, listing_id, person_id, text)
       VALUES ($organisationId, $findingId, $listingId, $personId, $text)`,
      {
        organisationId: scope.organisationId,
        findingId: randomUUID(),
        listingId,
        personId: scope.personId,
        text,
      },
    )
    return readListingPage(scope, filter)
  })
}
