import { localPlaneArea } from '@/shared/compute/spatial/localPlaneArea'
import type { Corner } from './town.types'

/** Corner stone of the invented town: open sea, so that no real place is meant. */
const CORNER_STONE = { longitude: 2.9, latitude: 53.2 }
const METRES_PER_DEGREE_NORTH = 111_290
const METRES_PER_DEGREE_EAST = 111_412 * Math.cos((CORNER_STONE.latitude * Math.PI) / 180)

/** Metres from the corner stone → [longitude, latitude] with seven decimals. */
export function toDegrees([eastM, northM]: Corner): [number, number] {
  const round = (degrees: number) => Math.round(degrees * 1e7) / 1e7
  return [
    round(CORNER_STONE.longitude + eastM / METRES_PER_DEGREE_EAST),
    round(CORNER_STONE.latitude + northM / METRES_PER_DEGREE_NORTH),
  ]
}

/** Closed ring in degrees, counter-clockwise as RFC 7946 wants it. */
export function toRing(corners: readonly Corner[]): [number, number][] {
  const turned = isClockwise(corners) ? [...corners].reverse() : corners
  const ring = turned.map(toDegrees)
  return [...ring, ring[0]!]
}

export function toMultiPolygonText(corners: readonly Corner[]): string {
  return `SRID=4326;MULTIPOLYGON(((${toRing(corners)
    .map(([longitude, latitude]) => `${longitude} ${latitude}`)
    .join(',')})))`
}

/** Middle of the first side's strip: inside for every footprint the town is laid out with. */
export function innerPointText(corners: readonly Corner[]): string {
  const [a, b, c] = [corners[0]!, corners[1]!, corners[2]!]
  const inside: Corner = [(a[0] + b[0]) / 2 + (c[0] - b[0]) * 0.3, (a[1] + b[1]) / 2 + (c[1] - b[1]) * 0.3]
  const [longitude, latitude] = toDegrees(inside)
  return `SRID=4326;POINT(${longitude} ${latitude})`
}

/** Footprint on the ellipsoid [m²]. */
export function footprintM2(corners: readonly Corner[]): number {
  return Math.round(Math.abs(localPlaneArea(toRing(corners))) * 10) / 10
}

function isClockwise(corners: readonly Corner[]): boolean {
  let twice = 0
  corners.forEach(([x, y], index) => {
    const [nextX, nextY] = corners[(index + 1) % corners.length]!
    twice += x * nextY - nextX * y
  })
  return twice < 0
}
