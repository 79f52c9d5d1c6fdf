import type { Material } from '@/shared/compute/factors/vocabulary'
import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import { BULK_DENSITIES, type BulkDensity } from './bulkDensities'
import { looseVolume } from './looseVolume'
import { proposeWasteCode } from './proposeWasteCode'
import type { WasteCode } from './wasteCodes'

/** A mass of one material that is to leave, with the hazardous codes its building makes one think of. */
export interface DepartingMass {
  readonly material: Material
  readonly massKg: number
  readonly suspectedCodes?: readonly WasteCode[]
}

/** One line of a waste inventory. */
export interface WasteLine {
  readonly code: WasteCode
  readonly materials: readonly Material[]
  readonly massKg: number
  /** Mass of this line over which a suspicion stands [kg]. */
  readonly suspectedKg: number
  /** Loose volume [m³] with likely bulk densities, and its range with the high and the low ones. */
  readonly looseVolumeM3: { readonly low: number; readonly likely: number; readonly high: number }
  readonly alternatives: readonly WasteCode[]
  readonly mustAsk: boolean
}

/**
 * Adds departing masses up by proposed waste code.
 *
 * @param masses masses [kg], ≥ 0, any number a material
 * @param densities loose bulk densities by material [kg/m³]
 * @returns lines sorted by code; their masses add up to what came in
 * @throws {ComputeError} `negative-amount`
 * @see Commission Decision 2000/532/EC as amended.
 * @example
 * wasteLines([{ material: 'concrete', massKg: 1424 }, { material: 'concrete', massKg: 1424 }])[0].looseVolumeM3.likely // => 2
 */
export function wasteLines(
  masses: readonly DepartingMass[],
  densities: Readonly<Record<Material, BulkDensity>> = BULK_DENSITIES,
): readonly WasteLine[] {
  const proposals = masses.map((mass) => {
    if (!(mass.massKg >= 0)) throw new ComputeError('negative-amount', { ...mass })
    return { ...mass, ...proposeWasteCode(mass.material, mass.suspectedCodes ?? []) }
  })
  const codes = [...new Set(proposals.map(({ code }) => code))].sort()
  return codes.map((code): WasteLine => {
    const parts = proposals.filter((part) => part.code === code)
    const volume = (density: (of: BulkDensity) => number) =>
      sum(parts.map(({ material, massKg }) => looseVolume(massKg, density(densities[material]))))
    return {
      code,
      materials: [...new Set(parts.map(({ material }) => material))],
      massKg: sum(parts.map(({ massKg }) => massKg)),
      suspectedKg: sum(parts.filter(({ mustAsk }) => mustAsk).map(({ massKg }) => massKg)),
      looseVolumeM3: {
        low: volume(({ highKgPerM3 }) => highKgPerM3),
        likely: volume(({ likelyKgPerM3 }) => likelyKgPerM3),
        high: volume(({ lowKgPerM3 }) => lowKgPerM3),
      },
      alternatives: [...new Set(parts.flatMap(({ alternatives }) => alternatives))],
      mustAsk: parts.some(({ mustAsk }) => mustAsk),
    }
  })
}
