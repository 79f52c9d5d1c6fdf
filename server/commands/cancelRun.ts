import type { Context } from '@/server/context'
import type { Actor } from '@/server/database'
import { conflictWith } from '@/server/errors'
import { readRunSummary } from '@/server/queries/readRuns'
import type { RunSummary } from '@/shared/schemas/run'
import { recordAudit } from './recordAudit'

/** Stops a run that is not done; a finished one stays as it is. */
export function cancelRun({ database }: Context, actor: Actor, runId: string): Promise<RunSummary> {
  return database.withScope(actor, async (scope) => {
    await readRunSummary(scope, runId)
    const [cancelled] = await scope.select<{ run_id: string }>(
      `UPDATE run SET state = 'cancelled', finished_at = now()
       WHERE organisation_id = $organisationId AND run_id = $runId AND state IN ('queued', 'running') RETURNING run_id`,
      { organisationId: scope.organisationId, runId },
    )
    if (!cancelled) throw conflictWith('run-ended', 'This run has already ended; nothing was changed.')
    await recordAudit(scope, { action: 'run-cancelled', subjectType: 'run', subjectId: runId })
    return readRunSummary(scope, runId)
  })
}
