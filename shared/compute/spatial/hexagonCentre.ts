import type { HexagonCell } from './hexagon.types'
import type { PlanePoint } from './spatial.types'

/**
 * Centre of a hexagon (corner up): x = s√3 (q + r/2), y = 3/2 s r.
 *
 * @param cell axial coordinates
 * @param circumradiusM distance from centre to corner s [m], > 0
 * @returns centre [m]
 * @example
 * hexagonCentre({ q: 0, r: 2 }, 100) // => [173.20508075688772, 300]
 */
export function hexagonCentre({ q, r }: HexagonCell, circumradiusM: number): PlanePoint {
  return [circumradiusM * Math.sqrt(3) * (q + r / 2), 1.5 * circumradiusM * r]
}
