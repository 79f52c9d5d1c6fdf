import { formatArea, formatDecimal, formatShare } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import { sheetAnswers, type SheetAnswers } from '@/shared/schemas/sheet'

/** The answer of one group in words; what a group holds beside its main figure follows as it stands. */
export function sayAnswer(group: string, value: unknown, t: Messages['t'], locale: string): string {
  if (group === 'deletion') return t(isDeletion(value) ? 'bag.deleted' : 'bag.notDeleted')
  const parsed = sheetAnswers.safeParse({ [group]: value })
  const words = parsed.success ? wordsOf(parsed.data, t, locale) : null
  return words ?? (leavesOf(value).join(' · ') || t('common.notAnswered'))
}

function wordsOf(answers: SheetAnswers, t: Messages['t'], locale: string): string | null {
  return figureOf(answers, locale) ?? kindOf(answers, t) ?? answers.notes?.text ?? null
}

function figureOf({ storeys, footprint, attic, basement }: SheetAnswers, locale: string): string | null {
  if (typeof storeys?.aboveGround === 'number') return formatDecimal(storeys.aboveGround, locale, 1)
  if (footprint) return formatArea(footprint.footprintM2, locale)
  const share = (attic ?? basement)?.floorShare
  return typeof share === 'number' ? formatShare(share, locale) : null
}

function kindOf({ use, structure, finding, condition, vacancy }: SheetAnswers, t: Messages['t']): string | null {
  if (use) return t(`vocabulary.use.${use.use}`)
  if (structure) return t(`vocabulary.structure.${structure.structure}`)
  if (finding) return t(`vocabulary.finding.${finding.kind}`)
  if (condition) return t(`vocabulary.condition.${condition.condition}`)
  return vacancy ? t(`vocabulary.vacancy.${vacancy.vacancy}`) : null
}

function isDeletion(value: unknown): boolean {
  return typeof value === 'object' && value !== null && Reflect.get(value, 'isDeleted') === true
}

function leavesOf(value: unknown): string[] {
  if (value === null || value === undefined) return []
  if (typeof value !== 'object') return [String(value).replaceAll('-', ' ')]
  return Object.entries(value).flatMap(([key, inner]) => (key === 'knownBy' ? [] : leavesOf(inner)))
}
