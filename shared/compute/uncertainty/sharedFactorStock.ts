import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import type { FactorGroup, MassMoments } from './factorGroup.types'

/**
 * Mean and standard deviation of the stock of groups of buildings with factors of their own,
 *
 *     E M = Σ F̄·ΣA,
 *     Var M = Σ_g [ F̄²·Var ΣA + Var F·(ΣA)² + Var F·Var ΣA ] + Σ_(g≠h) ρ_gh sd F_g sd F_h ΣA_g ΣA_h.
 *
 * The error of a factor does not average out over the buildings that use it; that of the areas does.
 *
 * @param groups areas [m²] ≥ 0, factors [kg/m²] ≥ 0, coefficients of variation ≥ 0
 * @param correlation ρ of the factor errors [–]: one for any two groups, in [0, 1], or a symmetric matrix with ones on
 *   its diagonal; 0 unless given
 * @throws {ComputeError} `negative-area`, `parameter-out-of-range`, `length-mismatch`, `share-out-of-range`
 * @remarks exact for factors independent of areas, whatever their distributions
 * @see Goodman, L. A. (1960). On the exact variance of products. Journal of the American Statistical Association 55,
 *   708–713.
 * @example
 * sharedFactorStock([{ factorMeanKgPerM2: 800, factorCv: 0.25, areasM2: [100, 100], areaCv: 0 }]) // => { meanKg: 160000, sdKg: 40000, cv: 0.25 }
 */
export function sharedFactorStock(
  groups: readonly FactorGroup[],
  correlation: number | readonly (readonly number[])[] = 0,
): MassMoments {
  const parts = groups.map(partOf)
  const meanKg = sum(parts.map((part) => part.meanKg))
  const together = parts.flatMap((one, g) =>
    parts.slice(0, g).map((other, h) => 2 * correlationOf(correlation, g, h) * one.factorSdKg * other.factorSdKg),
  )
  const variance = sum([...parts.map((part) => part.variance), ...together])
  // a matrix that no set of errors can have may take more away than there is
  if (!(variance >= 0)) throw new ComputeError('parameter-out-of-range', { correlation })
  const sdKg = Math.sqrt(variance)
  return { meanKg, sdKg, cv: meanKg === 0 ? 0 : sdKg / meanKg }
}

function correlationOf(correlation: number | readonly (readonly number[])[], g: number, h: number): number {
  const isOne = typeof correlation === 'number'
  const value = isOne ? correlation : correlation[g]?.[h]
  if (value === undefined) throw new ComputeError('length-mismatch', { group: g, other: h })
  if (!(value >= (isOne ? 0 : -1) && value <= 1)) throw new ComputeError('share-out-of-range', { correlation: value })
  return value
}

function partOf({ factorMeanKgPerM2, factorCv, areasM2, areaCv }: FactorGroup) {
  if (!(factorMeanKgPerM2 >= 0 && factorCv >= 0))
    throw new ComputeError('parameter-out-of-range', { factorMeanKgPerM2, factorCv })
  if (typeof areaCv !== 'number' && areaCv.length !== areasM2.length)
    throw new ComputeError('length-mismatch', { areas: areasM2.length, cvs: areaCv.length })
  const areaVariance = sum(
    areasM2.map((areaM2, index) => {
      const cv = typeof areaCv === 'number' ? areaCv : areaCv[index]!
      if (!(areaM2 >= 0 && cv >= 0)) throw new ComputeError('negative-area', { areaM2, cv })
      return (areaM2 * cv) ** 2
    }),
  )
  const area = sum(areasM2)
  const factorVariance = (factorMeanKgPerM2 * factorCv) ** 2
  return {
    meanKg: factorMeanKgPerM2 * area,
    variance: factorMeanKgPerM2 ** 2 * areaVariance + factorVariance * (area ** 2 + areaVariance),
    factorSdKg: Math.sqrt(factorVariance) * area,
  }
}
