import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { recordAudit } from './recordAudit'
import { lockWaiting } from './releaseQuarantined'

/**
 * Says that work that was set apart shall not count, and why. Its content stays where it is.
 *
 * @throws {Refusal} `not-found`, `already-settled`
 */
export async function discardQuarantined(
  { database, now }: Pick<Context, 'database' | 'now'>,
  actor: Actor,
  mutationId: string,
  { why }: { why: string },
): Promise<{ state: 'discarded' }> {
  await database.withScope(actor, async (scope) => {
    await lockWaiting(scope, mutationId)
    await scope.execute(
      `UPDATE quarantine SET state = 'discarded', settled_by = $personId, settled_at = $now, settled_note = $why
       WHERE organisation_id = $organisationId AND mutation_id = $mutationId`,
      { organisationId: scope.organisationId, personId: scope.personId, mutationId, now: now(), why },
    )
    await recordAudit(scope, { action: 'quarantine-discarded', subjectType: 'mutation', subjectId: mutationId })
  })
  return { state: 'discarded' }
}
