import type { Geometry, Position } from 'geojson'

/** West, south, east, north [°]. */
export type Bounds = readonly [west: number, south: number, east: number, north: number]

/**
 * The box around some geometries.
 *
 * @returns null when there is no position in any of them
 */
export function boundsOf(geometries: readonly Geometry[]): Bounds | null {
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity]
  const visit = (part: readonly unknown[]): void => {
    const [longitude, latitude] = part
    if (typeof longitude === 'number' && typeof latitude === 'number') {
      west = Math.min(west, longitude)
      south = Math.min(south, latitude)
      east = Math.max(east, longitude)
      north = Math.max(north, latitude)
      return
    }
    for (const inner of part) if (Array.isArray(inner)) visit(inner)
  }
  for (const geometry of geometries) if ('coordinates' in geometry) visit(geometry.coordinates)
  return west <= east ? [west, south, east, north] : null
}

/** A ring closed: its first position again at its end. */
export function closedRing(corners: readonly Position[]): Position[] {
  const [first] = corners
  return first ? [...corners, first] : []
}
