import {
  SHEET_GROUPS,
  type KnownBy,
  type SheetAnswers,
  type SheetGroup,
  type UnconfirmedFrom,
} from '@/shared/schemas/sheet'
import type { Unconfirmed } from './form.types'

interface Marked {
  readonly knownBy?: KnownBy
  readonly unconfirmed?: UnconfirmedFrom
}

/** Groups whose answer came from the register or from a neighbour, and that nobody has confirmed. */
export function unconfirmedAnswers(answers: SheetAnswers): Unconfirmed {
  const marked = SHEET_GROUPS.flatMap((group) => {
    const from = (answers[group] as Marked | undefined)?.unconfirmed
    return from ? [[group, from] as const] : []
  })
  return Object.fromEntries(marked)
}

/** The same answer without the mark: somebody has looked. */
export function withoutMark<Answer extends object>(answer: Answer): Answer {
  const { unconfirmed: _, ...rest } = answer as Answer & Marked
  return rest as Answer
}

/** What cannot be seen from the street stays known by the register, or guessed, when it is confirmed. */
const NOT_SEEN: ReadonlySet<SheetGroup> = new Set(['footprint', 'constructionYear'])

/** The answers of some groups, confirmed by looking. */
export function confirmedAnswers(answers: SheetAnswers, groups: readonly SheetGroup[]): SheetAnswers {
  const confirmed = groups.flatMap((group) => {
    const answer = answers[group] as Marked | undefined
    if (!answer) return []
    const seen = answer.knownBy && !NOT_SEEN.has(group) ? { knownBy: 'seen' as const } : {}
    return [[group, { ...withoutMark(answer), ...seen }]]
  })
  return Object.fromEntries(confirmed) as SheetAnswers
}
