import type { SheetAnswers, SheetGroup } from '@/shared/schemas/sheet'

/** What neighbours in one row often share; condition, vacancy and warnings are each building's own. */
const SHARED_BY_NEIGHBOURS = [
  'use',
  'structure',
  'storeys',
  'attic',
  'basement',
  'constructionYear',
  'roof',
  'facade',
  'openings',
] as const satisfies readonly SheetGroup[]

/** The answers of the building recorded last for what is not answered here, as a guess and marked until it is confirmed. */
export function sameAsLast(last: SheetAnswers, here: SheetAnswers): SheetAnswers {
  const taken = SHARED_BY_NEIGHBOURS.flatMap((group) => {
    const answer = last[group]
    if (here[group] !== undefined || answer === undefined) return []
    const isYearUnknown = 'kind' in answer && answer.kind === 'unknown'
    return isYearUnknown ? [] : [[group, { ...answer, knownBy: 'guessed', unconfirmed: 'same-as-last' }]]
  })
  return Object.fromEntries(taken) as SheetAnswers
}
