import type { FactorUse } from './run.types'

/** One figure of the factor book in an archetype, its parts by component put together. */
export interface FactorSpread {
  readonly factorId: string
  readonly meanKgPerM2: number
  /** Error of the mean, shared by every building that uses the figure [kg/m²]. */
  readonly sdKgPerM2: number
  /** From building to building [kg/m²]. */
  readonly betweenSdKgPerM2: number
}

/**
 * Puts the parts of each figure together: a figure that is split by component is one figure still, so its parts err
 * together, and a building that holds more of it holds more of every part. Splitting a figure changes no variance of the
 * whole.
 *
 * @param factors of one archetype, or those of one component
 * @example
 * spreadByFactor([
 *   { material: 'concrete', component: 'structure', factorId: 'f', meanKgPerM2: 800, sharedCv: 0.2, betweenBuildingsCv: 0 },
 *   { material: 'concrete', component: 'fit-out', factorId: 'f', meanKgPerM2: 200, sharedCv: 0.2, betweenBuildingsCv: 0 },
 * ])[0].sdKgPerM2 // => 200
 */
export function spreadByFactor(factors: readonly FactorUse[]): FactorSpread[] {
  const spreads = new Map<string, FactorSpread>()
  for (const { factorId, meanKgPerM2, sharedCv, betweenBuildingsCv } of factors) {
    const known = spreads.get(factorId) ?? { factorId, meanKgPerM2: 0, sdKgPerM2: 0, betweenSdKgPerM2: 0 }
    spreads.set(factorId, {
      factorId,
      meanKgPerM2: known.meanKgPerM2 + meanKgPerM2,
      sdKgPerM2: known.sdKgPerM2 + meanKgPerM2 * sharedCv,
      betweenSdKgPerM2: known.betweenSdKgPerM2 + meanKgPerM2 * betweenBuildingsCv,
    })
  }
  return [...spreads.values()]
}
