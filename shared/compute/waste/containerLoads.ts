import { ComputeError } from '@/shared/compute/errors'

/** What one container holds. */
export interface Container {
  readonly volumeM3: number
  readonly payloadKg: number
}

/** Loads of one fraction and what fills the container first. */
export interface ContainerLoads {
  readonly loads: number
  readonly limitedBy: 'volume' | 'payload' | 'nothing'
}

/** A quotient this close above a whole number is rounding of the division, not another container. */
const ROUNDING_ALLOWANCE = 1e-9

/**
 * Containers for one fraction kept apart,
 *
 *     loads = ⌈ max(V / container volume, m / payload) ⌉
 *
 * Heavy rubble reaches the payload first, timber the volume.
 *
 * @param massKg mass of the fraction m [kg], ≥ 0
 * @param looseVolumeM3 its loose volume V [m³], ≥ 0
 * @param container volume [m³] and payload [kg], > 0
 * @returns whole number of loads, ≥ 0, and the limit that decides
 * @throws {ComputeError} `negative-amount`, `parameter-not-positive`
 * @example
 * containerLoads(310_000, 217.7, { volumeM3: 20, payloadKg: 12_000 }) // => { loads: 26, limitedBy: 'payload' }
 */
export function containerLoads(massKg: number, looseVolumeM3: number, container: Container): ContainerLoads {
  const { volumeM3, payloadKg } = container
  if (!(massKg >= 0 && looseVolumeM3 >= 0)) throw new ComputeError('negative-amount', { massKg, looseVolumeM3 })
  if (!(volumeM3 > 0 && payloadKg > 0)) throw new ComputeError('parameter-not-positive', { volumeM3, payloadKg })
  const byVolume = looseVolumeM3 / volumeM3
  const byPayload = massKg / payloadKg
  const most = Math.max(byVolume, byPayload)
  if (massKg === 0 && looseVolumeM3 === 0) return { loads: 0, limitedBy: 'nothing' }
  return {
    loads: Math.max(1, Math.ceil(most * (1 - ROUNDING_ALLOWANCE))),
    limitedBy: byVolume > byPayload ? 'volume' : 'payload',
  }
}
