import { chancesOf } from './chancesOf'
import type { MassMoments } from './factorGroup.types'
import type { MassGroup } from './massGroup.types'
import { requireMassGroup } from './requireMassGroup'
import { sharedFactorCvs } from './sharedFactorCvs'

/** Causes of doubt, never merged. Measurement and variability average out over buildings, factor and lifetime do not. */
export interface CausesOfVariance {
  readonly measurement: number
  readonly variability: number
  readonly factor: number
  readonly lifetime: number
  readonly chance: number
}

export interface VarianceBreakdown extends MassMoments {
  readonly byCauseKg2: CausesOfVariance
  /** Adding up to 1, or all 0 where nothing is in doubt. */
  readonly shares: CausesOfVariance
}

/** Nodes of the trapezoidal rule over a standard normal error, which converges faster than any power of the step. */
const NODES = Array.from({ length: 25 }, (_, index) => (index - 12) / 2)
const DENSITIES = NODES.map((z) => Math.exp((-z * z) / 2))
const WHOLE_DENSITY = DENSITIES.reduce((whole, density) => whole + density, 0)
const NODE_WEIGHTS = DENSITIES.map((density) => density / WHOLE_DENSITY)
const ONE_NODE = { nodes: [0], weights: [1] } as const

/** Sums of a group over its buildings, the last four averaged over the doubt of the life. */
interface GroupSums {
  /** Σ A p at each node [m²]. */
  readonly expectedM2: readonly number[]
  readonly meanM2: number
  readonly measurementM4: number
  readonly variabilityM4: number
  readonly chanceM4: number
}

/**
 * Mean and variance of a mass, stock or flow, taken apart by cause. With M = Σ F·ΣA B D over groups, A the areas, B the
 * variability, D whether a building comes down, all independent given the shared factors F and lives L,
 *
 *     measurement = E[F²]·Σ Var A·E[p²],   variability = E[F²]·Σ E[A²] Var B·E[p²],
 *     chance = E[F²]·Σ E[A²] E[B²] E[p(1 − p)],   factor = Σ_f cv_f² (Σ F̄_f Σ A E[p])²,
 *     lifetime = Σ_L Var_L (Σ F̄ Σ A p) + Σ_f cv_f² Σ_L Var_L (Σ F̄_f Σ A p),
 *
 * which add up to the whole variance exactly: products of two causes count with the one that is not the factor.
 *
 * @param groups see {@link MassGroup}; equal ids share one error
 * @throws {ComputeError} `negative-area`, `parameter-out-of-range`, `length-mismatch`, `share-out-of-range`,
 *   `factor-ambiguous` when one id is named with two different errors
 * @remarks expectations over a life by 25 nodes between −6 and 6, to about 1e-9 for smooth chances
 * @see Goodman (1960), as `sharedFactorStock`; Saltelli, A. et al. (2008). Global Sensitivity Analysis, ch. 1.
 * @example
 * varianceByCause([{ factors: [{ factorId: 'f', meanKgPerM2: 800, sharedCv: 0.25 }], areasM2: [100], areaCv: 0 }]).shares.factor // => 1
 */
export function varianceByCause(groups: readonly MassGroup[]): VarianceBreakdown {
  const factorCvs = sharedFactorCvs(groups)
  const sums = groups.map(sumsOf)
  let meanKg = 0
  let [measurement, variability, chance] = [0, 0, 0]
  const massByFactor = new Map<string, number>()
  groups.forEach((group, index) => {
    const { meanM2, measurementM4, variabilityM4, chanceM4 } = sums[index]!
    const intensity = intensityOf(group)
    let square = intensity ** 2
    for (const [factorId, kgPerM2] of intensityByFactor(group)) {
      square += (kgPerM2 * factorCvs.get(factorId)!) ** 2
      massByFactor.set(factorId, (massByFactor.get(factorId) ?? 0) + kgPerM2 * meanM2)
    }
    meanKg += intensity * meanM2
    measurement += square * measurementM4
    variability += square * variabilityM4
    chance += square * chanceM4
  })
  let factor = 0
  for (const [factorId, massKg] of massByFactor) factor += (factorCvs.get(factorId)! * massKg) ** 2
  const lifetime = byLifetime(groups, sums, factorCvs)
  return asBreakdown(meanKg, { measurement, variability, factor, lifetime, chance })
}

