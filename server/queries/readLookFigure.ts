import type { Scope } from '@/server/database'
import { FIRST_LOOK_FIGURE, lookFigure, type ChosenLookFigure } from '@/shared/schemas/nextLook'

/** The figure a planner chose for a round; the first one until somebody has. */
export async function readLookFigure(scope: Scope, roundId: string): Promise<ChosenLookFigure> {
  const [row] = await scope.select<{ figure: unknown }>(
    `SELECT figure FROM look_figure WHERE organisation_id = $organisationId AND round_id = $roundId`,
    { organisationId: scope.organisationId, roundId },
  )
  return row ? lookFigure.parse(row.figure) : FIRST_LOOK_FIGURE
}
