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

const FAULT_OF = {
  constructionYear: 'sheet.yearFault',
  finding: 'sheet.yearFault',
  refurbishments: 'sheet.yearFault',
  storeys: 'sheet.storeysHint',
  parts: 'sheet.parts.fault',
  use: 'sheet.mainUseNoShare',
  heights: 'sheet.heights.fault',
} as const satisfies Partial<Record<SheetGroup, string>>

function faultOf(group: SheetGroup, answers: SheetAnswers, t: Translate): string {
  if (answers[group] === undefined) return t('common.notAnswered')
  const year = answers.constructionYear
  if (group === 'constructionYear' && year?.kind === 'between' && year.fromYear > year.toYear && year.toYear >= 1000) {
    return t('sheet.yearOrder')
  }
  return t(group in FAULT_OF ? FAULT_OF[group as keyof typeof FAULT_OF] : 'common.notANumber')
}
