import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { conflictWith } from '@/server/errors'
import { readListingPage } from '@/server/queries/readListings'
import type { ListingPage } from '@/shared/schemas/listing'
import { recordAudit } from './recordAudit'

/** Takes a listed building back; its readers see the reason, nothing is deleted. */
export function withdrawListing(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  listingId: string,
  reason: string,
): Promise<ListingPage> {
  return database.withScope(actor, async (scope) => {
    const { withdrawnAt } = await readListingPage(scope, { listingId })
    if (withdrawnAt !== null) {
      throw conflictWith('already-withdrawn', 'This building was taken back before; nothing was changed.')
    }
    await scope.execute(
      `UPDATE listing SET withdrawn_at = now(), withdrawn_by = $personId, withdrawal_reason = $reason
       WHERE organisation_id = $organisationId AND listing_id = $listingId`,
      { organisationId: scope.organisationId, personId: scope.personId, listingId, reason },
    )
    await recordAudit(scope, { action: 'listing-withdrawn', subjectType: 'listing', subjectId: listingId })
    return readListingPage(scope, { listingId })
  })
}
