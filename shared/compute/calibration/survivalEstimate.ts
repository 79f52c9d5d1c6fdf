import { normalQuantile } from '@/shared/compute/uncertainty/normalQuantile'
import { requireLives, type ObservedLife } from './observedLives'

/** One age at which something came down. */
export interface SurvivalStep {
  readonly ageYears: number
  readonly atRisk: number
  readonly demolished: number
  /** Kaplan–Meier share still standing, and its standard error by Greenwood; null once nothing stands. */
  readonly survival: number
  readonly standardError: number | null
  /** Limits on the log scale, the upper one at most 1. */
  readonly lower: number | null
  readonly upper: number | null
  /** Nelson–Aalen cumulative hazard. */
  readonly cumulativeHazard: number
}

export interface SurvivalEstimate {
  readonly steps: readonly SurvivalStep[]
  /** First age at which half or fewer stand; null when it is not reached. */
  readonly medianYears: number | null
  /** Fewest at risk at any step; below 10 the estimate should be made conditional on a later age. */
  readonly smallestRiskSet: number
}

/**
 * Kaplan–Meier and Nelson–Aalen estimates with delayed entry: at age t at risk are those with entry < t ≤ exit,
 *
 *     Ŝ = Π(1 − d/n),   Var Ŝ = Ŝ²·Σ d/(n(n − d)),   Ĥ = Σ d/n.
 *
 * @param confidence of the limits, in (0, 1)
 * @throws {ComputeError} `empty-input`, `interval-reversed`
 * @see Klein, J. P. & Moeschberger, M. L. (2003). Survival Analysis, 2nd ed., ch. 4.
 * @example
 * survivalEstimate([{ entryAgeYears: 0, exitAgeYears: 9, isDemolished: true }, { entryAgeYears: 0, exitAgeYears: 12, isDemolished: false }]).steps[0].survival // => 0.5
 */
export function survivalEstimate(lives: readonly ObservedLife[], confidence = 0.95): SurvivalEstimate {
  requireLives(lives)
  const z = normalQuantile((1 + confidence) / 2)
  const ages = [
    ...new Set(lives.filter(({ isDemolished }) => isDemolished).map(({ exitAgeYears }) => exitAgeYears)),
  ].sort((a, b) => a - b)
  const entries = lives.map(({ entryAgeYears }) => entryAgeYears).sort((a, b) => a - b)
  const exits = lives.map(({ exitAgeYears }) => exitAgeYears).sort((a, b) => a - b)
  let survival = 1
  let greenwood = 0
  let cumulativeHazard = 0
  const steps = ages.map((ageYears): SurvivalStep => {
    const atRisk = countBelow(entries, ageYears) - countBelow(exits, ageYears)
    const demolished = lives.filter((life) => life.isDemolished && life.exitAgeYears === ageYears).length
    survival *= 1 - demolished / atRisk
    cumulativeHazard += demolished / atRisk
    greenwood += demolished / (atRisk * (atRisk - demolished))
    const spread = Math.sqrt(greenwood)
    const stands = atRisk > demolished && survival > 0
    return {
      ageYears,
      atRisk,
      demolished,
      survival,
      standardError: stands ? survival * spread : null,
      lower: stands ? survival * Math.exp(-z * spread) : null,
      upper: stands ? Math.min(1, survival * Math.exp(z * spread)) : null,
      cumulativeHazard,
    }
  })
  return {
    steps,
    medianYears: steps.find((step) => step.survival <= 0.5)?.ageYears ?? null,
    smallestRiskSet: Math.min(...steps.map(({ atRisk }) => atRisk)),
  }
}

/** How many of the ascending values are below the limit. */
function countBelow(ascending: readonly number[], limit: number): number {
  let [low, high] = [0, ascending.length]
  while (low < high) {
    const middle = (low + high) >> 1
    if (ascending[middle]! < limit) low = middle + 1
    else high = middle
  }
  return low
}
