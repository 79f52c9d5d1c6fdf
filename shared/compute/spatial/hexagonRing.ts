import type { HexagonCell } from './hexagon.types'
import { hexagonCentre } from './hexagonCentre'
import type { PlanePoint } from './spatial.types'

/**
 * Corners of a hexagon (corner up), counter-clockwise from the lower right, the first repeated at the end.
 *
 * @param cell axial coordinates
 * @param circumradiusM distance from centre to corner s [m], > 0
 * @returns seven points [m]
 * @example
 * hexagonRing({ q: 0, r: 0 }, 100)[1] // => [86.60254037844388, 50]
 */
export function hexagonRing(cell: HexagonCell, circumradiusM: number): readonly PlanePoint[] {
  const [x, y] = hexagonCentre(cell, circumradiusM)
  const corners = [-30, 30, 90, 150, 210, 270].map((degrees): PlanePoint => {
    const angle = (degrees * Math.PI) / 180
    return [x + circumradiusM * Math.cos(angle), y + circumradiusM * Math.sin(angle)]
  })
  return [...corners, corners[0] ?? [x, y]]
}
