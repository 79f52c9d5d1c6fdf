import type { Translate } from '@/shared/messages/messages.types'
import type { SheetAnswers, SheetGroup } from '@/shared/schemas/sheet'
import type { SectionProps } from './form.types'

/** Words beside each answer that keeps a sheet from going in the bag. */
export function sectionFaults(
  unready: readonly SheetGroup[],
  answers: SheetAnswers,
  t: Translate,
): SectionProps['faults'] {
  return Object.fromEntries(unready.map((group) => [group, faultOf(group, answers, t)]))
}

function faultOf(group: SheetGroup, answers: SheetAnswers, t: Translate): string {
  if (answers[group] === undefined) return t('common.notAnswered')
  const year = answers.constructionYear
  if (group === 'constructionYear' && year?.kind === 'between' && year.fromYear > year.toYear && year.toYear >= 1000) {
    return t('sheet.yearOrder')
  }
  if (group === 'constructionYear' || group === 'finding') return t('sheet.yearFault')
  if (group === 'storeys') return t('sheet.storeysHint')
  return t('common.notANumber')
}
