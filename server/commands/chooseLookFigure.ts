import type { Scope } from '@/server/database'
import { notFound } from '@/server/errors'
import { refuseFigureBeforeSurvey } from '@/server/policies/refuseFigureBeforeSurvey'
import type { ChosenLookFigure } from '@/shared/schemas/nextLook'
import { recordAudit } from './recordAudit'

/**
 * Sets the figure that the phones of a round are to make surer.
 *
 * @throws {Refusal} `not-found`, `input-not-usable`
 */
export async function chooseLookFigure(
  scope: Scope,
  roundId: string,
  figure: ChosenLookFigure,
): Promise<ChosenLookFigure> {
  const { organisationId, personId } = scope
  const [round] = await scope.select<{ survey_year: number }>(
    `SELECT extract(year FROM ends_on)::integer AS survey_year FROM round WHERE organisation_id = $organisationId AND round_id = $roundId`,
    { organisationId, roundId },
  )
  if (!round) throw notFound('round')
  refuseFigureBeforeSurvey(figure, round.survey_year)
  await scope.execute(
    `INSERT INTO look_figure (organisation_id, round_id, figure, chosen_by) VALUES ($organisationId, $roundId, $figure::jsonb, $personId)
     ON CONFLICT (organisation_id, round_id) DO UPDATE SET figure = EXCLUDED.figure, chosen_by = EXCLUDED.chosen_by, chosen_at = now()`,
    { organisationId, roundId, personId, figure: JSON.stringify(figure) },
  )
  await recordAudit(scope, { action: 'look-figure-chosen', subjectType: 'round', subjectId: roundId, detail: figure })
  return figure
}
