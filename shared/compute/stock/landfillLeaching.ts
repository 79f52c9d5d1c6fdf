import { ComputeError } from '@/shared/compute/errors'

export interface LeachingInputs {
  /** Mass deposited at the start of each year [kg], ≥ 0; years beyond its end have none. */
  readonly depositKg: ArrayLike<number>
  /** k, first-order rate [1/yr], > 0. */
  readonly ratePerYear: number
  readonly years: number
}

export interface LeachingCourse {
  readonly leachedKg: Float64Array
  /** What is left in the landfill at the end of each year [kg]. */
  readonly stockKg: Float64Array
  readonly halfLifeYears: number
}

/**
 * First-order leaching of what was deposited: in its n-th year a deposit M₀ releases
 *
 *     M₀(e^(−k(n−1)) − e^(−kn)),   half-life ln 2/k.
 *
 * @returns leached + stock add up to all deposits so far
 * @throws {ComputeError} `parameter-not-positive`, `negative-amount`, `length-mismatch`
 * @see Closed form: first-order decay.
 * @example
 * landfillLeaching({ depositKg: [1000], ratePerYear: Math.LN2, years: 2 }).leachedKg // => [500, 250]
 */
export function landfillLeaching({ depositKg, ratePerYear, years }: LeachingInputs): LeachingCourse {
  if (!(ratePerYear > 0 && ratePerYear < Infinity)) throw new ComputeError('parameter-not-positive', { ratePerYear })
  if (depositKg.length > years) throw new ComputeError('length-mismatch', { deposits: depositKg.length, years })
  const releasedShare = -Math.expm1(-ratePerYear)
  const leachedKg = new Float64Array(years)
  const stockKg = new Float64Array(years)
  let stock = 0
  for (let year = 0; year < years; year++) {
    const deposit = depositKg[year] ?? 0
    if (!(deposit >= 0)) throw new ComputeError('negative-amount', { year, depositKg: deposit })
    stock += deposit
    leachedKg[year] = releasedShare * stock
    stock -= leachedKg[year]!
    stockKg[year] = stock
  }
  return { leachedKg, stockKg, halfLifeYears: Math.LN2 / ratePerYear }
}
