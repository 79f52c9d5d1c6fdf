import { ComputeError } from '@/shared/compute/errors'
import { lifetimeLaw } from './lifetimeLaw'
import type { Lifetime } from './lifetime.types'

/**
 * Hazard: the rate at which those still standing at age a leave, h(a) = f(a)/S(a).
 *
 * @param ageYears age a [yr], ≥ 0
 * @returns hazard [1/yr], ≥ 0; Infinity where nothing may stand any more (fixed lifetime from age L on)
 * @throws {ComputeError} `negative-age`, `parameter-not-positive`, `not-a-number`
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2.
 * @example
 * hazardPerYear(60, { model: 'weibull', shape: 3, scaleYears: 60 }) // => 0.05
 */
export function hazardPerYear(ageYears: number, lifetime: Lifetime): number {
  if (!(ageYears >= 0)) throw new ComputeError('negative-age', { ageYears })
  const hazard = lifetimeLaw(lifetime).hazardPerYear(ageYears)
  if (Number.isNaN(hazard)) throw new ComputeError('not-a-number', { ageYears, ...lifetime })
  return hazard
}
