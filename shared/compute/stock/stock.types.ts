import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'

/** Age at the END of the construction year [yr]: 1 built at its start, 0.5 in its middle (default), 0 at its end. */
export type YearOffset = 0 | 0.5 | 1

/** When and how the years ahead are counted. Year k = 1 is the year after the survey year. */
export interface SurveyConventions {
  readonly surveyYear: number
  readonly horizonYears: number
  readonly yearOffset: YearOffset
}

/** A construction year with the chance that it is the true one of the building that stands; weights add up to 1. */
export interface YearWeight {
  readonly year: number
  readonly weight: number
}

/**
 * What is known of a construction year. `judgement`: someone looked at the standing building, all years of the range
 * are alike. `register`: the range is a class of construction activity, so years with more survivors weigh more.
 * `midpoint`: the middle year alone, for ranges of at most five years.
 */
export type ConstructionYear =
  | number
  | { readonly yearFrom: number | null; readonly yearTo: number; readonly rule: 'judgement' | 'register' | 'midpoint' }
  | { readonly possibleYears: readonly YearWeight[] }

/** A known permit to demolish: executed in year k = 1, 2, … with probability q. */
export interface DemolitionPermit {
  readonly inYear: number
  readonly executionProbability: number
}

/** Chances of a standing building, the years ahead one by one. */
export interface ComingDown {
  /** Chance to come down in year k = 1 … horizon [–]. */
  readonly chances: Float64Array
  /** Chance to stand at the end of the horizon [–]; all chances and this add up to 1. */
  readonly remaining: number
  /** Share whose model leaves no survivor at the survey [–]. */
  readonly overdueShare: number
}

/** Equal buildings that share a lifetime and a construction year. */
export interface StandingGroup {
  readonly lifetime: Lifetime
  readonly constructionYear: ConstructionYear
  /** Floor area, mass or count of all buildings together, ≥ 0. */
  readonly amount: number
  /** Number of buildings, > 0: the amount is split evenly among them. Decides the variance. */
  readonly buildingCount: number
  readonly hazardMultiplier?: number
  readonly permit?: DemolitionPermit
}
