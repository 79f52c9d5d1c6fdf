import { randomUUID } from 'node:crypto'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import { editionToRows } from '@/server/factorBook/editionToRows'
import { publishedEdition } from '@/server/factorBook/publishedEdition'
import { readEditions } from '@/server/queries/readEditions'
import type { Edition } from '@/shared/schemas/factorBook'
import { recordAudit } from './recordAudit'

/**
 * A draft as a copy of an edition, or of the published figures. Its rows keep their identity, so that editions can be
 * compared; its number is the next free one until it is issued.
 *
 * @throws {Refusal} `not-found`
 */
export async function draftEdition(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  { name, from }: { name: string; from: string },
): Promise<Edition> {
  return database.withScope(actor, async (scope) => {
    const { organisationId } = scope
    await scope.select(`SELECT 1 FROM organisation WHERE organisation_id = $organisationId FOR UPDATE`, {
      organisationId,
    })
    const editionId = randomUUID()
    await scope.execute(
      `INSERT INTO edition (organisation_id, edition_id, number, name, state)
       SELECT $organisationId, $editionId, coalesce(max(number), 0) + 1, $name, 'draft' FROM edition
       WHERE organisation_id = $organisationId`,
      { organisationId, editionId, name },
    )
    if (from === 'published') await insertPublished(scope, editionId)
    else await copyRows(scope, editionId, from)
    await recordAudit(scope, {
      action: 'edition-drafted',
      subjectType: 'edition',
      subjectId: editionId,
      detail: { from },
    })
    const [edition] = await readEditions(scope, editionId)
    return edition!
  })
}

async function insertPublished(scope: Scope, editionId: string): Promise<void> {
  await scope.execute(
    `INSERT INTO factor_row (organisation_id, edition_id, row_id, kind, position, content)
     SELECT $organisationId, $editionId, (r ->> 'row_id')::uuid, r ->> 'kind', (r ->> 'position')::integer, r -> 'content'
     FROM jsonb_array_elements($rows::jsonb) AS r`,
    { organisationId: scope.organisationId, editionId, rows: JSON.stringify(editionToRows(publishedEdition())) },
  )
}

async function copyRows(scope: Scope, editionId: string, from: string): Promise<void> {
  const [source] = await readEditions(scope, from)
  if (!source) throw notFound('edition to copy')
  await scope.execute(
    `INSERT INTO factor_row (organisation_id, edition_id, row_id, kind, position, content)
     SELECT organisation_id, $editionId, row_id, kind, position, content FROM factor_row
     WHERE organisation_id = $organisationId AND edition_id = $from`,
    { organisationId: scope.organisationId, editionId, from },
  )
}
