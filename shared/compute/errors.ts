/** Why a computation was refused. One code per kind of fault, never told apart by message. */
export type ComputeErrorCode =
  | 'not-a-number'
  | 'negative-age'
  | 'negative-area'
  | 'negative-amount'
  | 'parameter-not-positive'
  | 'parameter-out-of-range'
  | 'share-out-of-range'
  | 'empty-input'
  | 'length-mismatch'
  | 'mixed-area-bases'
  | 'unit-mismatch'
  | 'factor-missing'
  | 'factor-ambiguous'
  | 'interval-reversed'
  | 'interval-open'
  | 'stratum-too-small'
  | 'mass-not-balanced'
  | 'not-converged'
  | 'undefined-statistic'
  | 'ring-invalid'
  | 'ring-too-short'
  | 'ring-crosses-itself'
  | 'coordinates-swapped'
  | 'coordinates-projected'
  | 'coordinates-out-of-range'
  | 'unknown-code'

/**
 * Refusal of a computation, with the offending values.
 *
 * @example
 * new ComputeError('negative-age', { ageYears: -3 }).code // => 'negative-age'
 */
export class ComputeError extends Error {
  override readonly name = 'ComputeError'

  constructor(
    readonly code: ComputeErrorCode,
    readonly values: Readonly<Record<string, unknown>> = {},
  ) {
    super(`${code}: ${JSON.stringify(values)}`)
  }
}
