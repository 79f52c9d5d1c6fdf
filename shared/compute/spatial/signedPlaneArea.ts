import { sum } from '@/shared/compute/sum'
import type { PlanePoint } from './spatial.types'

/**
 * Area of a plane polygon by the shoelace formula,
 *
 *     A = ½ Σ (xᵢ yᵢ₊₁ − xᵢ₊₁ yᵢ)
 *
 * taken about the first corner, so that large coordinates do not eat the digits.
 *
 * @param corners corners [m], closed or open
 * @returns area [m²], positive when the corners run counter-clockwise; 0 for fewer than three
 * @see Meister, A. L. F. (1769). Generalia de genesi figurarum planarum.
 * @example
 * signedPlaneArea([[0, 0], [20, 0], [20, 12], [0, 12]]) // => 240
 */
export function signedPlaneArea(corners: readonly PlanePoint[]): number {
  const [originX = 0, originY = 0] = corners[0] ?? []
  const terms = corners.map(([x, y], index) => {
    const [nextX, nextY] = corners[(index + 1) % corners.length] ?? [originX, originY]
    return (x - originX) * (nextY - originY) - (nextX - originX) * (y - originY)
  })
  return sum(terms) / 2
}
