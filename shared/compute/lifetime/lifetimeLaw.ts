import { exponentialLaw } from './laws/exponentialLaw'
import { fixedLaw } from './laws/fixedLaw'
import { foldedNormalLaw } from './laws/foldedNormalLaw'
import { gammaLaw } from './laws/gammaLaw'
import { logisticLaw } from './laws/logisticLaw'
import { logLogisticLaw } from './laws/logLogisticLaw'
import { lognormalLaw } from './laws/lognormalLaw'
import { normalLaw } from './laws/normalLaw'
import { truncatedLogisticLaw } from './laws/truncatedLogisticLaw'
import { truncatedNormalLaw } from './laws/truncatedNormalLaw'
import { weibullLaw } from './laws/weibullLaw'
import type { Lifetime, LifetimeLaw } from './lifetime.types'

/**
 * The law of a lifetime, its parameters checked and its constants worked out once.
 *
 * @throws {ComputeError} `parameter-not-positive`, `not-a-number`
 * @example
 * lifetimeLaw({ model: 'exponential', meanYears: 50 }).logSurvival(25) // => -0.5
 */
export function lifetimeLaw(lifetime: Lifetime): LifetimeLaw {
  switch (lifetime.model) {
    case 'fixed':
      return fixedLaw(lifetime)
    case 'exponential':
      return exponentialLaw(lifetime)
    case 'normal':
      return normalLaw(lifetime)
    case 'truncatedNormal':
      return truncatedNormalLaw(lifetime)
    case 'foldedNormal':
      return foldedNormalLaw(lifetime)
    case 'lognormal':
      return lognormalLaw(lifetime)
    case 'weibull':
      return weibullLaw(lifetime)
    case 'gamma':
      return gammaLaw(lifetime)
    case 'logistic':
      return logisticLaw(lifetime)
    case 'truncatedLogistic':
      return truncatedLogisticLaw(lifetime)
    case 'logLogistic':
      return logLogisticLaw(lifetime)
  }
}
