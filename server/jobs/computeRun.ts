import type { Context } from '@/server/context'
import type { Scope } from '@/server/database'
import { describeFault } from '@/server/middleware/describeFault'
import { readFullEdition } from '@/server/queries/readEditions'
import { canonicalJson, sha256Of } from '@/server/run/canonicalJson'
import { computeRunResult, type ComputedRun } from '@/server/run/computeRunResult'
import type { RunInputs } from '@/server/run/runInputs.types'
import { ComputeError } from '@/shared/compute/errors'
import type { JobPayloads } from './queue'

/**
 * Computes a queued run and stores its result, whole or not at all. Safe to run again after a crash: a run that is
 * done or cancelled is left alone, one that was under way is computed anew from its frozen inputs.
 */
export async function computeRun({ database, log }: Pick<Context, 'database' | 'log'>, job: JobPayloads['compute-run']): Promise<void> {
  const { runId } = job
  const taken = await database.withScope(job, (scope) => takeRun(scope, runId))
  if (!taken) return
  try {
    const edition = await database.withScope(job, (scope) => readFullEdition(scope, taken.editionId))
    const computed = computeRunResult(taken.inputs, edition.rows)
    await database.withScope(job, (scope) => storeResult(scope, runId, computed))
  } catch (error) {
    log.warn({ runId, fault: describeFault(error) }, 'run failed')
    await database.withScope(job, (scope) => storeFailure(scope, runId, inWords(error)))
  }
}

async function takeRun(scope: Scope, runId: string): Promise<{ inputs: RunInputs; editionId: string } | null> {
  const [run] = await scope.select<{ inputs: RunInputs; edition_id: string }>(
    `UPDATE run SET state = 'running', progress_share = 0.1
     WHERE organisation_id = $organisationId AND run_id = $runId AND state IN ('queued', 'running')
     RETURNING inputs, edition_id`,
    { organisationId: scope.organisationId, runId },
  )
  return run ? { inputs: run.inputs, editionId: run.edition_id } : null
}

async function storeResult(scope: Scope, runId: string, { result, buildings }: ComputedRun): Promise<void> {
  const text = canonicalJson(result)
  const [stored] = await scope.select<{ run_id: string }>(
    `UPDATE run SET state = 'done', progress_share = 1, result = $result::jsonb, result_sha256 = $digest, finished_at = now()
     WHERE organisation_id = $organisationId AND run_id = $runId AND state = 'running' RETURNING run_id`,
    { organisationId: scope.organisationId, runId, result: text, digest: sha256Of(text) },
  )
  if (!stored) return
  await scope.execute(
    `INSERT INTO run_building (organisation_id, run_id, building_id, content)
     SELECT $organisationId, $runId, (content ->> 'buildingId')::uuid, content FROM jsonb_array_elements($buildings::jsonb) AS content`,
    { organisationId: scope.organisationId, runId, buildings: JSON.stringify(buildings) },
  )
}

async function storeFailure(scope: Scope, runId: string, failure: string): Promise<void> {
  await scope.execute(
    `UPDATE run SET state = 'failed', failure = $failure, finished_at = now()
     WHERE organisation_id = $organisationId AND run_id = $runId AND state IN ('queued', 'running')`,
    { organisationId: scope.organisationId, runId, failure },
  )
}

function inWords(error: unknown): string {
  if (!(error instanceof ComputeError))
    return 'The computation failed at a fault of ours. The sheets are safe; start the run again.'
  if (error.code === 'factor-missing')
    return 'The edition has no lifetime for some buildings. Add the missing row to the factor book and start a new run.'
  return `An input cannot be computed (${error.code}). The sheets are safe; correct it and start a new run.`
}
