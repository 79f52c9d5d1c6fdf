import { randomUUID } from 'node:crypto'
import type { Actor, Scope } from '@/server/database'
import type { Context } from '@/server/context'
import { conflictWith, notFound, unusable } from '@/server/errors'
import { readFullEdition } from '@/server/queries/readEditions'
import { readRunSummary } from '@/server/queries/readRuns'
import { canonicalJson, sha256Of } from '@/server/run/canonicalJson'
import { readCheckedSheets, readFrameCounts } from '@/server/run/readRunInputs'
import { ENGINE_VERSION, type RunInputs, type RunSheet } from '@/server/run/runInputs.types'
import type { RunSummary, Scenario } from '@/shared/schemas/run'
import { recordAudit } from './recordAudit'

export interface RunOrder {
  readonly roundId: string
  readonly editionId: string
  readonly scenario: Scenario
  readonly seed: number
}

/**
 * Freezes the checked sheets of a round as they stand, one edition and one scenario as the inputs of a run, and
 * queues its computation.
 *
 * @throws {Refusal} unknown round or edition, an edition that is not issued, no checked sheet, a year after the survey
 */
export async function startRun(context: Context, actor: Actor, order: RunOrder): Promise<RunSummary> {
  const run = await context.database.withScope(actor, (scope) => insertRun(scope, order))
  await context.queue.send('compute-run', {
    organisationId: actor.organisationId,
    personId: actor.personId,
    runId: run.runId,
  })
  return context.database.withScope(actor, (scope) => readRunSummary(scope, run.runId))
}

/** The run with its inputs, queued, in the transaction of the scope. */
export async function insertRun(scope: Scope, order: RunOrder): Promise<RunSummary> {
  const inputs = await freezeInputs(scope, order)
  const runId = randomUUID()
  // one run at a time takes a number: the row of the organisation is held to the end of the transaction
  await scope.select(`SELECT 1 FROM organisation WHERE organisation_id = $organisationId FOR UPDATE`, {
    organisationId: scope.organisationId,
  })
  const text = canonicalJson(inputs)
  await scope.execute(
    `INSERT INTO run (organisation_id, run_id, number, round_id, edition_id, scenario, survey_year, engine_version, seed, state,
                      inputs, inputs_sha256, created_by)
     SELECT $organisationId, $runId, coalesce(max(number), 0) + 1, $roundId, $editionId, $scenario::jsonb, $surveyYear, $engineVersion,
            $seed::bigint, 'queued', $inputs::jsonb, $digest, $personId
     FROM run WHERE organisation_id = $organisationId`,
    {
      organisationId: scope.organisationId,
      personId: scope.personId,
      runId,
      roundId: order.roundId,
      editionId: order.editionId,
      scenario: JSON.stringify(order.scenario),
      surveyYear: inputs.surveyYear,
      engineVersion: ENGINE_VERSION,
      seed: order.seed,
      inputs: text,
      digest: sha256Of(text),
    },
  )
  await recordAudit(scope, { action: 'run-started', subjectType: 'run', subjectId: runId })
  return readRunSummary(scope, runId)
}

async function freezeInputs(scope: Scope, { roundId, editionId, scenario, seed }: RunOrder): Promise<RunInputs> {
  const [round] = await scope.select<{ survey_year: number }>(
    `SELECT extract(year FROM ends_on)::integer AS survey_year FROM round WHERE organisation_id = $organisationId AND round_id = $roundId`,
    { organisationId: scope.organisationId, roundId },
  )
  if (!round) throw notFound('round')
  const edition = await readFullEdition(scope, editionId)
  if (edition.state !== 'issued') {
    throw conflictWith(
      'edition-not-issued',
      'A run needs an issued edition, because a draft may still change. Issue it first; nothing was started.',
    )
  }
  const sheets = await readCheckedSheets(scope, roundId)
  if (sheets.length === 0) {
    throw conflictWith(
      'no-checked-sheets',
      'No sheet of this round that records a standing building is checked yet, so there is nothing to add up. Accept sheets in Review first; nothing was started.',
    )
  }
  refuseLateYears(sheets, round.survey_year)
  return {
    engineVersion: ENGINE_VERSION,
    surveyYear: round.survey_year,
    seed,
    scenario,
    editionId,
    editionSha256: sha256Of(canonicalJson(edition.rows)),
    frame: await readFrameCounts(scope, roundId),
    sheets,
  }
}

function refuseLateYears(sheets: readonly RunSheet[], surveyYear: number): void {
  const late = sheets.filter(({ yearTo }) => yearTo !== null && yearTo > surveyYear)
  if (late.length === 0) return
  throw unusable(
    `${late.length} checked sheets give a construction year after the survey year ${surveyYear}. Send them back or correct them; nothing was started.`,
    late.slice(0, 50).map(({ buildingId, label, yearTo }) => ({
      pointer: `/sheets/${buildingId}/constructionYear`,
      code: 'year-after-survey',
      detail: `${label}: ${yearTo} is after ${surveyYear}.`,
    })),
  )
}
