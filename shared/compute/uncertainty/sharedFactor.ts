import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'

/** Buildings that use one factor: its error is common to them all. */
export interface FactorGroup {
  readonly factorMeanKgPerM2: number
  /** Of the mean factor, shared [–]. */
  readonly factorCv: number
  readonly areasM2: readonly number[]
  /** Of each area, independent [–]; one for all, or one a building. */
  readonly areaCv: number | readonly number[]
}

export interface MassMoments {
  readonly meanKg: number
  readonly sdKg: number
  readonly cv: number
}

/**
 * Mean and standard deviation of the stock of groups with factors of their own,
 *
 *     E M = Σ F̄·ΣA,   Var M = Σ_groups [ F̄²·Var ΣA + Var F·(ΣA)² + Var F·Var ΣA ].
 *
 * @param correlation of the factor errors of any two groups [–], 0 unless given
 * @throws {ComputeError} `negative-area`, `parameter-out-of-range`, `length-mismatch`
 * @see Goodman, L. A. (1960). Journal of the American Statistical Association 55, 708–713.
 * @example
 * sharedFactorStock([{ factorMeanKgPerM2: 800, factorCv: 0, areasM2: [100, 100], areaCv: 0 }]) // => { meanKg: 160000, sdKg: 0, cv: 0 }
 */
export function sharedFactorStock(groups: readonly FactorGroup[], correlation = 0): MassMoments {
  if (!(correlation >= 0 && correlation <= 1)) throw new ComputeError('share-out-of-range', { correlation })
  const parts = groups.map(partOf)
  const meanKg = sum(parts.map(({ meanKg: mean }) => mean))
  const own = sum(parts.map(({ variance }) => variance))
  const factorSds = parts.map(({ factorSdKg }) => factorSdKg)
  const together = sum(factorSds) ** 2 - sum(factorSds.map((sd) => sd * sd))
  const sdKg = Math.sqrt(own + correlation * together)
  return { meanKg, sdKg, cv: meanKg === 0 ? 0 : sdKg / meanKg }
}

function partOf({ factorMeanKgPerM2, factorCv, areasM2, areaCv }: FactorGroup) {
  if (!(factorMeanKgPerM2 >= 0) || !(factorCv >= 0))
    throw new ComputeError('parameter-out-of-range', { factorMeanKgPerM2, factorCv })
  const areaVariance = sum(areasM2.map((area, index) => areaVarianceOf(area, cvAt(areaCv, index, areasM2.length))))
  const area = sum(areasM2)
  const factorVariance = (factorMeanKgPerM2 * factorCv) ** 2
  return {
    meanKg: factorMeanKgPerM2 * area,
    variance: factorMeanKgPerM2 ** 2 * areaVariance + factorVariance * (area ** 2 + areaVariance),
    factorSdKg: Math.sqrt(factorVariance) * area,
  }
}

function cvAt(areaCv: number | readonly number[], index: number, length: number): number {
  if (typeof areaCv === 'number') return areaCv
  if (areaCv.length !== length) throw new ComputeError('length-mismatch', { areas: length, cvs: areaCv.length })
  return areaCv[index]!
}

function areaVarianceOf(areaM2: number, cv: number): number {
  if (!(areaM2 >= 0) || !(cv >= 0)) throw new ComputeError('negative-area', { areaM2, cv })
  return (areaM2 * cv) ** 2
}

/**
 * Mean, standard deviation and the factor's share of the variance of the demolition flow of one year,
 *
 *     Var = E[F²]·Σ A² p(1 − p) + Var F·(Σ A p)².
 *
 * @param areasM2 areas [m²], ≥ 0
 * @param chances p of each building to come down in the year [–], as long
 * @throws {ComputeError} `length-mismatch`, `share-out-of-range`, `negative-area`
 * @see law of total variance; Bernoulli draws independent given the factor.
 * @example
 * demolitionFlowOfYear(800, 0, [100], [0.5]) // => { meanKg: 40000, sdKg: 40000, factorShareOfVariance: 0 }
 */
export function demolitionFlowOfYear(
  factorMeanKgPerM2: number,
  factorCv: number,
  areasM2: readonly number[],
  chances: readonly number[],
): { meanKg: number; sdKg: number; factorShareOfVariance: number } {
  if (areasM2.length !== chances.length)
    throw new ComputeError('length-mismatch', { areas: areasM2.length, chances: chances.length })
  const factorVariance = (factorMeanKgPerM2 * factorCv) ** 2
  const expected = sum(areasM2.map((area, index) => area * requireChance(chances[index]!)))
  const drawn = sum(areasM2.map((area, index) => areaVarianceOf(area, 1) * chances[index]! * (1 - chances[index]!)))
  const byFactor = factorVariance * expected ** 2
  const variance = (factorMeanKgPerM2 ** 2 + factorVariance) * drawn + byFactor
  return {
    meanKg: factorMeanKgPerM2 * expected,
    sdKg: Math.sqrt(variance),
    factorShareOfVariance: variance === 0 ? 0 : byFactor / variance,
  }
}

function requireChance(chance: number): number {
  if (!(chance >= 0 && chance <= 1)) throw new ComputeError('share-out-of-range', { chance })
  return chance
}
