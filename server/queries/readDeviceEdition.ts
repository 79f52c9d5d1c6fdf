import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import type { EditionForDevice } from '@/shared/schemas/factorBook'

/** The latest issued edition with what a phone needs for its estimate. @throws {Refusal} `not-found` before the first */
export async function readDeviceEdition(scope: Scope): Promise<EditionForDevice> {
  const [row] = await scope.select<{
    edition_id: string
    number: number
    name: string
    issued_at: Date | null
    issued_by_name: string | null
    intensities: EditionForDevice['intensities'] | null
    suspicions: EditionForDevice['suspicions'] | null
  }>(
    `SELECT e.edition_id, e.number, e.name, e.issued_at, p.name AS issued_by_name,
       (SELECT json_agg(f.content ORDER BY f.position) FILTER (WHERE f.kind = 'intensity') FROM factor_row f
        WHERE f.organisation_id = e.organisation_id AND f.edition_id = e.edition_id) AS intensities,
       (SELECT json_agg(f.content ORDER BY f.position) FILTER (WHERE f.kind = 'suspicion') FROM factor_row f
        WHERE f.organisation_id = e.organisation_id AND f.edition_id = e.edition_id) AS suspicions
     FROM edition e
     LEFT JOIN person p ON p.organisation_id = e.organisation_id AND p.person_id = e.issued_by
     WHERE e.organisation_id = $organisationId AND e.state = 'issued' ORDER BY e.number DESC LIMIT 1`,
    { organisationId: scope.organisationId },
  )
  if (!row) throw notFound('issued edition of the factor book')
  return {
    editionId: row.edition_id,
    number: row.number,
    name: row.name,
    state: 'issued',
    issuedAt: row.issued_at?.toISOString() ?? null,
    issuedByName: row.issued_by_name,
    intensities: row.intensities ?? [],
    suspicions: row.suspicions ?? [],
  } satisfies EditionForDevice
}
