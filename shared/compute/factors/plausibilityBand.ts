import { ComputeError } from '@/shared/compute/errors'
import type { StructureOrUnknown } from './vocabulary'

/** Published spread of the mass of whole buildings [kg/m² GFA]. */
export interface MassBand {
  readonly p10KgPerM2: number
  readonly p90KgPerM2: number
  readonly sampleCount: number
}

/** Where the sum of an archetype's factors lies. */
export interface Plausibility {
  readonly band: MassBand
  readonly verdict: 'below' | 'within' | 'above'
}

const CONCRETE: MassBand = { p10KgPerM2: 816.5, p90KgPerM2: 2170, sampleCount: 166 }
const MASONRY: MassBand = { p10KgPerM2: 784.4, p90KgPerM2: 2526, sampleCount: 99 }
const TIMBER: MassBand = { p10KgPerM2: 288.3, p90KgPerM2: 930.8, sampleCount: 135 }
const STEEL: MassBand = { p10KgPerM2: 762.7, p90KgPerM2: 1735, sampleCount: 20 }
const ALL: MassBand = { p10KgPerM2: 501.2, p90KgPerM2: 2175, sampleCount: 573 }

const BANDS: Readonly<Record<StructureOrUnknown, MassBand>> = {
  'reinforced-concrete': CONCRETE,
  'precast-panel': CONCRETE,
  'masonry-timber-floors': MASONRY,
  'masonry-concrete-floors': MASONRY,
  'timber-frame': TIMBER,
  'mass-timber': TIMBER,
  'steel-frame': STEEL,
  hybrid: ALL,
  earth: ALL,
  unknown: ALL,
}

/**
 * Compares the sum of an archetype's factors with whole buildings of its structure: outside P10–P90 a person should
 * look at the factors again. Medians of materials do not add up to the median of buildings, so a sum near the middle
 * is no proof either.
 *
 * @param structure structure of the archetype
 * @param totalKgPerM2 sum over all materials [kg/m² GFA], ≥ 0
 * @returns band and verdict; both limits count as within
 * @throws {ComputeError} `negative-amount`
 * @see Heeren, N., Fishman, T. (2019). A database seed for a community-driven material intensity research platform.
 *   Scientific Data 6:23 (version 1.2, row sums of at least four materials; own statistics).
 * @example
 * plausibilityBand('timber-frame', 1200).verdict // => 'above'
 */
export function plausibilityBand(structure: StructureOrUnknown, totalKgPerM2: number): Plausibility {
  if (!(totalKgPerM2 >= 0)) throw new ComputeError('negative-amount', { totalKgPerM2 })
  const band = BANDS[structure]
  if (totalKgPerM2 < band.p10KgPerM2) return { band, verdict: 'below' }
  return { band, verdict: totalKgPerM2 > band.p90KgPerM2 ? 'above' : 'within' }
}
