import type { Scope } from '@/server/database'
import { conflictWith } from '@/server/errors'
import { presentLooks } from '@/server/presenters/presentLooks'
import { refuseFigureBeforeSurvey } from '@/server/policies/refuseFigureBeforeSurvey'
import { isRecorded, rankLooks } from '@/server/run/rankLooks'
import { sharesOfVariance } from '@/shared/compute/run/stockOfCells'
import type { NextLooksReply } from '@/shared/api/nextLook'
import type { ChosenLookFigure } from '@/shared/schemas/nextLook'
import { readLookBasis } from './readLookBasis'
import { readLookFigure } from './readLookFigure'

/**
 * The ranking of a round for a figure, or for the chosen one.
 *
 * @throws {Refusal} `not-found`, `no-finished-run`, `input-not-usable` for a year that is not ahead of the survey
 */
export async function readNextLook(
  scope: Scope,
  roundId: string,
  wanted: Partial<ChosenLookFigure>,
): Promise<NextLooksReply> {
  const basis = await readLookBasis(scope, roundId)
  if (!basis) {
    throw conflictWith(
      'no-finished-run',
      'There is no finished run of this district yet, so nobody knows what is in doubt. Start a run under Stock; nothing was changed.',
    )
  }
  const chosenFigure = await readLookFigure(scope, roundId)
  const figure = wanted.material ? { material: wanted.material, byYear: wanted.byYear ?? null } : chosenFigure
  refuseFigureBeforeSurvey(figure, basis.surveyYear)
  const ranked = rankLooks(basis, figure)
  const beats = await scope.select<{ beatId: string; name: string }>(
    `SELECT beat_id AS "beatId", name FROM beat
     WHERE organisation_id = $organisationId AND round_id = $roundId AND deleted_at IS NULL ORDER BY lower(name), beat_id`,
    { organisationId: scope.organisationId, roundId },
  )
  return {
    figure,
    chosenFigure,
    surveyYear: basis.surveyYear,
    run: basis.run,
    frameCount: basis.rows.length,
    recordedCount: basis.rows.filter(isRecorded).length,
    meanKg: ranked.doubt.meanKg,
    varianceKg2: ranked.varianceKg2,
    varianceShares: sharesOfVariance(ranked.doubt.varianceByCauseKg2),
    beats,
    looks: presentLooks(ranked, basis.rows),
  }
}
