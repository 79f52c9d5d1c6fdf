import { ComputeError } from '@/shared/compute/errors'

/**
 * Area of a regular hexagon, A = 3√3/2 · s².
 *
 * @param circumradiusM distance from centre to corner s [m], > 0
 * @returns area [m²]
 * @throws {ComputeError} `parameter-not-positive`
 * @example
 * hexagonAreaM2(100) // => 25980.76211353316
 */
export function hexagonAreaM2(circumradiusM: number): number {
  if (!(circumradiusM > 0)) throw new ComputeError('parameter-not-positive', { circumradiusM })
  return ((3 * Math.sqrt(3)) / 2) * circumradiusM * circumradiusM
}
