import type { ReviewSheet } from '@/shared/api/review'
import { formatArea, formatDecimal, formatShare } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { ConstructionYear, KnownBy, SheetAnswers } from '@/shared/schemas/sheet'

export interface AnswerLine {
  readonly key: string
  readonly label: string
  readonly value: string
  readonly known: string
}

type Group = keyof SheetAnswers
type Words<Key extends Group> = (answer: NonNullable<SheetAnswers[Key]>) => string

/** A sheet's answers in words, each with how it is known; what the register says stands beside it. */
export function answerLines(
  { answers, outline, grossFloorAreaM2 }: ReviewSheet,
  t: Messages['t'],
  locale: string,
): AnswerLine[] {
  const register = outline?.register
  const line = <Key extends Group>(key: Key, words: Words<Key>, said?: string | null): AnswerLine => {
    const answer = answers[key]
    const value = answer === undefined ? t('common.notAnswered') : words(answer as NonNullable<SheetAnswers[Key]>)
    return {
      key,
      label: t(`review.group.${key}`),
      value: said ? `${value} (${t('review.registerSays', { said })})` : value,
      known: knownText(answer, t),
    }
  }
  const share = (value: number | null) => (value === null ? t('common.notKnown') : formatShare(value, locale))
  return [
    line('finding', (answer) => t(`vocabulary.finding.${answer.kind}`)),
    line('use', (answer) => t(`vocabulary.use.${answer.use}`), register?.use && t(`vocabulary.use.${register.use}`)),
    line('structure', (answer) => t(`vocabulary.structure.${answer.structure}`)),
    line(
      'storeys',
      (answer) => (answer.aboveGround === null ? t('common.notKnown') : formatDecimal(answer.aboveGround, locale, 1)),
      register?.storeys?.toString(),
    ),
    line('footprint', (answer) => formatArea(answer.footprintM2, locale)),
    line('attic', (answer) => share(answer.floorShare)),
    line('basement', (answer) => share(answer.floorShare)),
    line('constructionYear', (answer) => yearText(answer, t), register?.year?.toString()),
    line('condition', (answer) => t(`vocabulary.condition.${answer.condition}`)),
    line('vacancy', (answer) => t(`vocabulary.vacancy.${answer.vacancy}`)),
    line('protection', (answer) => (answer.isProtected ? t('common.yes') : t('common.no'))),
    line('notes', (answer) => answer.text),
    {
      key: 'floorArea',
      label: t('review.floorArea'),
      value: grossFloorAreaM2 === null ? t('common.notAnswered') : formatArea(grossFloorAreaM2, locale),
      known: '',
    },
  ]
}

function knownText(answer: SheetAnswers[Group], t: Messages['t']): string {
  const by = answer && 'knownBy' in answer ? (answer.knownBy as KnownBy | undefined) : undefined
  return by ? t(`vocabulary.knownBy.${by}`) : ''
}

function yearText(year: ConstructionYear, t: Messages['t']): string {
  if (year.kind === 'exact') return String(year.year)
  return year.kind === 'between' ? `${year.fromYear}–${year.toYear}` : t('common.notKnown')
}
