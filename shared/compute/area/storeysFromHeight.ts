import { ComputeError } from '@/shared/compute/errors'

/** A guess at the storeys of a building that only its height is known of. */
export interface StoreyGuess {
  /** Whole number ≥ 1. */
  readonly storeys: number
  /** What is left of the height [m]: a roof, a parapet, a raised ground floor. */
  readonly restM: number
}

const ROUNDING_SHARE = 0.75

/**
 * Full storeys under a height, counted on the higher side: a rest of at least three quarters of a storey counts as one.
 *
 * @param heightM height above ground to the eaves, or to the top for flat roofs [m], > 0
 * @param storeyHeightM floor level to floor level [m], > 0
 * @returns storeys, at least 1, and the rest [m], which may be negative
 * @throws {ComputeError} `parameter-not-positive`
 * @see common practice; a start for the surveyor's count, never a substitute for it.
 * @example
 * storeysFromHeight(8.7, 2.9) // => { storeys: 3, restM: 0 }
 * storeysFromHeight(11.2, 2.9).storeys // => 4
 */
export function storeysFromHeight(heightM: number, storeyHeightM: number): StoreyGuess {
  if (!(heightM > 0 && storeyHeightM > 0 && heightM < Infinity)) {
    throw new ComputeError('parameter-not-positive', { heightM, storeyHeightM })
  }
  const storeys = Math.max(1, Math.floor(heightM / storeyHeightM + 1 - ROUNDING_SHARE + 1e-9))
  return { storeys, restM: heightM - storeys * storeyHeightM }
}
