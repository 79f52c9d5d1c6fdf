import { ComputeError } from '@/shared/compute/errors'
import { lognormalFromMean } from './lognormal'
import { percentile } from './percentile'
import { seededRandom } from './seededRandom'
import type { FactorGroup } from './sharedFactor'

export interface DrawnBand {
  readonly meanKg: number
  readonly sdKg: number
  readonly p10Kg: number
  readonly p50Kg: number
  readonly p90Kg: number
}

/**
 * Stock of groups by drawing: one lognormal factor a group and trial, then every building's area. The sum of a
 * group's independent area errors is drawn as one normal number with their exact variance.
 *
 * @param trials ≥ 2 000 for P10 and P90; 20 000 bring their standard error near 0.3 % at CV 0.25
 * @param seed stored with the result
 * @throws {ComputeError} `parameter-out-of-range`, those of the factors
 * @remarks The sum of areas is normal to the accuracy of the central limit theorem, exact in mean and variance.
 * @see Morgan, M. G. & Henrion, M. (1990). Uncertainty, ch. 8.
 * @example
 * monteCarloStock([{ factorMeanKgPerM2: 800, factorCv: 0, areasM2: [100], areaCv: 0 }], 2000, 1).p90Kg // => 80000
 */
export function monteCarloStock(groups: readonly FactorGroup[], trials: number, seed: number): DrawnBand {
  if (!(Number.isInteger(trials) && trials >= 2)) throw new ComputeError('parameter-out-of-range', { trials })
  const random = seededRandom(seed)
  const parts = groups.map(({ factorMeanKgPerM2, factorCv, areasM2, areaCv }) => {
    let area = 0
    let areaVariance = 0
    areasM2.forEach((areaM2, index) => {
      area += areaM2
      areaVariance += (areaM2 * (typeof areaCv === 'number' ? areaCv : areaCv[index]!)) ** 2
    })
    return { ...lognormalFromMean(factorMeanKgPerM2, factorCv), area, areaSd: Math.sqrt(areaVariance) }
  })
  const totals = Float64Array.from({ length: trials }, () => {
    let total = 0
    for (const { logMean, logSd, area, areaSd } of parts) {
      total += Math.exp(logMean + logSd * random.normal()) * Math.max(0, area + areaSd * random.normal())
    }
    return total
  })
  const meanKg = totals.reduce((sum, total) => sum + total, 0) / trials
  const variance = totals.reduce((sum, total) => sum + (total - meanKg) ** 2, 0) / (trials - 1)
  totals.sort()
  return {
    meanKg,
    sdKg: Math.sqrt(variance),
    p10Kg: percentile(totals, 0.1),
    p50Kg: percentile(totals, 0.5),
    p90Kg: percentile(totals, 0.9),
  }
}
