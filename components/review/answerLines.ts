import type { ReviewSheet } from '@/shared/api/review'
import { formatArea } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { SheetAnswers } from '@/shared/schemas/sheet'
import { answerWords, type AnswerWords } from './answerWords'

export interface AnswerLine {
  readonly key: string
  readonly label: string
  readonly value: string
  readonly known: string
}

type Group = keyof AnswerWords

/** Groups every sheet of a standing building answers, also when they are not answered. */
const ALWAYS: readonly Group[] = [
  'finding',
  'use',
  'structure',
  'storeys',
  'footprint',
  'attic',
  'basement',
  'constructionYear',
  'condition',
  'vacancy',
  'protection',
]
/** Groups that are shown where somebody answered them. */
const WHERE_ANSWERED: readonly Group[] = [
  'parts',
  'heights',
  'roof',
  'facade',
  'openings',
  'refurbishments',
  'permitNotice',
  'suspicions',
  'notes',
]

/**
 * A sheet's answers in words, each with how it is known; what the register says stands beside it, and what nobody has
 * confirmed is said to be so.
 */
export function answerLines({ answers, outline, grossFloorAreaM2 }: ReviewSheet, messages: Messages): AnswerLine[] {
  const { t, locale } = messages
  const words = answerWords(messages)
  const register = outline?.register
  const said: Partial<Record<Group, string | undefined>> = {
    use: register?.use ? t(`vocabulary.use.${register.use}`) : undefined,
    storeys: register?.storeys?.toString(),
    constructionYear: register?.year?.toString(),
  }
  const lineOf = (key: Group): AnswerLine => {
    const value = valueOf(key, answers, words) ?? t('common.notAnswered')
    const registerSays = said[key]
    return {
      key,
      label: t(`review.group.${key}`),
      value: registerSays ? `${value} (${t('review.registerSays', { said: registerSays })})` : value,
      known: knownText(answers[key], t),
    }
  }
  return [
    ...ALWAYS.map(lineOf),
    ...WHERE_ANSWERED.filter((key) => answers[key] !== undefined).map(lineOf),
    {
      key: 'floorArea',
      label: t('review.floorArea'),
      value: grossFloorAreaM2 === null ? t('common.notAnswered') : formatArea(grossFloorAreaM2, locale),
      known: '',
    },
  ]
}

function valueOf<Key extends Group>(key: Key, answers: SheetAnswers, words: AnswerWords): string | undefined {
  const answer = answers[key]
  return answer === undefined ? undefined : words[key](answer)
}

function knownText(answer: SheetAnswers[Group], t: Messages['t']): string {
  if (answer === undefined) return ''
  const by = 'knownBy' in answer && answer.knownBy !== undefined ? [t(`vocabulary.knownBy.${answer.knownBy}`)] : []
  const open =
    'unconfirmed' in answer && answer.unconfirmed !== undefined ? [t(`review.unconfirmed.${answer.unconfirmed}`)] : []
  return [...by, ...open].join(', ')
}
