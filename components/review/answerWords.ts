import { formatArea, formatDecimal, formatShare } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { BuildingPart, ConstructionYear, SheetAnswers } from '@/shared/schemas/sheet'

type Answer<Key extends keyof SheetAnswers> = NonNullable<SheetAnswers[Key]>

/** How each group of answers reads in words; the position is shown on the map instead. */
export type AnswerWords = { readonly [Key in Exclude<keyof SheetAnswers, 'position'>]: (answer: Answer<Key>) => string }

const NOTHING = '–'

/** The words of every group of a sheet in one language. */
export function answerWords({ t, locale }: Messages): AnswerWords {
  const share = (value: number | null): string => (value === null ? t('common.notKnown') : formatShare(value, locale))
  const number = (value: number | null): string =>
    value === null ? t('common.notKnown') : formatDecimal(value, locale, 1)
  const year = (value: ConstructionYear): string => yearWords(value, t)
  const metres = (label: string, value: number | null): string[] =>
    value === null ? [] : [`${label} ${formatDecimal(value, locale, 1)}\u00a0m`]
  const part = ({ name, footprintM2, aboveGround, use, structure, constructionYear }: BuildingPart): string =>
    [
      name,
      formatArea(footprintM2, locale),
      t('review.storeysOf', { storeys: number(aboveGround) }),
      use === null ? t('sheet.parts.asMain') : t(`vocabulary.use.${use}`),
      t(`vocabulary.structure.${structure}`),
      year(constructionYear),
    ].join(', ')
  return {
    finding: (answer) =>
      answer.kind === 'cleared' && answer.clearedYear !== null
        ? `${t('vocabulary.finding.cleared')} ${answer.clearedYear}`
        : t(`vocabulary.finding.${answer.kind}`),
    use: ({ use, otherUses = [] }) =>
      [
        t(`vocabulary.use.${use}`),
        ...otherUses.map((other) => `${t(`vocabulary.use.${other.use}`)} ${formatShare(other.share, locale)}`),
      ].join('; '),
    structure: ({ structure }) => t(`vocabulary.structure.${structure}`),
    storeys: ({ aboveGround }) => number(aboveGround),
    footprint: ({ footprintM2 }) => formatArea(footprintM2, locale),
    attic: ({ floorShare }) => share(floorShare),
    basement: ({ floorShare }) => share(floorShare),
    constructionYear: year,
    condition: ({ condition }) => t(`vocabulary.condition.${condition}`),
    vacancy: ({ vacancy }) => t(`vocabulary.vacancy.${vacancy}`),
    protection: ({ isProtected }) => t(isProtected ? 'common.yes' : 'common.no'),
    parts: ({ parts }) => parts.map(part).join('; ') || NOTHING,
    heights: ({ eavesM, ridgeM, storeyHeightM }) =>
      [
        ...metres(t('sheet.heights.eavesM'), eavesM),
        ...metres(t('sheet.heights.ridgeM'), ridgeM),
        ...metres(t('sheet.heights.storeyHeightM'), storeyHeightM),
      ].join(', ') || NOTHING,
    roof: ({ form, cover }) =>
      [form && t(`sheet.roofForms.${form}`), cover && t(`sheet.roofCovers.${cover}`)].filter(Boolean).join(', ') ||
      NOTHING,
    facade: ({ facade }) => t(`sheet.facades.${facade}`),
    openings: ({ openingsShare }) => share(openingsShare),
    refurbishments: ({ done }) =>
      done.map((one) => `${t(`vocabulary.component.${one.component}`)} ${year(one.year)}`).join('; ') || NOTHING,
    permitNotice: ({ notice, reference }) =>
      [t(`sheet.permitNotices.${notice}`), reference].filter((text) => text !== '').join(', '),
    suspicions: ({ seen }) => seen.join('; ') || NOTHING,
    notes: ({ text }) => text,
  }
}

function yearWords(year: ConstructionYear, t: Messages['t']): string {
  if (year.kind === 'exact') return String(year.year)
  return year.kind === 'between' ? `${year.fromYear}–${year.toYear}` : t('common.notKnown')
}
