import { combinedMultiplier } from '@/shared/compute/stock/combinedMultiplier'
import { HAZARD_MULTIPLIER_DEFAULTS } from '@/shared/compute/stock/hazardMultiplierDefaults'
import type { Scenario } from '@/shared/schemas/run'
import type { RunSheet } from './runInputs.types'

const { condition, vacancy, protection } = HAZARD_MULTIPLIER_DEFAULTS
const CONDITION: Readonly<Record<string, number>> = condition
const VACANCY: Readonly<Record<string, number>> = {
  'partly-vacant': vacancy.partlyVacant,
  vacant: vacancy.longTermVacant,
}

/** Condition, vacancy and protection as one multiplier of the hazard, times the calibration of the scenario. */
export function hazardMultiplierOf(
  sheet: Pick<RunSheet, 'condition' | 'vacancy' | 'isProtected'>,
  scenario: Scenario,
): number {
  if (!scenario.appliesHazardMultipliers) return scenario.hazardMultiplier
  const { applied } = combinedMultiplier([
    CONDITION[sheet.condition] ?? 1,
    VACANCY[sheet.vacancy] ?? 1,
    sheet.isProtected ? protection.protected : 1,
  ])
  return applied * scenario.hazardMultiplier
}
