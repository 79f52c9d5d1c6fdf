import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import { rowsToEdition, type FactorRecord } from '@/server/factorBook/editionToRows'
import { editionRows, type Edition, type FullEdition } from '@/shared/schemas/factorBook'

interface EditionRow {
  edition_id: string
  number: number
  name: string
  state: Edition['state']
  issued_at: Date | null
  issued_by_name: string | null
  note: string | null
}

/** Editions of the factor book, newest first, or the one asked for. */
export async function readEditions(scope: Scope, editionId?: string): Promise<Edition[]> {
  const rows = await scope.select<EditionRow>(
    `SELECT e.edition_id, e.number, e.name, e.state, e.issued_at, e.note, p.name AS issued_by_name
     FROM edition e LEFT JOIN person p ON p.organisation_id = e.organisation_id AND p.person_id = e.issued_by
     WHERE e.organisation_id = $organisationId AND ($editionId::uuid IS NULL OR e.edition_id = $editionId::uuid)
     ORDER BY e.number DESC`,
    { organisationId: scope.organisationId, editionId: editionId ?? null },
  )
  return rows.map((row) => ({
    editionId: row.edition_id,
    number: row.number,
    name: row.name,
    state: row.state,
    issuedAt: row.issued_at?.toISOString() ?? null,
    issuedByName: row.issued_by_name,
    note: row.note,
  }))
}

/** One edition with all its rows. */
export async function readFullEdition(scope: Scope, editionId: string): Promise<FullEdition> {
  const [edition] = await readEditions(scope, editionId)
  if (!edition) throw notFound('edition')
  const records = await scope.select<Pick<FactorRecord, 'kind' | 'content'>>(
    `SELECT kind, content FROM factor_row WHERE organisation_id = $organisationId AND edition_id = $editionId ORDER BY kind, position`,
    { organisationId: scope.organisationId, editionId },
  )
  return { ...edition, rows: editionRows.parse(rowsToEdition(records)) }
}
