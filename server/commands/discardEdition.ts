import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { lockDraftEdition } from './lockDraftEdition'
import { recordAudit } from './recordAudit'

/** Deletes a draft with its rows. @throws {Refusal} `not-found`, `edition-issued` */
export async function discardEdition(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  editionId: string,
): Promise<void> {
  await database.withScope(actor, async (scope) => {
    const { name } = await lockDraftEdition(scope, editionId)
    const ids = { organisationId: scope.organisationId, editionId }
    await scope.execute(
      'DELETE FROM factor_row WHERE organisation_id = $organisationId AND edition_id = $editionId',
      ids,
    )
    await scope.execute('DELETE FROM edition WHERE organisation_id = $organisationId AND edition_id = $editionId', ids)
    await recordAudit(scope, {
      action: 'edition-discarded',
      subjectType: 'edition',
      subjectId: editionId,
      detail: { name },
    })
  })
}
