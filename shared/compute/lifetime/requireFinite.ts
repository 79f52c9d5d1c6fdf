import { ComputeError } from '@/shared/compute/errors'

/**
 * Refuses parameters that are not finite numbers.
 *
 * @param parameters by name
 * @throws {ComputeError} `not-a-number` with the offending parameter
 * @example
 * requireFinite({ logMean: -0.5 }) // => undefined
 */
export function requireFinite(parameters: Readonly<Record<string, number>>): void {
  for (const [name, value] of Object.entries(parameters)) {
    if (!Number.isFinite(value)) throw new ComputeError('not-a-number', { [name]: value })
  }
}
