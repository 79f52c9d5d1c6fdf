import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import type { LookBasis } from '@/server/run/rankLooks'
import type { RunInputs } from '@/server/run/runInputs.types'
import { readFullEdition } from './readEditions'
import { readLookFrame } from './readLookFrame'

export interface FoundLookBasis extends LookBasis {
  readonly run: {
    readonly runId: string
    readonly number: number
    readonly editionNumber: number
    readonly isOfRound: boolean
  }
}

/**
 * What a ranking of a round rests on: its frame and sheets as they are now, and edition and scenario of its latest
 * finished run, else of the latest of its district.
 *
 * @returns null while the district has no finished run
 * @throws {Refusal} `not-found`
 */
export async function readLookBasis(scope: Scope, roundId: string): Promise<FoundLookBasis | null> {
  const bind = { organisationId: scope.organisationId, roundId }
  const [round] = await scope.select<{ survey_year: number; district_id: string }>(
    `SELECT extract(year FROM ends_on)::integer AS survey_year, district_id FROM round
     WHERE organisation_id = $organisationId AND round_id = $roundId`,
    bind,
  )
  if (!round) throw notFound('round')
  const [run] = await scope.select<{
    run_id: string
    number: number
    edition_id: string
    is_of_round: boolean
    inputs: RunInputs
  }>(
    `SELECT r.run_id, r.number, r.edition_id, r.round_id = $roundId AS is_of_round, r.inputs
     FROM run r JOIN round o ON o.organisation_id = r.organisation_id AND o.round_id = r.round_id
     WHERE r.organisation_id = $organisationId AND r.state = 'done' AND o.district_id = $districtId
     ORDER BY r.round_id = $roundId DESC, r.number DESC LIMIT 1`,
    { ...bind, districtId: round.district_id },
  )
  if (!run) return null
  const edition = await readFullEdition(scope, run.edition_id)
  return {
    run: { runId: run.run_id, number: run.number, editionNumber: edition.number, isOfRound: run.is_of_round },
    rows: await readLookFrame(scope, roundId),
    earlierSheets: run.is_of_round ? [] : run.inputs.sheets,
    edition: edition.rows,
    scenario: run.inputs.scenario,
    surveyYear: round.survey_year,
  }
}
