import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import { openRing } from './openRing'
import { signedPlaneArea } from './signedPlaneArea'
import type { PlanePoint } from './spatial.types'

/** Area of a measured outline and its error. */
export interface OutlineAreaError {
  readonly areaM2: number
  readonly standardDeviationM2: number
  readonly relative: number
}

/**
 * Error of the area of an outline whose corners were each measured with independent error, to first order,
 *
 *     Var(A) = σ²/4 · Σ |pᵢ₊₁ − pᵢ₋₁|²
 *
 * A phone's position error of a few metres makes the walked outline of a house worthless: see the example.
 *
 * @param corners corners in a plane [m], closed or open, at least three
 * @param sigmaM standard deviation of each coordinate σ [m], ≥ 0
 * @returns area [m²], its standard deviation [m²] and their ratio [–]
 * @throws {ComputeError} `ring-too-short`, `parameter-out-of-range`
 * @see closed form: differentiate the shoelace formula; first order in σ over the length of the sides.
 * @example
 * outlineAreaError([[0, 0], [20, 0], [20, 12], [0, 12]], 3).standardDeviationM2 // => 69.9714227381436
 */
export function outlineAreaError(corners: readonly PlanePoint[], sigmaM: number): OutlineAreaError {
  if (!(sigmaM >= 0)) throw new ComputeError('parameter-out-of-range', { sigmaM })
  const open = openRing(corners)
  if (open.length < 3) throw new ComputeError('ring-too-short', { corners: open.length })
  const squares = open.map((_, index) => {
    const [beforeX = 0, beforeY = 0] = open.at(index - 1) ?? []
    const [afterX = 0, afterY = 0] = open[(index + 1) % open.length] ?? []
    return (afterX - beforeX) ** 2 + (afterY - beforeY) ** 2
  })
  const areaM2 = Math.abs(signedPlaneArea(open))
  const standardDeviationM2 = (sigmaM / 2) * Math.sqrt(sum(squares))
  return { areaM2, standardDeviationM2, relative: standardDeviationM2 / areaM2 }
}