function asBreakdown(meanKg: number, byCauseKg2: CausesOfVariance): VarianceBreakdown {
  const { measurement, variability, factor, lifetime, chance } = byCauseKg2
  const variance = measurement + variability + factor + lifetime + chance
  const sdKg = Math.sqrt(variance)
  const share = (part: number) => (variance === 0 ? 0 : part / variance)
  return {
    meanKg,
    sdKg,
    cv: meanKg === 0 ? 0 : sdKg / meanKg,
    byCauseKg2,
    shares: {
      measurement: share(measurement),
      variability: share(variability),
      factor: share(factor),
      lifetime: share(lifetime),
      chance: share(chance),
    },
  }
}

function intensityOf({ factors }: MassGroup): number {
  return factors.reduce((all, { meanKgPerM2 }) => all + meanKgPerM2, 0)
}

/** Several figures of one id in a group have one error in common. */
function intensityByFactor({ factors }: MassGroup): Map<string, number> {
  const byFactor = new Map<string, number>()
  for (const { factorId, meanKgPerM2 } of factors) byFactor.set(factorId, (byFactor.get(factorId) ?? 0) + meanKgPerM2)
  return byFactor
}

function sumsOf(group: MassGroup): GroupSums {
  requireMassGroup(group)
  const { areasM2, areaCv, betweenBuildingsCv = 0 } = group
  const inDoubt = group.comingDown !== undefined && 'chancesAt' in group.comingDown
  const { nodes, weights } = inDoubt ? { nodes: NODES, weights: NODE_WEIGHTS } : ONE_NODE
  const sums = { meanM2: 0, measurementM4: 0, variabilityM4: 0, chanceM4: 0 }
  const expectedM2 = nodes.map((z, node) => {
    const chances = chancesOf(group, z)
    const weight = weights[node]!
    let expected = 0
    for (let i = 0; i < areasM2.length; i++) {
      const area = areasM2[i]!
      const variance = (area * (typeof areaCv === 'number' ? areaCv : areaCv[i]!)) ** 2
      const square = area * area + variance
      const p = chances === null ? 1 : chances[i]!
      expected += area * p
      sums.measurementM4 += weight * variance * p * p
      sums.variabilityM4 += weight * square * betweenBuildingsCv ** 2 * p * p
      sums.chanceM4 += weight * square * (1 + betweenBuildingsCv ** 2) * p * (1 - p)
    }
    sums.meanM2 += weight * expected
    return expected
  })
  return { ...sums, expectedM2 }
}

/** Variance over the lives of what is expected under each, groups of one life together. */
function byLifetime(
  groups: readonly MassGroup[],
  sums: readonly GroupSums[],
  factorCvs: ReadonlyMap<string, number>,
): number {
  const swings = new Map<string, Float64Array>()
  const add = (key: string, index: number, scale: number) => {
    const { expectedM2, meanM2 } = sums[index]!
    const swing = swings.get(key) ?? new Float64Array(NODES.length)
    expectedM2.forEach((expected, node) => (swing[node]! += scale * (expected - meanM2)))
    swings.set(key, swing)
  }
  groups.forEach((group, index) => {
    if (group.comingDown === undefined || !('chancesAt' in group.comingDown)) return
    const { lifeId } = group.comingDown
    add(JSON.stringify([lifeId]), index, intensityOf(group))
    for (const [factorId, kgPerM2] of intensityByFactor(group))
      add(JSON.stringify([lifeId, factorId]), index, kgPerM2 * factorCvs.get(factorId)!)
  })
  let variance = 0
  for (const swing of swings.values()) swing.forEach((value, node) => (variance += NODE_WEIGHTS[node]! * value * value))
  return variance
}
