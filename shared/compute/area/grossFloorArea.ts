import { ComputeError } from '@/shared/compute/errors'

/** What a surveyor notes of one building part. Shares may be left out: none seen, none counted. */
export interface BuildingExtent {
  readonly footprintM2: number
  /** Full storeys; half ones on slopes as 0.5. */
  readonly storeys: number
  /** Usable part of the attic: 0 flat roof or unused, 0.3–0.7 pitched roof, 1 mansard. */
  readonly atticShare?: number
  /** Part of the footprint with a basement: 0, 0.5 or 1; above 1 for several levels. */
  readonly basementShare?: number
}

/**
 * Gross floor area as surveyors estimate it,
 *
 *     GFA = footprint · (storeys + attic share + basement share)
 *
 * @param extent footprint [m²], ≥ 0; storeys [–], ≥ 0; attic share [–], in [0, 1]; basement share [–], in [0, 5]
 * @returns gross floor area [m²], ≥ 0
 * @throws {ComputeError} `negative-area`, `parameter-out-of-range` (storeys), `share-out-of-range`
 * @see common practice of surveyors; terms after ISO 9836.
 * @example
 * grossFloorArea({ footprintM2: 180, storeys: 3, atticShare: 0.5, basementShare: 1 }) // => 810
 * grossFloorArea({ footprintM2: 96.5, storeys: 2 }) // => 193
 */
export function grossFloorArea({ footprintM2, storeys, atticShare = 0, basementShare = 0 }: BuildingExtent): number {
  if (!(footprintM2 >= 0 && footprintM2 < Infinity)) throw new ComputeError('negative-area', { footprintM2 })
  if (!(storeys >= 0 && storeys < Infinity)) throw new ComputeError('parameter-out-of-range', { storeys })
  if (!(atticShare >= 0 && atticShare <= 1)) throw new ComputeError('share-out-of-range', { atticShare })
  if (!(basementShare >= 0 && basementShare <= MOST_BASEMENT_LEVELS)) {
    throw new ComputeError('share-out-of-range', { basementShare })
  }
  return footprintM2 * (storeys + atticShare + basementShare)
}

const MOST_BASEMENT_LEVELS = 5
