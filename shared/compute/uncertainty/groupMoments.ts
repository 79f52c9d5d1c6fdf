import type { MassGroup } from './massGroup.types'

/** Mean [m²], standard deviation [m²] and skewness [–] of the areas of a group that count in a trial. */
export interface GroupMoments {
  readonly meanM2: number
  readonly sdM2: number
  readonly skewness: number
}

/**
 * First three moments of ΣA B D over the buildings of a group, given its chances: A the areas, B the variability, both
 * lognormal, D whether a building counts, all independent. With m₂ = A²(1 + cv²), m₃ = A³(1 + cv²)³ of A·B,
 *
 *     μ = Σ A p,   σ² = Σ m₂p − (A p)²,   κ₃ = Σ m₃p − 3 A m₂p² + 2(A p)³.
 *
 * @param chances p of each building [–]; null where all count
 * @see Johnson, Kotz & Balakrishnan (1994), Continuous Univariate Distributions, vol. 1, ch. 14 (third moment).
 * @example
 * groupMoments({ factors: [], areasM2: [100], areaCv: 0 }, [0.5]) // => { meanM2: 50, sdM2: 50, skewness: 0 }
 */
export function groupMoments(group: MassGroup, chances: ArrayLike<number> | null): GroupMoments {
  const { areasM2, areaCv, betweenBuildingsCv = 0 } = group
  let [meanM2, variance, third] = [0, 0, 0]
  for (let i = 0; i < areasM2.length; i++) {
    const [area, p] = [areasM2[i]!, chances === null ? 1 : chances[i]!]
    const cv = typeof areaCv === 'number' ? areaCv : areaCv[i]!
    const spread = (1 + cv * cv) * (1 + betweenBuildingsCv ** 2)
    meanM2 += area * p
    variance += area ** 2 * p * (spread - p)
    third += area ** 3 * p * (spread ** 3 - 3 * spread * p + 2 * p * p)
  }
  return { meanM2, sdM2: Math.sqrt(variance), skewness: variance > 0 ? third / variance ** 1.5 : 0 }
}
