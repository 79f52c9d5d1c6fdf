import { ComputeError } from '@/shared/compute/errors'
import { grossFloorArea, type BuildingExtent } from './grossFloorArea'

/** Clear height of a cellar with its slab [m]; common practice, an editable default. */
export const DEFAULT_BASEMENT_HEIGHT_M = 2.4

/**
 * Volume inside the outer surfaces, level by level,
 *
 *     V = footprint · ((storeys + attic share) · h + basement share · h_b)
 *
 * @param extent as for {@link grossFloorArea}
 * @param storeyHeightM floor level to floor level h [m], > 0
 * @param basementHeightM height of a basement level h_b [m], > 0
 * @returns gross volume [m³], ≥ 0
 * @throws {ComputeError} `parameter-not-positive` and those of {@link grossFloorArea}
 * @see common practice of surveyors; terms after ISO 9836.
 * @example
 * grossVolume({ footprintM2: 180, storeys: 3, atticShare: 0.5, basementShare: 1 }, 2.9) // => 2259
 */
export function grossVolume(
  extent: BuildingExtent,
  storeyHeightM: number,
  basementHeightM: number = DEFAULT_BASEMENT_HEIGHT_M,
): number {
  if (!(storeyHeightM > 0 && basementHeightM > 0)) {
    throw new ComputeError('parameter-not-positive', { storeyHeightM, basementHeightM })
  }
  const { basementShare = 0, ...above } = extent
  const basementM2 = grossFloorArea(extent) - grossFloorArea(above)
  return grossFloorArea(above) * storeyHeightM + (basementShare === 0 ? 0 : basementM2 * basementHeightM)
}
