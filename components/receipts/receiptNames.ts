import {
  COMPONENTS,
  PERIOD_IDS,
  type Component,
  type StructureOrUnknown,
  type UseOrUnknown,
} from '@/shared/compute/factors/vocabulary'
import { formatYearRange } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { ReceiptFigure } from '@/shared/schemas/receipt'

/** "timber coming down, 2027–2036: terraced house". */
export function figureName(figure: ReceiptFigure, { t }: Messages): string {
  const { kind, material, fromYear, toYear } = figure
  const name = material === 'all' ? t('receipts.allMaterials') : t(`vocabulary.material.${material}`)
  const years = fromYear === null || toYear === null ? '' : formatYearRange(fromYear, toYear)
  const whole = t(`receipts.${kind}`, { material: name, years })
  const group = groupName(figure, t)
  return group === '' ? whole : t('receipts.ofGroup', { figure: whole, group })
}

interface GroupKey {
  readonly use: UseOrUnknown | null
  readonly structure: StructureOrUnknown | null
  readonly period: string | null
}

/** "terraced house, masonry with timber floors, before 1919"; empty where nothing is chosen. */
export function groupName({ use, structure, period }: GroupKey, t: Messages['t']): string {
  return [
    ...(use === null ? [] : [t(`vocabulary.use.${use}`)]),
    ...(structure === null ? [] : [t(`vocabulary.structure.${structure}`)]),
    ...(period === null ? [] : [periodName(period, t)]),
  ].join(', ')
}

export function periodName(period: string, t: Messages['t']): string {
  if (period === 'all') return t('factorBook.any')
  const known = PERIOD_IDS.find((id) => id === period) ?? 'unknown'
  return t(`vocabulary.period.${known}`)
}

export function componentName(component: Component | 'whole' | 'building', t: Messages['t']): string {
  const known = COMPONENTS.find((one) => one === component)
  return known ? t(`vocabulary.component.${known}`) : t('receipts.wholeBuilding')
}
