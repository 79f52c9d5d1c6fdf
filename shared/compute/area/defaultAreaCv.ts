import { AREA_METHOD_ERRORS, type AreaMethod } from './areaMethods'

/**
 * Default relative error of a floor area by the way it was measured.
 *
 * @param method how the area is known
 * @returns coefficient of variation [–] of one building, independent of other buildings
 * @see common practice; the middle of the ranges in AREA_METHOD_ERRORS.
 * @example
 * defaultAreaCv('by-eye') // => 0.2
 */
export function defaultAreaCv(method: AreaMethod): number {
  return AREA_METHOD_ERRORS[method].cv
}
