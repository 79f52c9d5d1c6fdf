import { ComputeError } from '@/shared/compute/errors'
import { localPlane } from './localPlane'
import { openRing } from './openRing'
import { planeCentroid } from './planeCentroid'
import { pointInOutline } from './pointInOutline'
import type { Outline, Position, Ring } from './spatial.types'

/** One stretch of a line of latitude inside the outline [°]. */
interface Stretch {
  readonly latitude: number
  readonly west: number
  readonly east: number
}

/**
 * A position surely inside an outline: its centroid where that lies inside, otherwise the middle of the longest of the
 * stretches that lines of latitude between the corners cut out of it. Buildings are counted by this position, so each
 * falls into exactly one cell.
 *
 * @param outline rings [°], valid, not across the 180° meridian
 * @returns a position inside the exterior and outside the holes
 * @throws {ComputeError} `ring-too-short`, `ring-invalid` when the outline encloses nothing
 * @example
 * interiorPoint({ exterior: [[0, 0], [2, 0], [2, 2], [0, 2], [0, 0]], holes: [] }) // => [1, 1]
 * interiorPoint({ exterior: [[0, 0], [4, 0], [4, 1], [1, 1], [1, 4], [0, 4], [0, 0]], holes: [] }) // => [2, 0.5]
 */
export function interiorPoint(outline: Outline): Position {
  const corners = openRing(outline.exterior)
  const first = corners[0]
  if (first === undefined || corners.length < 3) throw new ComputeError('ring-too-short', { corners: corners.length })
  const plane = localPlane(first)
  const centroid = plane.toPosition(planeCentroid(corners.map(plane.toPlane)))
  if (pointInOutline(centroid, outline)) return centroid

  const longest = scanLatitudes(corners)
    .flatMap((latitude) => stretchesAt(latitude, outline))
    .reduce<Stretch | undefined>((best, next) => (width(next) > width(best) ? next : best), undefined)
  if (longest === undefined) throw new ComputeError('ring-invalid', { corners: corners.length })
  return [(longest.west + longest.east) / 2, longest.latitude]
}

function width(stretch: Stretch | undefined): number {
  return stretch === undefined ? 0 : stretch.east - stretch.west
}

function scanLatitudes(corners: Ring): number[] {
  const latitudes = [...new Set(corners.map(([, latitude]) => latitude))].sort((one, other) => one - other)
  return latitudes.slice(1).map((latitude, index) => (latitude + (latitudes[index] ?? latitude)) / 2)
}

function stretchesAt(latitude: number, { exterior, holes }: Outline): Stretch[] {
  const crossings = [exterior, ...holes].flatMap((ring) => crossingsAt(latitude, openRing(ring)))
  crossings.sort((one, other) => one - other)
  const stretches: Stretch[] = []
  for (let index = 0; index + 1 < crossings.length; index += 2) {
    stretches.push({ latitude, west: crossings[index] ?? 0, east: crossings[index + 1] ?? 0 })
  }
  return stretches
}

function crossingsAt(latitude: number, corners: Ring): number[] {
  return corners.flatMap(([fromLongitude, fromLatitude], index) => {
    const [toLongitude, toLatitude] = corners[(index + 1) % corners.length] ?? [fromLongitude, fromLatitude]
    if (fromLatitude > latitude === toLatitude > latitude) return []
    const share = (latitude - fromLatitude) / (toLatitude - fromLatitude)
    return [fromLongitude + share * (toLongitude - fromLongitude)]
  })
}
