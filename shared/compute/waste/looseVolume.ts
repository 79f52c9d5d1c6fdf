import { ComputeError } from '@/shared/compute/errors'

/**
 * Room that a mass takes in a container, V = m / ρ with the loose bulk density: never from gross building volume.
 *
 * @param massKg mass m [kg], ≥ 0
 * @param bulkDensityKgPerM3 loose bulk density ρ [kg/m³], > 0
 * @returns loose volume [m³], ≥ 0
 * @throws {ComputeError} `negative-amount`, `parameter-not-positive`
 * @example
 * looseVolume(310_000, 1424) // => 217.69662921348313
 */
export function looseVolume(massKg: number, bulkDensityKgPerM3: number): number {
  if (!(massKg >= 0)) throw new ComputeError('negative-amount', { massKg })
  if (!(bulkDensityKgPerM3 > 0)) throw new ComputeError('parameter-not-positive', { bulkDensityKgPerM3 })
  return massKg / bulkDensityKgPerM3
}
