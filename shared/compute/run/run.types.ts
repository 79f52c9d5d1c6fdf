import type { Component, Material, StructureOrUnknown, UseOrUnknown } from '@/shared/compute/factors/vocabulary'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import type { YearWeight } from '@/shared/compute/stock/stock.types'

/** One material intensity as an archetype uses it. */
export interface FactorUse {
  readonly material: Material
  /** `whole`: not split by component, so nothing of it can be renewed on its own. */
  readonly component: Component | 'whole'
  /** Identity of the figure: all archetypes with the same id share its error fully. */
  readonly factorId: string
  readonly meanKgPerM2: number
  /** Coefficient of variation of the mean, shared by every building that uses it [–]. */
  readonly sharedCv: number
  /** Coefficient of variation from building to building, independent [–]. */
  readonly betweenBuildingsCv: number
}

/** A lifetime and how sure its mean is. */
export interface LifetimeUse {
  readonly lifetimeId: string
  readonly lifetime: Lifetime
  /** The same model with its mean one standard error shorter and longer. */
  readonly shorter: Lifetime
  readonly longer: Lifetime
}

/** Buildings that share use, structure and period: one set of factors, one lifetime. */
export interface Archetype {
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly period: string
  readonly factors: readonly FactorUse[]
  readonly life: LifetimeUse
  /** Lives of the components that are renewed while the building stands. */
  readonly componentLives: Partial<Record<Component, LifetimeUse>>
}

/** Buildings of one archetype, construction year range and hazard multiplier, added up. */
export interface BuildingCell {
  /** Index into the list of archetypes. */
  readonly archetype: number
  /** First and last possible construction year; both null when nothing is known. */
  readonly yearFrom: number | null
  readonly yearTo: number | null
  readonly hazardMultiplier: number
  readonly buildingCount: number
  /** ΣA [m²], ΣA² [m⁴] and Σ(cv·A)² [m⁴] over the buildings. */
  readonly floorAreaM2: number
  readonly floorAreaSquaredM4: number
  readonly floorAreaVarianceM4: number
}

/** Mean and variance of a mass [kg, kg²], the variance apart by cause. */
export interface MassEstimate {
  readonly meanKg: number
  readonly varianceByCauseKg2: VarianceByCause
}

/** Causes of doubt, never merged: only the first shrinks when more buildings are measured. */
export interface VarianceByCause {
  readonly measurement: number
  readonly factor: number
  readonly lifetime: number
  readonly chance: number
}

export interface YearsAheadConventions {
  readonly surveyYear: number
  readonly horizonYears: number
  /** Age at the end of the construction year [yr]: 0, 0.5 or 1. */
  readonly yearOffset: number
  /** Construction years that stand for an unknown one, by archetype. */
  readonly unknownYears: (archetype: number) => readonly YearWeight[]
}
