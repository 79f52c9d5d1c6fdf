import { ComputeError } from '@/shared/compute/errors'

/**
 * First year from which the stock stays still: |stock_t − stock_(t−1)|/stock_t < ε in that year and the n − 1 after it.
 *
 * @param stock by year, ≥ 0
 * @param threshold ε [1/yr], > 0; 0.001 unless given
 * @param consecutiveYears n, ≥ 1; 5 unless given, so that a moment's rest at a turning point does not count
 * @returns index of the year, undefined when the stock never comes to rest
 * @throws {ComputeError} `parameter-not-positive`, `negative-amount`
 * @see Common practice.
 * @example
 * stationaryYear([10, 20, 20, 20], 0.001, 2) // => 2
 */
export function stationaryYear(stock: ArrayLike<number>, threshold = 1e-3, consecutiveYears = 5): number | undefined {
  if (!(threshold > 0)) throw new ComputeError('parameter-not-positive', { threshold })
  if (!(consecutiveYears >= 1)) throw new ComputeError('parameter-not-positive', { consecutiveYears })
  let still = 0
  for (let year = 1; year < stock.length; year++) {
    const [before, now] = [stock[year - 1]!, stock[year]!]
    if (!(now >= 0)) throw new ComputeError('negative-amount', { year, stock: now })
    still = Math.abs(now - before) < threshold * now ? still + 1 : 0
    if (still === consecutiveYears) return year - consecutiveYears + 1
  }
  return undefined
}
