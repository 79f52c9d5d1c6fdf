import { ComputeError } from '@/shared/compute/errors'
import gammaln from '@stdlib/math-base-special-gammaln'
import { bracketedRoot } from './bracketedRoot'
import { foldedNormalShape } from './foldedNormalShape'
import type { Lifetime, LifetimeModel } from './lifetime.types'
import { requirePositive } from './requirePositive'
import { truncatedLogisticShape } from './truncatedLogisticShape'
import { truncatedNormalShape } from './truncatedNormalShape'
import { weibullLogMomentRatio } from './weibullLogMomentRatio'

const [SMALLEST_WEIBULL_SHAPE, LARGEST_WEIBULL_SHAPE] = [0.15, 1e4]
/** Truncated laws whose parent lies further below 0 than this are exponential to all purposes. */
const LOWEST_PARENT = -700
const SAME_CV = 1e-6

/**
 * The lifetime of a model that has this mean and standard deviation (method of moments). The two figures describe
 * the lifetime itself, not the parent of a truncated or folded law.
 *
 * @param meanYears mean m [yr], > 0
 * @param sdYears sd s [yr], > 0; 0 for a fixed lifetime; equal to the mean for an exponential one
 * @throws {ComputeError} `parameter-not-positive`; `parameter-out-of-range` when no lifetime of the model has this CV = s/m:
 *   truncated laws reach CV < 1, the folded normal CV ≤ 0.7555, Weibull CV from 1.3e-4 to 110, log-logistic any
 * @remarks mean and sd of the result agree with those asked for to 1e-9
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994, 1995). Continuous Univariate Distributions, vols 1–2.
 * @example
 * lifetimeFromMeanSd('gamma', 70, 35) // => { model: 'gamma', shape: 4, scaleYears: 17.5 }
 * lifetimeFromMeanSd('fixed', 60, 0) // => { model: 'fixed', lifetimeYears: 60 }
 */
export function lifetimeFromMeanSd(model: LifetimeModel, meanYears: number, sdYears: number): Lifetime {
  requirePositive({ meanYears })
  if (model === 'fixed') return fixedOf(meanYears, sdYears)
  requirePositive({ sdYears })
  const cv = sdYears / meanYears
  const logRatio = Math.log1p(cv * cv)
  switch (model) {
    case 'exponential':
      if (!(Math.abs(cv - 1) <= SAME_CV)) throw outOfRange(model, meanYears, sdYears)
      return { model, meanYears }
    case 'normal':
      return { model, meanYears, sdYears }
    case 'lognormal':
      return { model, logMean: Math.log(meanYears) - logRatio / 2, logSd: Math.sqrt(logRatio) }
    case 'gamma':
      return { model, shape: 1 / cv ** 2, scaleYears: cv * sdYears }
    case 'logistic':
      return { model, locationYears: meanYears, scaleYears: (sdYears * Math.sqrt(3)) / Math.PI }
    case 'weibull':
      return weibullOf(meanYears, sdYears, logRatio)
    case 'logLogistic':
      return logLogisticOf(meanYears, cv)
    case 'truncatedNormal':
    case 'foldedNormal': {
      const { location, scale } = parentOf(model, meanYears, sdYears)
      return { model, parentMeanYears: location, parentSdYears: scale }
    }
    case 'truncatedLogistic': {
      const { location, scale } = parentOf(model, meanYears, sdYears)
      return { model, locationYears: location, scaleYears: scale }
    }
  }
}

function fixedOf(meanYears: number, sdYears: number): Lifetime {
  if (sdYears !== 0) throw outOfRange('fixed', meanYears, sdYears)
  return { model: 'fixed', lifetimeYears: meanYears }
}

function weibullOf(meanYears: number, sdYears: number, logRatio: number): Lifetime {
  const excess = (logShape: number) => weibullLogMomentRatio(Math.exp(logShape)) - logRatio
  const [low, high] = [Math.log(SMALLEST_WEIBULL_SHAPE), Math.log(LARGEST_WEIBULL_SHAPE)]
  if (!(excess(low) >= 0 && excess(high) <= 0)) throw outOfRange('weibull', meanYears, sdYears)
  const shape = Math.exp(bracketedRoot(excess, low, high))
  return { model: 'weibull', shape, scaleYears: meanYears / Math.exp(gammaln(1 + 1 / shape)) }
}

/** tan(x)/x = 1 + CV² with x = π/β. */
function logLogisticOf(meanYears: number, cv: number): Lifetime {
  // tan x − x by its series where the difference would lose digits
  const excess = (x: number) =>
    (x < 0.02 ? x ** 2 / 3 + (2 * x ** 4) / 15 + (17 * x ** 6) / 315 : Math.tan(x) / x - 1) - cv * cv
  const x = bracketedRoot(excess, 0, Math.PI / 2)
  return { model: 'logLogistic', shape: Math.PI / x, scaleYears: (meanYears * Math.sin(x)) / x }
}

/** Location over scale z of the parent from sd/mean of the cut or folded law, then the scale from the mean. */
function parentOf(
  model: 'truncatedNormal' | 'foldedNormal' | 'truncatedLogistic',
  meanYears: number,
  sdYears: number,
): { location: number; scale: number } {
  const shapeOf = {
    truncatedNormal: truncatedNormalShape,
    foldedNormal: foldedNormalShape,
    truncatedLogistic: truncatedLogisticShape,
  }[model]
  const excess = (z: number) => {
    const { mean, sd } = shapeOf(z)
    return sd / mean - sdYears / meanYears
  }
  const low = { truncatedNormal: LOWEST_PARENT, foldedNormal: 0, truncatedLogistic: -30 }[model]
  const high = (4 * meanYears) / sdYears + 4
  if (!(excess(low) >= 0 && excess(high) <= 0)) throw outOfRange(model, meanYears, sdYears)
  const z = bracketedRoot(excess, low, high)
  const scale = meanYears / shapeOf(z).mean
  return { location: z * scale, scale }
}

function outOfRange(model: LifetimeModel, meanYears: number, sdYears: number): ComputeError {
  return new ComputeError('parameter-out-of-range', { model, meanYears, sdYears })
}
