import { defaultAreaCv } from '@/shared/compute/area/defaultAreaCv'
import type { UseOrUnknown } from '@/shared/compute/factors/vocabulary'

/** A recorded building, for what floor areas of others may be. */
export interface RecordedArea {
  readonly use: UseOrUnknown
  readonly footprintM2: number
  readonly registerStoreys: number | null
  readonly grossFloorAreaM2: number
}

export interface UnrecordedOutline {
  readonly use: UseOrUnknown | null
  readonly footprintM2: number
  readonly registerStoreys: number | null
}

export interface FloorAreaPrior {
  readonly floorAreaM2: number
  readonly floorAreaCv: number
}

/** Fewer buildings than these say too little: common practice. */
const LEAST_ALIKE = 5
const STOREYS_IF_NOTHING_IS_KNOWN = 2

/**
 * What the floor area of an unrecorded building may be, from its footprint and the recorded buildings of the district:
 * A = footprint · storeys of the register · r, with r the mean ratio of recorded area to that product (attics, basements
 * and wrong registers are in it); without storeys in the register, footprint · r with r over the footprint alone. The
 * spread of r is the area's error. Buildings of its use where there are five, else of all uses; else two storeys, or
 * those of the register, by eye.
 *
 * @returns area [m²] and its coefficient of variation [–], never below that of an area counted from the street
 * @see defaults: common practice, `AREA_METHOD_ERRORS`.
 * @example
 * floorAreaPrior([])({ use: null, footprintM2: 100, registerStoreys: 3 }) // => { floorAreaM2: 300, floorAreaCv: 0.2 }
 */
export function floorAreaPrior(recorded: readonly RecordedArea[]): (outline: UnrecordedOutline) => FloorAreaPrior {
  const kept = new Map<string, { mean: number; cv: number }>()
  return ({ use, footprintM2, registerStoreys }) => {
    const hasStoreys = registerStoreys !== null
    const key = `${use}|${hasStoreys}`
    let ratio = kept.get(key)
    if (!ratio) kept.set(key, (ratio = ratioOf(recorded, use, hasStoreys)))
    return { floorAreaM2: footprintM2 * (registerStoreys ?? 1) * ratio.mean, floorAreaCv: ratio.cv }
  }
}

function ratioOf(recorded: readonly RecordedArea[], use: UseOrUnknown | null, hasStoreys: boolean) {
  const usable = recorded.filter(
    ({ footprintM2, registerStoreys }) => footprintM2 > 0 && (!hasStoreys || (registerStoreys ?? 0) > 0),
  )
  const ratios = [usable.filter((one) => one.use === use), usable]
    .map((group) =>
      group.map(
        ({ grossFloorAreaM2, footprintM2, registerStoreys }) =>
          grossFloorAreaM2 / (footprintM2 * (hasStoreys ? registerStoreys! : 1)),
      ),
    )
    .find((group) => group.length >= LEAST_ALIKE)
  if (!ratios)
    return hasStoreys
      ? { mean: 1, cv: defaultAreaCv('by-eye') }
      : { mean: STOREYS_IF_NOTHING_IS_KNOWN, cv: defaultAreaCv('imputed') }
  const mean = ratios.reduce((sum, ratio) => sum + ratio, 0) / ratios.length
  const variance = ratios.reduce((sum, ratio) => sum + (ratio - mean) ** 2, 0) / (ratios.length - 1)
  return { mean, cv: Math.max(defaultAreaCv('map-and-storeys'), Math.sqrt(variance) / mean) }
}
