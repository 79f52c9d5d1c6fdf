import type { Material } from '@/shared/compute/factors/vocabulary'
import { formatDecimal, formatMass, formatShare } from '@/shared/format'
import type { Messages } from '@/shared/messages/messages.types'
import type { RunBuilding } from '@/shared/schemas/run'

export const MEASURES = ['perFootprint', 'standing', 'expectedTenYears', 'chanceTenYears', 'chanceThirtyYears'] as const
/** What a building is painted by. */
export type Measure = (typeof MEASURES)[number]

/** Mass of a building in one material or in all [kg]; null when the factor of the material is missing. */
export function buildingMassKg(building: RunBuilding, material: Material | 'all'): number | null {
  return material === 'all' ? building.massKg : (building.massByMaterialKg[material] ?? null)
}

/**
 * What the map paints a building by: tonnes per m², kilograms or a chance.
 *
 * @returns null when the factor of the material is missing, which is not nought
 */
export function buildingMeasure(building: RunBuilding, measure: Measure, material: Material | 'all'): number | null {
  if (measure === 'chanceTenYears') return building.chanceTenYears
  if (measure === 'chanceThirtyYears') return building.chanceThirtyYears
  const massKg = buildingMassKg(building, material)
  if (massKg === null) return null
  if (measure === 'standing') return massKg
  if (measure === 'expectedTenYears') return massKg * building.chanceTenYears
  return building.footprintM2 > 0 ? massKg / 1000 / building.footprintM2 : null
}

/** A value of a measure for people. */
export function formatMeasure(value: number, measure: Measure, { t, locale }: Messages): string {
  if (measure === 'perFootprint') return t('district.perSquareMetre', { figure: formatDecimal(value, locale, 2) })
  if (measure === 'standing' || measure === 'expectedTenYears') return formatMass(value, locale)
  return formatShare(value, locale)
}
