import { ComputeError } from '@/shared/compute/errors'
import { bracketedRoot } from '@/shared/compute/lifetime/bracketedRoot'
import { lifetimeMoments } from '@/shared/compute/lifetime/lifetimeMoments'
import { sum } from '@/shared/compute/sum'
import { requireLives, type ObservedLife } from './observedLives'

export interface WeibullFit {
  readonly shape: number
  readonly scaleYears: number
  readonly logLikelihood: number
  /** Standard errors of ln k and ln λ from the inverse of the observed information. */
  readonly logShapeStandardError: number
  readonly logScaleStandardError: number
  readonly meanYears: number
  readonly medianYears: number
}

const SHAPE_BOUNDS = { least: 0.05, most: 60 } as const

/**
 * Weibull lifetime by maximum likelihood with left truncation and right censoring,
 *
 *     ℓ = Σ d_i ln h(x_i) − H(x_i) + H(e_i),   H(t) = (t/λ)^k.
 *
 * For a given shape the scale has a closed form, λ^k = Σ(x^k − e^k)/Σd, which leaves one equation in the shape.
 *
 * @throws {ComputeError} `empty-input`, `interval-reversed`, `undefined-statistic` when nothing came down, `not-converged`
 * @see Klein & Moeschberger (2003), §12.2; truncation as §3.5 there.
 * @example
 * fitWeibull([10, 20, 30, 40, 50].map((exitAgeYears) => ({ entryAgeYears: 0, exitAgeYears, isDemolished: true }))).shape > 1 // => true
 */
export function fitWeibull(lives: readonly ObservedLife[]): WeibullFit {
  requireLives(lives)
  const events = lives.filter(({ isDemolished }) => isDemolished)
  if (events.length === 0) throw new ComputeError('undefined-statistic', { what: 'no demolition observed' })
  const logs = sum(events.map(({ exitAgeYears }) => Math.log(exitAgeYears)))
  // ages in units of the longest keep powers of high shapes in range
  const unit = lives.reduce((longest, { exitAgeYears }) => Math.max(longest, exitAgeYears), 0)
  const power = (age: number, shape: number) => (age > 0 ? (age / unit) ** shape : 0)
  const powerLog = (age: number, shape: number) => (age > 0 ? (age / unit) ** shape * Math.log(age / unit) : 0)
  const exposure = (shape: number) =>
    sum(lives.map((life) => power(life.exitAgeYears, shape) - power(life.entryAgeYears, shape)))
  const exposureLog = (shape: number) =>
    sum(lives.map((life) => powerLog(life.exitAgeYears, shape) - powerLog(life.entryAgeYears, shape)))
  const score = (shape: number) =>
    events.length / shape +
    logs -
    events.length * Math.log(unit) -
    (events.length * exposureLog(shape)) / exposure(shape)
  const { least, most } = SHAPE_BOUNDS
  if (!(score(least) > 0 && score(most) < 0)) throw new ComputeError('not-converged', { least, most })
  const shape = bracketedRoot(score, least, most)
  const scaleYears = unit * (exposure(shape) / events.length) ** (1 / shape)
  const errors = standardErrors(lives, events.length, shape, scaleYears)
  const { meanYears, medianYears } = lifetimeMoments({ model: 'weibull', shape, scaleYears })
  const hazards = events.length * (Math.log(shape) - shape * Math.log(scaleYears)) + (shape - 1) * logs
  return { shape, scaleYears, logLikelihood: hazards - events.length, ...errors, meanYears, medianYears }
}

/** Inverse of the observed information in (ln k, ln λ) at the maximum. */
function standardErrors(lives: readonly ObservedLife[], eventCount: number, shape: number, scaleYears: number) {
  const term = (age: number, order: 0 | 1 | 2) => {
    if (age <= 0) return 0
    const log = Math.log(age / scaleYears)
    return Math.exp(shape * log) * (shape * log) ** order
  }
  const total = (order: 0 | 1 | 2) =>
    sum(lives.map((life) => term(life.exitAgeYears, order) - term(life.entryAgeYears, order)))
  const logRatio = sum(
    lives
      .filter(({ isDemolished }) => isDemolished)
      .map(({ exitAgeYears }) => shape * Math.log(exitAgeYears / scaleYears)),
  )
  const shapeShape = total(2) + total(1) - logRatio
  const scaleScale = shape ** 2 * total(0)
  const mixed = -shape * (total(1) + total(0) - eventCount)
  const determinant = shapeShape * scaleScale - mixed ** 2
  if (!(determinant > 0)) throw new ComputeError('not-converged', { determinant })
  return {
    logShapeStandardError: Math.sqrt(scaleScale / determinant),
    logScaleStandardError: Math.sqrt(shapeShape / determinant),
  }
}
