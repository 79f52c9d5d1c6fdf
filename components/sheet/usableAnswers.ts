import { sheetGroups, SHEET_GROUPS, type SheetAnswers } from '@/shared/schemas/sheet'

/** The answers that hold as they are; one that is half typed counts as not answered. */
export function usableAnswers(answers: SheetAnswers): SheetAnswers {
  const usable = SHEET_GROUPS.filter((group) => sheetGroups[group].safeParse(answers[group]).success)
  return Object.fromEntries(usable.map((group) => [group, answers[group]])) as SheetAnswers
}
