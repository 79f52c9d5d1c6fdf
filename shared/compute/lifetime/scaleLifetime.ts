import type { Lifetime } from './lifetime.types'
import { requirePositive } from './requirePositive'

/**
 * The same model on a longer or shorter clock: S′(a) = S(a/f), so mean, sd and median are multiplied by f and
 * the coefficient of variation stays.
 *
 * @param stretch f [–], > 0; 1.1 lengthens the life by a tenth
 * @throws {ComputeError} `parameter-not-positive`
 * @see Cox, D. R. & Oakes, D. (1984). Analysis of Survival Data, §5.2 (accelerated life).
 * @example
 * scaleLifetime({ model: 'weibull', shape: 3, scaleYears: 60 }, 1.5) // => { model: 'weibull', shape: 3, scaleYears: 90 }
 */
export function scaleLifetime(lifetime: Lifetime, stretch: number): Lifetime {
  requirePositive({ stretch })
  switch (lifetime.model) {
    case 'fixed':
      return { ...lifetime, lifetimeYears: lifetime.lifetimeYears * stretch }
    case 'exponential':
      return { ...lifetime, meanYears: lifetime.meanYears * stretch }
    case 'normal':
      return { ...lifetime, meanYears: lifetime.meanYears * stretch, sdYears: lifetime.sdYears * stretch }
    case 'truncatedNormal':
    case 'foldedNormal':
      return {
        ...lifetime,
        parentMeanYears: lifetime.parentMeanYears * stretch,
        parentSdYears: lifetime.parentSdYears * stretch,
      }
    case 'lognormal':
      return { ...lifetime, logMean: lifetime.logMean + Math.log(stretch) }
    case 'weibull':
    case 'gamma':
    case 'logLogistic':
      return { ...lifetime, scaleYears: lifetime.scaleYears * stretch }
    case 'logistic':
    case 'truncatedLogistic':
      return {
        ...lifetime,
        locationYears: lifetime.locationYears * stretch,
        scaleYears: lifetime.scaleYears * stretch,
      }
  }
}
