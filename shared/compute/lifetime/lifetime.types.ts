/** How long buildings or components last. One model, its own parameters; times in years. */
export type Lifetime =
  | FixedLifetime
  | ExponentialLifetime
  | NormalLifetime
  | TruncatedNormalLifetime
  | FoldedNormalLifetime
  | LognormalLifetime
  | WeibullLifetime
  | GammaLifetime
  | LogisticLifetime
  | TruncatedLogisticLifetime
  | LogLogisticLifetime

export type LifetimeModel = Lifetime['model']

/** Everything leaves at the age of exactly `lifetimeYears`. */
export interface FixedLifetime {
  readonly model: 'fixed'
  readonly lifetimeYears: number
}

/** No ageing: the hazard is the same at every age. */
export interface ExponentialLifetime {
  readonly model: 'exponential'
  readonly meanYears: number
}

/** Below age 0 lies the share Φ(−μ/σ); it leaves as soon as the age is above 0. */
export interface NormalLifetime {
  readonly model: 'normal'
  readonly meanYears: number
  readonly sdYears: number
}

/** Mean and sd are those of the normal law before its part below age 0 is cut off. */
export interface TruncatedNormalLifetime {
  readonly model: 'truncatedNormal'
  readonly parentMeanYears: number
  readonly parentSdYears: number
}

/** Mean and sd are those of the normal law before its part below age 0 is folded over. */
export interface FoldedNormalLifetime {
  readonly model: 'foldedNormal'
  readonly parentMeanYears: number
  readonly parentSdYears: number
}

/** Mean and sd of ln(lifetime in years). */
export interface LognormalLifetime {
  readonly model: 'lognormal'
  readonly logMean: number
  readonly logSd: number
}

export interface WeibullLifetime {
  readonly model: 'weibull'
  readonly shape: number
  readonly scaleYears: number
}

export interface GammaLifetime {
  readonly model: 'gamma'
  readonly shape: number
  readonly scaleYears: number
}

/** Below age 0 lies the share 1/(1 + e^(μ/b)); it leaves as soon as the age is above 0. */
export interface LogisticLifetime {
  readonly model: 'logistic'
  readonly locationYears: number
  readonly scaleYears: number
}

/** The logistic law with its part below age 0 cut off; location and scale are those of the whole law. */
export interface TruncatedLogisticLifetime {
  readonly model: 'truncatedLogistic'
  readonly locationYears: number
  readonly scaleYears: number
}

/** Scale is the median; the mean is finite for shape > 1, the sd for shape > 2. */
export interface LogLogisticLifetime {
  readonly model: 'logLogistic'
  readonly shape: number
  readonly scaleYears: number
}

export interface LifetimeMoments {
  readonly meanYears: number
  readonly sdYears: number
  readonly medianYears: number
}

/** A lifetime with its constants worked out once. */
export interface LifetimeLaw {
  /** ln S(a) for a > 0. */
  readonly logSurvival: (ageYears: number) => number
  /** f(a)/S(a) for a ≥ 0 [1/yr]. */
  readonly hazardPerYear: (ageYears: number) => number
  readonly moments: () => LifetimeMoments
}
