import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import {
  runBuilding,
  runResult,
  scenario,
  type RunBuilding,
  type RunResult,
  type RunSummary,
} from '@/shared/schemas/run'

interface RunRow {
  run_id: string
  number: number
  state: RunSummary['state']
  progress_share: number
  failure: string | null
  round_id: string
  round_name: string
  district_id: string
  district_name: string
  edition_id: string
  edition_number: number
  scenario: unknown
  survey_year: number
  engine_version: string
  seed: number
  inputs_sha256: string | null
  result_sha256: string | null
  created_at: Date
  created_by_name: string
}

export interface RunFilter {
  readonly runId?: string
  readonly roundId?: string | undefined
}

/** Runs, newest first. */
export async function readRuns(scope: Scope, { runId, roundId }: RunFilter = {}): Promise<RunSummary[]> {
  const rows = await scope.select<RunRow>(
    `SELECT r.run_id, r.number, r.state, r.progress_share, r.failure, r.round_id, o.name AS round_name, d.district_id,
            d.name AS district_name, r.edition_id, e.number AS edition_number, r.scenario, r.survey_year, r.engine_version,
            r.seed, r.inputs_sha256, r.result_sha256, r.created_at, p.name AS created_by_name
     FROM run r
     JOIN round o ON o.organisation_id = r.organisation_id AND o.round_id = r.round_id
     JOIN district d ON d.organisation_id = o.organisation_id AND d.district_id = o.district_id
     JOIN edition e ON e.organisation_id = r.organisation_id AND e.edition_id = r.edition_id
     JOIN person p ON p.organisation_id = r.organisation_id AND p.person_id = r.created_by
     WHERE r.organisation_id = $organisationId
       AND ($runId::uuid IS NULL OR r.run_id = $runId::uuid) AND ($roundId::uuid IS NULL OR r.round_id = $roundId::uuid)
     ORDER BY r.number DESC`,
    { organisationId: scope.organisationId, runId: runId ?? null, roundId: roundId ?? null },
  )
  return rows.map(presentRun)
}

export async function readRunSummary(scope: Scope, runId: string): Promise<RunSummary> {
  const [run] = await readRuns(scope, { runId })
  if (!run) throw notFound('run')
  return run
}

/** The result of a run, or null while it is not done. */
export async function readRunResult(scope: Scope, runId: string): Promise<RunResult | null> {
  const [row] = await scope.select<{ result: unknown }>(
    `SELECT result FROM run WHERE organisation_id = $organisationId AND run_id = $runId`,
    { organisationId: scope.organisationId, runId },
  )
  return row?.result ? runResult.parse(row.result) : null
}

export async function readRunBuildings(scope: Scope, runId: string): Promise<RunBuilding[]> {
  await readRunSummary(scope, runId)
  const rows = await scope.select<{ content: unknown }>(
    `SELECT content FROM run_building WHERE organisation_id = $organisationId AND run_id = $runId ORDER BY building_id`,
    { organisationId: scope.organisationId, runId },
  )
  return rows.map(({ content }) => runBuilding.parse(content))
}

function presentRun(row: RunRow): RunSummary {
  return {
    runId: row.run_id,
    number: row.number,
    state: row.state,
    progressShare: row.progress_share,
    failure: row.failure,
    roundId: row.round_id,
    roundName: row.round_name,
    districtId: row.district_id,
    districtName: row.district_name,
    editionId: row.edition_id,
    editionNumber: row.edition_number,
    scenario: scenario.parse(row.scenario),
    surveyYear: row.survey_year,
    engineVersion: row.engine_version,
    seed: Number(row.seed),
    inputsSha256: row.inputs_sha256,
    resultSha256: row.result_sha256,
    createdAt: row.created_at.toISOString(),
    createdByName: row.created_by_name,
  }
}
