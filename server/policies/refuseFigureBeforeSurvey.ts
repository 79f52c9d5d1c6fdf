import { unusable } from '@/server/errors'
import type { ChosenLookFigure } from '@/shared/schemas/nextLook'

/** Years ahead begin the year after the survey, and a run computes two hundred of them at most. */
const MOST_YEARS_AHEAD = 200

/** @throws {Refusal} `input-not-usable` for a year in which nothing ahead is counted */
export function refuseFigureBeforeSurvey({ byYear }: ChosenLookFigure, surveyYear: number): void {
  if (byYear === null || (byYear > surveyYear && byYear <= surveyYear + MOST_YEARS_AHEAD)) return
  throw unusable(
    `What comes down is counted from ${surveyYear + 1} on, for at most ${MOST_YEARS_AHEAD} years. Nothing was changed; choose a year in between.`,
    [
      {
        pointer: '/byYear',
        code: 'year-not-ahead',
        detail: `${byYear} is not between ${surveyYear + 1} and ${surveyYear + MOST_YEARS_AHEAD}.`,
      },
    ],
  )
}
