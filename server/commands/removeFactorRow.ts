import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { notFound } from '@/server/errors'
import { lockDraftEdition } from './lockDraftEdition'
import { recordAudit } from './recordAudit'

/** Takes a row out of a draft. @throws {Refusal} `not-found`, `edition-issued` */
export async function removeFactorRow(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  { editionId, rowId }: { editionId: string; rowId: string },
): Promise<void> {
  await database.withScope(actor, async (scope) => {
    await lockDraftEdition(scope, editionId)
    const [gone] = await scope.select<{ kind: string }>(
      `DELETE FROM factor_row WHERE organisation_id = $organisationId AND edition_id = $editionId AND row_id = $rowId
       RETURNING kind`,
      { organisationId: scope.organisationId, editionId, rowId },
    )
    if (!gone) throw notFound('row of this edition')
    await recordAudit(scope, {
      action: 'factor-removed',
      subjectType: 'edition',
      subjectId: editionId,
      detail: { rowId, kind: gone.kind },
    })
  })
}
