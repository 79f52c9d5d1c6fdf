import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'

export interface DoubleMeasurement {
  /** √(Σd²/2n), as the readings. */
  readonly technicalError: number
  readonly relativeTechnicalError: number
  /** 1 − TEM²/s² of all readings. */
  readonly reliability: number
  /** Mean of first − second. */
  readonly bias: number
  readonly sdOfDifferences: number
  readonly limitsOfAgreement: readonly [number, number]
}

/**
 * Agreement of two readings of the same buildings: technical error of measurement, its reliability, bias, and the
 * limits within which 95 % of differences lie.
 *
 * @param onLogScale take logarithms first, when the spread grows with size; limits are then ratios' logarithms
 * @param multiplier of the standard deviation in the limits, 1.96 unless given
 * @throws {ComputeError} `length-mismatch`, `stratum-too-small`, `parameter-not-positive` on the log scale
 * @see Bland, J. M. & Altman, D. G. (1986). The Lancet 327, 307–310; Dahlberg, G. (1940) for the technical error.
 * @example
 * doubleMeasurement([10, 12], [10, 12]).technicalError // => 0
 */
export function doubleMeasurement(
  first: readonly number[],
  second: readonly number[],
  { multiplier = 1.96, onLogScale = false }: { readonly multiplier?: number; readonly onLogScale?: boolean } = {},
): DoubleMeasurement {
  if (first.length !== second.length)
    throw new ComputeError('length-mismatch', { first: first.length, second: second.length })
  const n = first.length
  if (n < 2) throw new ComputeError('stratum-too-small', { pairs: n })
  const scaled = (value: number) => {
    if (!onLogScale) return value
    if (!(value > 0)) throw new ComputeError('parameter-not-positive', { value })
    return Math.log(value)
  }
  const pairs = first.map((value, index) => [scaled(value), scaled(second[index]!)] as const)
  const differences = pairs.map(([a, b]) => a - b)
  const readings = pairs.flat()
  const grandMean = sum(readings) / readings.length
  const technicalError = Math.sqrt(sum(differences.map((d) => d * d)) / (2 * n))
  const bias = sum(differences) / n
  const sdOfDifferences = Math.sqrt(sum(differences.map((d) => (d - bias) ** 2)) / (n - 1))
  const variance = sum(readings.map((reading) => (reading - grandMean) ** 2)) / (readings.length - 1)
  return {
    technicalError,
    relativeTechnicalError: technicalError / grandMean,
    reliability: variance === 0 ? 1 : 1 - technicalError ** 2 / variance,
    bias,
    sdOfDifferences,
    limitsOfAgreement: [bias - multiplier * sdOfDifferences, bias + multiplier * sdOfDifferences],
  }
}
