import { ComputeError } from '@/shared/compute/errors'

/**
 * Refuses parameters that are not finite numbers above 0.
 *
 * @param parameters by name
 * @throws {ComputeError} `parameter-not-positive` with the offending parameter
 * @example
 * requirePositive({ shape: 3, scaleYears: 80 }) // => undefined
 */
export function requirePositive(parameters: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(parameters)) {
    if (!(value > 0 && value < Infinity)) throw new ComputeError('parameter-not-positive', { [name]: value })
  }
}
