import {
  COMPONENTS,
  MATERIALS,
  PERIOD_IDS,
  STRUCTURES,
  USES,
  type Component,
  type Structure,
  type Use,
} from '@/shared/compute/factors/vocabulary'
import type { Messages } from '@/shared/messages/messages.types'

/** Names of what a row of the factor book holds for. */
export interface FactorNames {
  readonly use: (use: Use | 'all') => string
  readonly structure: (structure: Structure | 'all') => string
  readonly period: (period: string) => string
  readonly component: (component: string) => string
  readonly material: (material: string | null) => string
}

/** Names in the language of the reader; a word that is none of ours stands as it is. */
export function factorNames({ t }: Messages): FactorNames {
  const any = t('factorBook.any')
  const components = new Map<string, string>([
    ...COMPONENTS.map((component: Component): [string, string] => [component, t(`vocabulary.component.${component}`)]),
    ['whole', t('factorBook.whole')],
    ['building', t('factorBook.building')],
  ])
  const materials = new Map<string, string>(
    MATERIALS.map((material) => [material, t(`vocabulary.material.${material}`)]),
  )
  const periods = new Map<string, string>([
    ...PERIOD_IDS.map((period): [string, string] => [period, t(`vocabulary.period.${period}`)]),
    ['all', any],
  ])
  return {
    use: (use) => (use === 'all' ? any : t(`vocabulary.use.${use}`)),
    structure: (structure) => (structure === 'all' ? any : t(`vocabulary.structure.${structure}`)),
    period: (period) => periods.get(period) ?? period,
    component: (component) => components.get(component) ?? component,
    material: (material) => (material === null ? '' : (materials.get(material) ?? material)),
  }
}

/** Words a filter offers, `all` first. */
export const FILTER_WORDS = {
  structure: ['all', ...STRUCTURES],
  use: ['all', ...USES],
  material: ['all', ...MATERIALS],
} as const
