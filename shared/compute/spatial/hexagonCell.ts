import { ComputeError } from '@/shared/compute/errors'
import type { HexagonCell } from './hexagon.types'
import type { PlanePoint } from './spatial.types'

/**
 * The hexagon (corner up) a point of a plane falls into,
 *
 *     q = (x/√3 − y/3)/s,   r = 2y/(3s),   rounded in cube coordinates q + r + t = 0
 *
 * where the coordinate with the largest rounding error is taken from the other two.
 *
 * @param point point of a plane [m], never degrees
 * @param circumradiusM distance from centre to corner s [m], > 0
 * @returns axial coordinates
 * @throws {ComputeError} `parameter-not-positive`, `not-a-number`
 * @see Her, I. (1995). Geometric transformations on the hexagonal grid. IEEE Transactions on Image Processing 4,
 *   1213–1222.
 * @example
 * hexagonCell([173.3, 0], 100) // => { q: 1, r: 0 }
 * hexagonCell([-50, 150], 100) // => { q: -1, r: 1 }
 */
export function hexagonCell([xM, yM]: PlanePoint, circumradiusM: number): HexagonCell {
  if (!(circumradiusM > 0)) throw new ComputeError('parameter-not-positive', { circumradiusM })
  if (!Number.isFinite(xM) || !Number.isFinite(yM)) throw new ComputeError('not-a-number', { xM, yM })
  const q = ((Math.sqrt(3) / 3) * xM - yM / 3) / circumradiusM
  const r = ((2 / 3) * yM) / circumradiusM
  const t = -q - r
  const [wholeQ, wholeR, wholeT] = [Math.round(q), Math.round(r), Math.round(t)]
  const [errorQ, errorR, errorT] = [Math.abs(wholeQ - q), Math.abs(wholeR - r), Math.abs(wholeT - t)]
  if (errorQ > errorR && errorQ > errorT) return { q: -wholeR - wholeT + 0, r: wholeR + 0 }
  if (errorR > errorT) return { q: wholeQ + 0, r: -wholeQ - wholeT + 0 }
  return { q: wholeQ + 0, r: wholeR + 0 }
}
