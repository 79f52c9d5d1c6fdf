import { ComputeError } from '@/shared/compute/errors'

/**
 * Stock as what one person uses times the number of persons, year by year.
 *
 * @param perPerson in the unit asked for per person, ≥ 0
 * @param population persons, ≥ 0, same length
 * @throws {ComputeError} `length-mismatch`, `negative-amount`
 * @see Müller, D. B. (2006). Stock dynamics for forecasting material flows. Ecological Economics 59, 142–156.
 * @example
 * perCapitaStock([40, 42], [1000, 1100]) // => [40000, 46200]
 */
export function perCapitaStock(perPerson: ArrayLike<number>, population: ArrayLike<number>): Float64Array {
  if (perPerson.length !== population.length) {
    throw new ComputeError('length-mismatch', { perPerson: perPerson.length, population: population.length })
  }
  return Float64Array.from({ length: population.length }, (_, year) => {
    const [each, persons] = [perPerson[year]!, population[year]!]
    if (!(each >= 0 && persons >= 0)) throw new ComputeError('negative-amount', { year, each, persons })
    return each * persons
  })
}
