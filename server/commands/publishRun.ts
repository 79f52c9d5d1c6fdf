import { randomUUID } from 'node:crypto'
import type { Context } from '@/server/context'
import type { Actor, Scope } from '@/server/database'
import { conflictWith, notFound } from '@/server/errors'
import { requireContractors } from '@/server/policies/requireContractors'
import { readPublications } from '@/server/queries/readPublications'
import { readRunSummary } from '@/server/queries/readRuns'
import type { Publication } from '@/shared/api/publications'
import { recordAudit } from './recordAudit'

export interface PublicationOrder {
  readonly runId: string
  readonly title: string
  readonly recipientIds: readonly string[]
}

/** Publishes a finished run, for its district as a whole, to chosen contractors. */
export function publishRun(
  { database }: Pick<Context, 'database'>,
  actor: Actor,
  order: PublicationOrder,
): Promise<Publication> {
  return database.withScope(actor, async (scope) => {
    const run = await readRunSummary(scope, order.runId)
    if (run.state !== 'done')
      throw conflictWith(
        'run-not-done',
        'Only a finished run can be published. Wait for it to finish; nothing was published.',
      )
    await requireContractors(scope, order.recipientIds)
    const publicationId = randomUUID()
    await scope.execute(
      `INSERT INTO publication (organisation_id, publication_id, run_id, title, published_by)
       VALUES ($organisationId, $publicationId, $runId, $title, $personId)`,
      {
        organisationId: scope.organisationId,
        personId: scope.personId,
        publicationId,
        runId: order.runId,
        title: order.title,
      },
    )
    await scope.execute(
      `INSERT INTO publication_recipient (organisation_id, publication_id, person_id)
       SELECT DISTINCT $organisationId::uuid, $publicationId::uuid, value::uuid FROM json_array_elements_text($recipients::json)`,
      { organisationId: scope.organisationId, publicationId, recipients: JSON.stringify(order.recipientIds) },
    )
    await recordAudit(scope, { action: 'run-published', subjectType: 'publication', subjectId: publicationId })
    return onePublication(scope, publicationId)
  })
}

/** Takes a publication back; its readers see the reason, nothing is deleted. */
export function withdrawPublication(
  { database }: Context,
  actor: Actor,
  publicationId: string,
  reason: string,
): Promise<Publication> {
  return database.withScope(actor, async (scope) => {
    const publication = await onePublication(scope, publicationId)
    if (publication.withdrawnAt !== null)
      throw conflictWith('already-withdrawn', 'This publication was withdrawn before; nothing was changed.')
    await scope.execute(
      `UPDATE publication SET withdrawn_at = now(), withdrawn_by = $personId, withdrawal_reason = $reason
       WHERE organisation_id = $organisationId AND publication_id = $publicationId`,
      { organisationId: scope.organisationId, personId: scope.personId, publicationId, reason },
    )
    await recordAudit(scope, { action: 'publication-withdrawn', subjectType: 'publication', subjectId: publicationId })
    return onePublication(scope, publicationId)
  })
}

async function onePublication(scope: Scope, publicationId: string): Promise<Publication> {
  const [publication] = await readPublications(scope, { publicationId })
  if (!publication) throw notFound('publication')
  return publication
}
