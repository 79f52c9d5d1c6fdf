import type { PlanePoint } from './spatial.types'

/**
 * Centre of mass of a plane polygon,
 *
 *     c = 1/(6A) Σ (pᵢ + pᵢ₊₁)(xᵢ yᵢ₊₁ − xᵢ₊₁ yᵢ)
 *
 * @param corners corners [m], closed or open
 * @returns the centroid [m]; the mean of the corners when the polygon has no area
 * @see Bourke, P. (1988). Calculating the area and centroid of a polygon.
 * @example
 * planeCentroid([[0, 0], [20, 0], [20, 12], [0, 12]]) // => [10, 6]
 * planeCentroid([[0, 0], [2, 0], [4, 0]]) // => [2, 0]
 */
export function planeCentroid(corners: readonly PlanePoint[]): PlanePoint {
  const [originX = 0, originY = 0] = corners[0] ?? []
  let twiceArea = 0
  let momentX = 0
  let momentY = 0
  corners.forEach(([px, py], index) => {
    const [nextX, nextY] = corners[(index + 1) % corners.length] ?? [originX, originY]
    const [x, y, nx, ny] = [px - originX, py - originY, nextX - originX, nextY - originY]
    const cross = x * ny - nx * y
    twiceArea += cross
    momentX += (x + nx) * cross
    momentY += (y + ny) * cross
  })
  if (twiceArea !== 0) return [originX + momentX / (3 * twiceArea), originY + momentY / (3 * twiceArea)]
  const count = Math.max(corners.length, 1)
  return [
    originX + corners.reduce((total, [x]) => total + x - originX, 0) / count,
    originY + corners.reduce((total, [, y]) => total + y - originY, 0) / count,
  ]
}
