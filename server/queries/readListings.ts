import type { Scope } from '@/server/database'
import { notFound, Refusal } from '@/server/errors'
import { compareWithTickets, type WeighedCode } from '@/server/listing/compareWithTickets'
import { inventory, type Listing, type ListingPage } from '@/shared/schemas/listing'

interface ListingRow {
  listing_id: string
  building_id: string
  label: string
  district_name: string
  run_number: number
  edition_number: number
  comes_down_on: string
  note: string | null
  inventory: unknown
  listed_by_name: string
  listed_at: Date
  withdrawn_at: Date | null
  withdrawal_reason: string | null
  recipients: Listing['recipients'] | null
}

export interface ListingFilter {
  readonly listingId?: string
  /** Only what was listed to this person; of the recipients they then see only themselves. */
  readonly recipientId?: string
}

/** Listed buildings, those that come down first at the top. */
export async function readListings(scope: Scope, filter: ListingFilter = {}): Promise<Listing[]> {
  return (await selectListings(scope, filter)).map(presentListing)
}

/**
 * One listed building with its inventory, findings and weighed tonnes. A contractor sees only their own findings and
 * tickets.
 *
 * @throws {Refusal} `not-found`, `listing-withdrawn` to a contractor
 */
export async function readListingPage(
  scope: Scope,
  filter: Required<Pick<ListingFilter, 'listingId'>> & ListingFilter,
): Promise<ListingPage> {
  const [row] = await selectListings(scope, filter)
  if (!row) throw notFound('listing')
  if (filter.recipientId !== undefined && row.withdrawn_at !== null) {
    throw new Refusal(
      410,
      'listing-withdrawn',
      `This building was taken back: ${row.withdrawal_reason ?? ''} Do not plan with its inventory.`,
    )
  }
  const taken = inventory.parse(row.inventory)
  return {
    ...presentListing(row),
    inventory: taken,
    findings: await readFindings(scope, filter),
    comparison: compareWithTickets(taken, await readWeighed(scope, filter)),
  }
}

function selectListings(scope: Scope, { listingId, recipientId }: ListingFilter): Promise<ListingRow[]> {
  return scope.select<ListingRow>(
    `SELECT l.listing_id, l.building_id, l.label, d.name AS district_name, r.number AS run_number,
            e.number AS edition_number, l.comes_down_on::text, l.note, l.inventory, p.name AS listed_by_name, l.listed_at,
            l.withdrawn_at, l.withdrawal_reason,
            (SELECT json_agg(json_build_object('personId', t.person_id, 'name', t.name, 'firm', t.firm) ORDER BY t.name)
             FROM listing_recipient lr
             JOIN person t ON t.organisation_id = lr.organisation_id AND t.person_id = lr.person_id
             WHERE lr.organisation_id = l.organisation_id AND lr.listing_id = l.listing_id
               AND ($recipientId::uuid IS NULL OR lr.person_id = $recipientId::uuid)) AS recipients
     FROM listing l
     JOIN run r ON r.organisation_id = l.organisation_id AND r.run_id = l.run_id
     JOIN round o ON o.organisation_id = r.organisation_id AND o.round_id = r.round_id
     JOIN district d ON d.organisation_id = o.organisation_id AND d.district_id = o.district_id
     JOIN edition e ON e.organisation_id = r.organisation_id AND e.edition_id = r.edition_id
     JOIN person p ON p.organisation_id = l.organisation_id AND p.person_id = l.listed_by
     WHERE l.organisation_id = $organisationId
       AND ($listingId::uuid IS NULL OR l.listing_id = $listingId::uuid)
       AND ($recipientId::uuid IS NULL OR EXISTS (
         SELECT FROM listing_recipient lr WHERE lr.organisation_id = l.organisation_id
           AND lr.listing_id = l.listing_id AND lr.person_id = $recipientId::uuid))
     ORDER BY l.withdrawn_at IS NOT NULL, l.comes_down_on, l.listed_at`,
    {
      organisationId: scope.organisationId,
      listingId: listingId ?? null,
      recipientId: recipientId ?? null,
    },
  )
}

function presentListing(row: ListingRow): Listing {
  return {
    listingId: row.listing_id,
    buildingId: row.building_id,
    label: row.label,
    districtName: row.district_name,
    runNumber: row.run_number,
    editionNumber: row.edition_number,
    comesDownOn: row.comes_down_on,
    note: row.note,
    massKg: inventory.parse(row.inventory).lines.reduce((total, { massKg }) => total + massKg.likely, 0),
    listedByName: row.listed_by_name,
    listedAt: row.listed_at.toISOString(),
    withdrawnAt: row.withdrawn_at?.toISOString() ?? null,
    withdrawalReason: row.withdrawal_reason,
    recipients: row.recipients ?? [],
  }
}

async function readFindings(scope: Scope, filter: ListingFilter): Promise<ListingPage['findings']> {
  const rows = await scope.select<{ finding_id: string; by_name: string; at: Date; text: string }>(
    `SELECT f.finding_id, coalesce(p.firm, p.name) AS by_name, f.at, f.text
     FROM listing_finding f JOIN person p ON p.organisation_id = f.organisation_id AND p.person_id = f.person_id
     WHERE f.organisation_id = $organisationId AND f.listing_id = $listingId
       AND ($recipientId::uuid IS NULL OR f.person_id = $recipientId::uuid)
     ORDER BY f.at, f.finding_id`,
    bindOf(scope, filter),
  )
  return rows.map(({ finding_id, by_name, at, text }) => ({
    findingId: finding_id,
    byName: by_name,
    at: at.toISOString(),
    text,
  }))
}

async function readWeighed(scope: Scope, filter: ListingFilter): Promise<WeighedCode[]> {
  const rows = await scope.select<{ waste_code: string; mass_kg: number; tickets: number }>(
    `SELECT waste_code, sum(mass_kg) AS mass_kg, count(*)::integer AS tickets FROM weighbridge_ticket
     WHERE organisation_id = $organisationId AND listing_id = $listingId
       AND ($recipientId::uuid IS NULL OR person_id = $recipientId::uuid)
     GROUP BY waste_code`,
    bindOf(scope, filter),
  )
  return rows.map(({ waste_code, mass_kg, tickets }) => ({ code: waste_code, massKg: mass_kg, tickets }))
}

const bindOf = (scope: Scope, { listingId, recipientId }: ListingFilter) => ({
  organisationId: scope.organisationId,
  listingId: listingId ?? null,
  recipientId: recipientId ?? null,
})
