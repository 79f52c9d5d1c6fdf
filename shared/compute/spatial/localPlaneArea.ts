import { ComputeError } from '@/shared/compute/errors'
import { localPlane } from './localPlane'
import { openRing } from './openRing'
import { planeCentroid } from './planeCentroid'
import { signedPlaneArea } from './signedPlaneArea'
import type { Ring } from './spatial.types'

/**
 * Area of a small ring in the local plane of its own centroid: as {@link geodesicArea}, but fast.
 *
 * @param ring corners [°], closed or open, at least three different ones
 * @returns area [m²], positive when the corners run counter-clockwise
 * @throws {ComputeError} `ring-too-short`, `coordinates-out-of-range` next to a pole
 * @see Karney (2013) for the reference it is measured against; radii after Snyder (1987), p. 24–25.
 * @example
 * localPlaneArea([[36.8219, -1.2921], [36.822258, -1.2920687], [36.8222463, -1.2919344], [36.8218883, -1.2919658]]) // => 595.959876535
 */
export function localPlaneArea(ring: Ring): number {
  const corners = openRing(ring)
  const first = corners[0]
  if (first === undefined || corners.length < 3) throw new ComputeError('ring-too-short', { corners: corners.length })
  const rough = localPlane(first)
  const plane = localPlane(rough.toPosition(planeCentroid(corners.map(rough.toPlane))))
  return signedPlaneArea(corners.map(plane.toPlane))
}
