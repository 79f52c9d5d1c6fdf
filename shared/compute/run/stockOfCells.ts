import type { Material } from '@/shared/compute/factors/vocabulary'
import { spreadByFactor } from './spreadByFactor'
import type { Archetype, BuildingCell, MassEstimate, VarianceByCause } from './run.types'

export interface StockEstimate {
  readonly total: MassEstimate
  readonly byMaterial: ReadonlyMap<Material, MassEstimate>
}

/** Sums over the buildings of an archetype. */
export interface AreaSums {
  floorAreaM2: number
  floorAreaSquaredM4: number
  floorAreaVarianceM4: number
}

/**
 * Standing stock and its variance, by material and in total.
 *
 * A factor is one number for all buildings that use it, so its error does not average out:
 *
 *     Var M = Σ_f [ F̄²·Var ΣA + Var F·(ΣA)² + Var F·Var ΣA ] + Σ_i (A_i F̄ cv_b)²
 *
 * with f over the factors; the parts over which one figure is split by component err together. Materials have factors of their own; the error of an area is common to all
 * materials of a building, which is why the total is not the sum of the material variances.
 *
 * @example
 * stockOfCells([], []).total.meanKg // => 0
 *
 * @see Goodman, L. A. (1960). On the exact variance of products. Journal of the American Statistical Association 55, 708–713.
 */
export function stockOfCells(cells: readonly BuildingCell[], archetypes: readonly Archetype[]): StockEstimate {
  const sums = addUpByArchetype(cells, archetypes.length)
  const materials = new Set(archetypes.flatMap(({ factors }) => factors.map(({ material }) => material)))
  const byMaterial = new Map<Material, MassEstimate>()
  for (const material of materials)
    byMaterial.set(
      material,
      estimate(sums, archetypes, (candidate) => candidate === material),
    )
  return { total: estimate(sums, archetypes, () => true), byMaterial }
}

/**
 * ΣA, ΣA² and Var ΣA by archetype.
 *
 * @example
 * addUpByArchetype([], 1) // => [{ floorAreaM2: 0, floorAreaSquaredM4: 0, floorAreaVarianceM4: 0 }]
 */
export function addUpByArchetype(cells: readonly BuildingCell[], archetypeCount: number): AreaSums[] {
  const sums = Array.from({ length: archetypeCount }, () => ({
    floorAreaM2: 0,
    floorAreaSquaredM4: 0,
    floorAreaVarianceM4: 0,
  }))
  for (const cell of cells) {
    const sum = sums[cell.archetype]!
    sum.floorAreaM2 += cell.floorAreaM2
    sum.floorAreaSquaredM4 += cell.floorAreaSquaredM4
    sum.floorAreaVarianceM4 += cell.floorAreaVarianceM4
  }
  return sums
}

function estimate(
  sums: readonly AreaSums[],
  archetypes: readonly Archetype[],
  counts: (material: Material) => boolean,
): MassEstimate {
  let meanKg = 0
  let measurement = 0
  let factor = 0
  const exposureByFactor = new Map<string, number>()
  archetypes.forEach((archetype, index) => {
    const { floorAreaM2, floorAreaSquaredM4, floorAreaVarianceM4 } = sums[index]!
    let intensity = 0
    const counted = archetype.factors.filter(({ material }) => counts(material))
    for (const { factorId, meanKgPerM2, sdKgPerM2, betweenSdKgPerM2 } of spreadByFactor(counted)) {
      intensity += meanKgPerM2
      measurement += (floorAreaSquaredM4 + floorAreaVarianceM4) * betweenSdKgPerM2 ** 2
      exposureByFactor.set(factorId, (exposureByFactor.get(factorId) ?? 0) + sdKgPerM2 * floorAreaM2)
      factor += sdKgPerM2 ** 2 * floorAreaVarianceM4
    }
    meanKg += floorAreaM2 * intensity
    measurement += floorAreaVarianceM4 * intensity ** 2
  })
  for (const exposure of exposureByFactor.values()) factor += exposure ** 2
  return { meanKg, varianceByCauseKg2: { measurement, factor, lifetime: 0, chance: 0 } }
}

/**
 * Whole variance [kg²].
 *
 * @example
 * totalVariance({ measurement: 1, factor: 2, lifetime: 3, chance: 4 }) // => 10
 */
export function totalVariance({ measurement, factor, lifetime, chance }: VarianceByCause): number {
  return measurement + factor + lifetime + chance
}

/**
 * Each cause as a share of the whole variance; all zero when nothing is in doubt.
 *
 * @example
 * sharesOfVariance({ measurement: 1, factor: 3, lifetime: 0, chance: 0 }).factor // => 0.75
 */
export function sharesOfVariance(variance: VarianceByCause): VarianceByCause {
  const whole = totalVariance(variance)
  if (whole === 0) return { measurement: 0, factor: 0, lifetime: 0, chance: 0 }
  return {
    measurement: variance.measurement / whole,
    factor: variance.factor / whole,
    lifetime: variance.lifetime / whole,
    chance: variance.chance / whole,
  }
}
