import type { Scope } from '@/server/database'
import type { Publication } from '@/shared/api/publications'

interface PublicationRow {
  publication_id: string
  run_id: string
  run_number: number
  title: string
  district_name: string
  round_name: string
  edition_number: number
  survey_year: number
  published_by_name: string
  published_at: Date
  withdrawn_at: Date | null
  withdrawal_reason: string | null
  recipients: { personId: string; name: string; firm: string | null }[]
}

export interface PublicationFilter {
  readonly publicationId?: string
  /** Only what was published to this person. */
  readonly recipientId?: string
}

/** Publications, newest first. A recipient sees those to them, and of the recipients only themselves. */
export async function readPublications(
  scope: Scope,
  { publicationId, recipientId }: PublicationFilter = {},
): Promise<Publication[]> {
  const rows = await scope.select<PublicationRow>(
    `SELECT u.publication_id, u.run_id, r.number AS run_number, u.title, d.name AS district_name, o.name AS round_name,
            e.number AS edition_number, r.survey_year, p.name AS published_by_name, u.published_at, u.withdrawn_at, u.withdrawal_reason,
            (SELECT json_agg(json_build_object('personId', t.person_id, 'name', t.name, 'firm', t.firm) ORDER BY t.name)
             FROM publication_recipient pr
             JOIN person t ON t.organisation_id = pr.organisation_id AND t.person_id = pr.person_id
             WHERE pr.organisation_id = u.organisation_id AND pr.publication_id = u.publication_id
               AND ($recipientId::uuid IS NULL OR pr.person_id = $recipientId::uuid)) AS recipients
     FROM publication u
     JOIN run r ON r.organisation_id = u.organisation_id AND r.run_id = u.run_id
     JOIN round o ON o.organisation_id = r.organisation_id AND o.round_id = r.round_id
     JOIN district d ON d.organisation_id = o.organisation_id AND d.district_id = o.district_id
     JOIN edition e ON e.organisation_id = r.organisation_id AND e.edition_id = r.edition_id
     JOIN person p ON p.organisation_id = u.organisation_id AND p.person_id = u.published_by
     WHERE u.organisation_id = $organisationId
       AND ($publicationId::uuid IS NULL OR u.publication_id = $publicationId::uuid)
       AND ($recipientId::uuid IS NULL OR EXISTS (
         SELECT FROM publication_recipient pr WHERE pr.organisation_id = u.organisation_id
           AND pr.publication_id = u.publication_id AND pr.person_id = $recipientId::uuid))
     ORDER BY u.published_at DESC`,
    { organisationId: scope.organisationId, publicationId: publicationId ?? null, recipientId: recipientId ?? null },
  )
  return rows.map((row) => ({
    publicationId: row.publication_id,
    runId: row.run_id,
    runNumber: row.run_number,
    title: row.title,
    districtName: row.district_name,
    roundName: row.round_name,
    editionNumber: row.edition_number,
    surveyYear: row.survey_year,
    publishedByName: row.published_by_name,
    publishedAt: row.published_at.toISOString(),
    withdrawnAt: row.withdrawn_at?.toISOString() ?? null,
    withdrawalReason: row.withdrawal_reason,
    recipients: row.recipients ?? [],
  }))
}
