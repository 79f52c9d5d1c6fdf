import { cellArea, latLngToCell, UNITS } from 'h3-js'
import { ComputeError } from '@/shared/compute/errors'
import type { Position } from './spatial.types'

/** A cell of the world-wide hexagon grid. */
export interface WorldCell {
  readonly id: string
  /** Area on the sphere of the grid [m²]. */
  readonly areaM2: number
}

/**
 * The cell of the world-wide hexagon grid (H3) a position falls into: the same name on every device and in every run.
 *
 * @param position position [°]
 * @param resolution grid level, whole number from 0 (about 1 100 km across) to 15 (about 1 m); 9 is about a block
 * @returns name and area of the cell
 * @throws {ComputeError} `parameter-out-of-range`, `coordinates-out-of-range`
 * @remarks The grid's areas are those of a sphere, within 0.6 % of the ellipsoid.
 * @see H3: hexagonal hierarchical geospatial indexing system, version 4.
 * @example
 * worldCell([13.405, 52.52], 9).id // => '891f1d48947ffff'
 */
export function worldCell([longitude, latitude]: Position, resolution: number): WorldCell {
  if (!(Number.isInteger(resolution) && resolution >= 0 && resolution <= 15)) {
    throw new ComputeError('parameter-out-of-range', { resolution })
  }
  if (!(Math.abs(latitude) <= 90 && Math.abs(longitude) <= 360)) {
    throw new ComputeError('coordinates-out-of-range', { longitude, latitude })
  }
  const id = latLngToCell(latitude, longitude, resolution)
  return { id, areaM2: cellArea(id, UNITS.m2) }
}
